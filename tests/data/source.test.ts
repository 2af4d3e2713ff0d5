import { describe, expect, it } from 'vitest';
import { listSources, readSource } from '@/src/data/source/read';
import { addSource, keepSourceBlock, retireSource } from '@/src/data/source/write';
import { writeBlock, type Typed } from '@/src/exchange/catalogue/block';
import { SOURCE_BLOCKS } from '@/src/exchange/catalogue/source';
import { makeSession, makeViewer, newId, openDatabase, sourceId } from '@/tests/helpers/database';

openDatabase();

const TARGET = sourceId('J0825+0309');

async function sourceOf(id: string) {
  const answer = await readSource(await makeViewer('scheduler'), id);
  if (!answer.ok) throw new Error(answer.message);
  return answer.source;
}

async function actOn(id: string, block: 'place' | 'flux', change: Typed) {
  const { blocks } = await sourceOf(id);
  const was =
    block === 'place'
      ? writeBlock(SOURCE_BLOCKS.place, blocks.place)
      : writeBlock(SOURCE_BLOCKS.flux, blocks.flux);
  return { block, was, typed: { ...was, ...change } };
}

const NEW = {
  place: {
    name: 'J0001+0203',
    role: 'finder',
    raDeg: '00 01 30.5',
    decDeg: '-02:03:04',
    aliases: 'one, two, one',
  },
  flux: {
    bands: [{ band: '22 ghz', fluxJy: '1,25', sizeMas: '' }],
    components: [
      {
        band: '22 GHz',
        fluxJy: '1',
        majorMas: '0.4',
        minorMas: '0.2',
        positionAngleDeg: '-30',
        eastMas: '0',
        northMas: '1.5',
      },
    ],
  },
};

describe('the catalogue of sources', () => {
  it('is read by every role, by right ascension', async () => {
    const session = await makeSession();
    for (const viewer of [
      await makeViewer('correlator'),
      await makeViewer('operator', { stationCode: 'Af' }),
      await makeViewer('investigator', { sessionId: session.id }),
    ]) {
      const answer = await listSources(viewer);
      expect(answer).toMatchObject({ ok: true, canAdd: false });
      if (answer.ok) {
        const places = answer.sources.map(({ raDeg }) => raDeg);
        expect(places).toEqual([...places].sort((a, b) => a - b));
        expect(places.length).toBeGreaterThanOrEqual(11);
      }
    }
  });

  it('is closed to someone without a role, and has no other sources', async () => {
    const viewer = await makeViewer('scheduler');
    expect(await listSources({ ...viewer, grants: [] })).toMatchObject({ ok: false, code: 'forbidden' });
    expect(await readSource({ ...viewer, grants: [] }, TARGET)).toMatchObject({ code: 'forbidden' });
    expect(await readSource(viewer, newId())).toMatchObject({ ok: false, code: 'not_found' });
  });

  it('counts only the sessions that the viewer may know of', async () => {
    const session = await makeSession();
    const own = await makeViewer('investigator', { sessionId: session.id });
    const answer = await readSource(own, sourceId('J0738+1742'));
    if (!answer.ok) throw new Error(answer.message);
    expect(answer.source.sessionsAhead.map(({ code }) => code)).toEqual([session.code]);
    const all = await sourceOf(sourceId('J0738+1742'));
    expect(all.sessionsAhead.length).toBeGreaterThan(1);
  });
});

