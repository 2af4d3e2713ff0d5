import { describe, expect, it } from 'vitest';
import type { SkySheet } from '@/src/data/sky/dto';
import { readSky, readSkySheet } from '@/src/data/sky/read';
import { moonSeparationDeg, sunSeparationDeg } from '@/src/sky/position';
import { makeSession, makeViewer, openDatabase, sourceId, START_MS } from '@/tests/helpers/database';

openDatabase();

async function sheetOf(key: string): Promise<SkySheet> {
  const answer = await readSkySheet(await makeViewer('scheduler'), key);
  if (!answer.ok) throw new Error(answer.message);
  return answer.sheet;
}

describe('what the Sky page is drawn from', () => {
  it('has each station’s and source’s windows over the whole session', async () => {
    const { id, code } = await makeSession();
    const sheet = await sheetOf(id);
    expect(sheet).toMatchObject({
      session: { code, startMs: START_MS, lengthSeconds: 86_400, stations: ['Af', 'Bm', 'Fn'] },
      band: '22 GHz',
      minElevationDeg: 5,
    });
    expect(sheet.sources.map(({ name }) => name)).toEqual(['J0738+1742', 'J0927+3902']);
    const { windows, common } = sheet.table;
    for (const source of sheet.sources) {
      expect(Object.keys(windows[source.id] ?? {}).sort()).toEqual(['Af', 'Bm', 'Fn']);
      expect(common[source.id]).toHaveLength(3);
      for (const [from, to] of Object.values(windows[source.id] ?? {}).flat()) {
        expect(from).toBeGreaterThanOrEqual(START_MS);
        expect(to).toBeLessThanOrEqual(START_MS + 86_400_000);
        expect(to).toBeGreaterThan(from);
      }
    }
  });

  it('has flux in the session’s band, and Sun and Moon in the middle of the session', async () => {
    const { id } = await makeSession();
    const [first] = (await sheetOf(id)).sources;
    if (!first) throw new Error('no source');
    const middle = new Date(START_MS + 43_200_000);
    expect(first.id).toBe(sourceId('J0738+1742'));
    expect(first.fluxJy).toBeGreaterThan(0);
    expect(first.sunDeg).toBeCloseTo(sunSeparationDeg(first.position, middle), 10);
    expect(first.moonDeg).toBeCloseTo(moonSeparationDeg(first.position, middle), 10);
  });

  it('is the same sky as the timeline’s', async () => {
    const { id } = await makeSession();
    const answer = await readSky(await makeViewer('scheduler'), id);
    expect(answer).toEqual({ ok: true, table: (await sheetOf(id)).table });
  });
});

describe('who sees the sky of a session', () => {
  it.each(['admin', 'scheduler', 'correlator'] as const)('%s sees every one', async (role) => {
    const { id } = await makeSession();
    expect((await readSkySheet(await makeViewer(role), id)).ok).toBe(true);
  });

  it('an investigator sees the own one and finds no other', async () => {
    const [mine, other] = [await makeSession(), await makeSession()];
    const viewer = await makeViewer('investigator', { sessionId: mine.id });
    expect((await readSkySheet(viewer, mine.code)).ok).toBe(true);
    expect(await readSkySheet(viewer, other.id)).toMatchObject({ code: 'not_found' });
  });

  it('an operator of a station that takes no part finds none', async () => {
    const { id } = await makeSession();
    const stranger = await makeViewer('operator', { stationCode: 'Cf' });
    expect(await readSkySheet(stranger, id)).toMatchObject({ code: 'not_found' });
  });

  it('a session that does not exist is not found, by name', async () => {
    expect(await readSkySheet(await makeViewer('admin'), 'ARC-051')).toMatchObject({
      code: 'not_found',
      message: 'There is no session ARC-051.',
    });
  });
});
