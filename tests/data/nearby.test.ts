import { describe, expect, it } from 'vitest';
import { addSessionSource } from '@/src/data/session/add-source';
import { setSessionState } from '@/src/data/session/write';
import { readNearby } from '@/src/data/sky/nearby';
import { readSkySheet } from '@/src/data/sky/read';
import { makeSession, makeViewer, openDatabase, sourceId } from '@/tests/helpers/database';

openDatabase();

const TARGET = sourceId('J0738+1742');

describe('calibrators around a source', () => {
  it('are those of the catalogue, the nearest first, with what they are worth', async () => {
    const { id } = await makeSession();
    const answer = await readNearby(await makeViewer('scheduler'), id, { source: TARGET, within: '25' });
    if (!answer.ok) throw new Error(answer.message);
    const { sources, more, canAdd, withinDeg } = answer.nearby;
    expect({ more, canAdd, withinDeg }).toEqual({ more: 0, canAdd: true, withinDeg: 25 });
    expect(sources.map(({ name }) => name)).toEqual(['J0811+0146', 'J0854+2006']);
    const separations = sources.map(({ separationDeg }) => separationDeg);
    expect(separations).toEqual([...separations].sort((a, b) => a - b));
    const [first] = sources;
    expect(first).toMatchObject({ role: 'phase-ref', isInSession: false, fluxJy: 0.9 });
    // south-east of the target
    expect(first?.positionAngleDeg).toBeGreaterThan(140);
    expect(first?.positionAngleDeg).toBeLessThan(165);
    for (const { upToo } of sources) {
      expect(upToo).toBeGreaterThan(0.5);
      expect(upToo).toBeLessThanOrEqual(1);
    }
  });

  it('say which are in the session already, and leave the target itself out', async () => {
    const { id } = await makeSession();
    const answer = await readNearby(await makeViewer('scheduler'), id, { source: TARGET, within: 180 });
    if (!answer.ok) throw new Error(answer.message);
    const { sources } = answer.nearby;
    expect(sources.find(({ name }) => name === 'J0927+3902')?.isInSession).toBe(true);
    expect(sources.some(({ id: one }) => one === TARGET)).toBe(false);
    expect(sources.every(({ role }) => role !== 'target')).toBe(true);
  });

  it('may be none', async () => {
    const { id } = await makeSession();
    const answer = await readNearby(await makeViewer('scheduler'), id, { source: TARGET, within: 0.5 });
    expect(answer).toMatchObject({ ok: true, nearby: { sources: [], more: 0 } });
  });

  it.each([
    ['0', 'Type degrees above 0.'],
    ['181', 'Nothing is farther away than 180°.'],
    ['near', 'Type degrees, for example 10.'],
  ])('%s is no distance', async (within, message) => {
    const { id } = await makeSession();
    const viewer = await makeViewer('scheduler');
    expect(await readNearby(viewer, id, { source: TARGET, within })).toMatchObject({
      code: 'invalid',
      fields: { within: [message] },
    });
  });

  it('are of a source of the session alone, for those who may see its plan', async () => {
    const { id } = await makeSession();
    const query = { source: sourceId('J1217+3007'), within: 20 };
    expect(await readNearby(await makeViewer('scheduler'), id, query)).toMatchObject({ code: 'not_found' });
    const stranger = await makeViewer('operator', { stationCode: 'Cf' });
    expect(await readNearby(stranger, id, { source: TARGET, within: 20 })).toMatchObject({
      code: 'not_found',
    });
    const reader = await makeViewer('correlator');
    expect(await readNearby(reader, id, { source: TARGET, within: 20 })).toMatchObject({
      ok: true,
      nearby: { canAdd: false },
    });
  });
});

describe('taking a source into a session', () => {
  const near = sourceId('J1217+3007');

  it('puts it on the list once', async () => {
    const { id } = await makeSession();
    const scheduler = await makeViewer('scheduler');
    for (let time = 0; time < 2; time += 1)
      expect(await addSessionSource(scheduler, id, { sourceId: near })).toEqual({
        ok: true,
        name: 'J1217+3007',
      });
    const answer = await readSkySheet(scheduler, id);
    if (!answer.ok) throw new Error(answer.message);
    expect(answer.sheet.sources.map(({ name }) => name)).toEqual(['J0738+1742', 'J0927+3902', 'J1217+3007']);
  });

  it('is for who may change the session', async () => {
    const { id } = await makeSession();
    const correlator = await makeViewer('correlator');
    expect(await addSessionSource(correlator, id, { sourceId: near })).toMatchObject({ code: 'forbidden' });
    const stranger = await makeViewer('operator', { stationCode: 'Cf' });
    expect(await addSessionSource(stranger, id, { sourceId: near })).toMatchObject({ code: 'not_found' });
  });

  it('refuses an unknown source, a closed session and what is no source', async () => {
    const { id } = await makeSession();
    const scheduler = await makeViewer('scheduler');
    expect(await addSessionSource(scheduler, id, { sourceId: 'nothing' })).toMatchObject({
      code: 'not_found',
    });
    expect(await addSessionSource(scheduler, id, { sourceId: 7 })).toMatchObject({ code: 'invalid' });
    expect((await setSessionState(scheduler, id, { state: 'closed' })).ok).toBe(true);
    expect(await addSessionSource(scheduler, id, { sourceId: near })).toMatchObject({ code: 'conflict' });
  });
});