describe('a new source', () => {
  it('is added by a scheduler, hours and degrees read', async () => {
    const answer = await addSource(await makeViewer('scheduler'), NEW);
    if (!answer.ok) throw new Error(answer.message);
    const { place, flux } = (await sourceOf(answer.id)).blocks;
    expect(place).toMatchObject({ name: 'J0001+0203', aliases: ['one', 'two'], role: 'finder' });
    expect(place.raDeg).toBeCloseTo(0.37708333, 7);
    expect(place.decDeg).toBeCloseTo(-2.05111111, 7);
    expect(flux.bands).toEqual([{ band: '22 GHz', fluxJy: 1.25, sizeMas: null }]);
    expect(flux.components).toMatchObject([{ band: '22 GHz', majorMas: 0.4, positionAngleDeg: -30 }]);
  });

  it('is refused to who only reads', async () => {
    const viewer = await makeViewer('correlator');
    expect(await addSource(viewer, NEW)).toMatchObject({ ok: false, code: 'forbidden' });
  });

  it.each([
    ['a name that is taken', { place: { ...NEW.place, name: 'j0825+0309' } }, 'place.name'],
    ['no right ascension', { place: { ...NEW.place, raDeg: '' } }, 'place.raDeg'],
    ['a declination over the pole', { place: { ...NEW.place, decDeg: '91' } }, 'place.decDeg'],
    ['half a motion', { place: { ...NEW.place, properMotionEastMas: '3' } }, 'place.properMotionNorthMas'],
    ['a role that is none', { place: { ...NEW.place, role: 'star' } }, 'place.role'],
    ['a band of two rows', { flux: { bands: [...NEW.flux.bands, ...NEW.flux.bands] } }, 'flux.bands.1.band'],
    ['a component without its band', { flux: { ...NEW.flux, bands: [] } }, 'flux.components.0.band'],
  ])('says beside the field what is wrong with %s', async (_, change, field) => {
    const viewer = await makeViewer('scheduler');
    const body = { ...NEW, place: { ...NEW.place, name: 'J9999-0000' }, ...change };
    const answer = await addSource(viewer, body);
    expect(answer).toMatchObject({ ok: false, code: 'invalid' });
    if (!answer.ok) expect(answer.fields).toHaveProperty([field]);
  });
});

describe('a block of a source', () => {
  it('is kept by a scheduler; kept again it does not move the place', async () => {
    const viewer = await makeViewer('scheduler');
    const before = (await sourceOf(TARGET)).blocks;
    for (const name of ['place', 'flux'] as const) {
      expect(await keepSourceBlock(viewer, TARGET, await actOn(TARGET, name, {}))).toEqual({ ok: true });
    }
    const after = (await sourceOf(TARGET)).blocks;
    // what the form writes is read back to 0.1 mas
    expect(Math.abs(after.place.raDeg - before.place.raDeg) * 3.6e6).toBeLessThan(0.1);
    expect(Math.abs(after.place.decDeg - before.place.decDeg) * 3.6e6).toBeLessThan(0.1);
    expect(after.flux).toEqual(before.flux);
    const act = await actOn(TARGET, 'flux', { bands: [{ band: '8.4 GHz', fluxJy: '0.4', sizeMas: '0.5' }] });
    expect(await keepSourceBlock(viewer, TARGET, act)).toEqual({ ok: true });
    expect((await sourceOf(TARGET)).blocks.flux.bands).toEqual([
      { band: '8.4 GHz', fluxJy: 0.4, sizeMas: 0.5 },
    ]);
  });

  it('is refused to who only reads, and where there is no source', async () => {
    const act = await actOn(TARGET, 'flux', {});
    const operator = await makeViewer('operator', { stationCode: 'Af' });
    expect(await keepSourceBlock(operator, TARGET, act)).toMatchObject({ ok: false, code: 'forbidden' });
    const viewer = await makeViewer('scheduler');
    expect(await keepSourceBlock(viewer, newId(), act)).toMatchObject({ ok: false, code: 'not_found' });
  });

  it('with a slip, of an old state or an unknown name is refused', async () => {
    const viewer = await makeViewer('scheduler');
    const bad = await actOn(TARGET, 'place', { decDeg: '12 75 00' });
    expect(await keepSourceBlock(viewer, TARGET, bad)).toMatchObject({
      code: 'invalid',
      fields: { decDeg: [expect.stringContaining('75')] },
    });
    const old = { ...bad, typed: { ...bad.was, name: 'X' }, was: { ...bad.was, name: 'seen' } };
    expect(await keepSourceBlock(viewer, TARGET, old)).toMatchObject({ code: 'conflict' });
    expect(await keepSourceBlock(viewer, TARGET, { ...bad, block: 'id' })).toMatchObject({ code: 'invalid' });
  });
});

describe('retiring a source', () => {
  it('marks it and can be taken back, by schedulers only', async () => {
    const viewer = await makeViewer('scheduler');
    expect(await retireSource(viewer, TARGET, true)).toEqual({ ok: true });
    expect((await sourceOf(TARGET)).retiredAtMs).not.toBeNull();
    expect(await retireSource(viewer, TARGET, false)).toEqual({ ok: true });
    expect((await sourceOf(TARGET)).retiredAtMs).toBeNull();
    const reader = await makeViewer('correlator');
    expect(await retireSource(reader, TARGET, true)).toMatchObject({ ok: false, code: 'forbidden' });
    expect(await retireSource(viewer, newId(), true)).toMatchObject({ ok: false, code: 'not_found' });
  });
});
