import { describe, expect, it } from 'vitest';
import type { CoverageSheet } from '@/src/data/coverage/dto';
import { readCoverage, type CoverageWanted } from '@/src/data/coverage/read';
import { takeAct } from '@/src/data/plan/write';
import type { Scan } from '@/src/schedule/plan';
import {
  makeScan,
  makeSession,
  makeViewer,
  newId,
  openDatabase,
  sourceId,
  START_MS,
} from '@/tests/helpers/database';

openDatabase();

async function sheetOf(key: string, wanted: CoverageWanted = {}): Promise<CoverageSheet> {
  const answer = await readCoverage(await makeViewer('scheduler'), key, wanted);
  if (!answer.ok) throw new Error(answer.message);
  return answer.sheet;
}

async function addScan(key: string, over: Partial<Scan> = {}): Promise<void> {
  const command = { verb: 'add-scan', edits: [{ kind: 'add-scan', scan: makeScan(over) }] };
  const body = { kind: 'do', actId: newId(), command, seen: {} };
  const act = await takeAct(await makeViewer('scheduler'), key, body);
  if (!act.ok) throw new Error(act.message);
}

/** When Af, Bm and Fn all see it. */
const UP_MS = START_MS + 8 * 3_600_000;

describe('what the Coverage page is drawn from', () => {
  it('has a track for each scan and baseline of the source, and its numbers', async () => {
    const { id } = await makeSession();
    await addScan(id, { startMs: UP_MS });
    await addScan(id, { startMs: UP_MS + 1_800_000 });
    await addScan(id, { startMs: UP_MS + 900_000, sourceId: sourceId('J0927+3902') });
    const { shown, observed, scanNumbers, refused } = await sheetOf(id);
    if (!shown) throw new Error('nothing is shown');
    expect(refused).toBeNull();
    expect(observed.map(({ name, band }) => `${name} ${band}`)).toEqual([
      'J0738+1742 22 GHz',
      'J0927+3902 22 GHz',
    ]);
    expect(shown).toMatchObject({ name: 'J0738+1742', band: '22 GHz', role: 'target' });
    expect(shown.modes).toHaveLength(1);
    expect(shown.coverage.scans).toHaveLength(2);
    expect(shown.coverage.tracks).toHaveLength(6);
    expect(shown.coverage.onSourceSeconds).toBe(1200);
    expect(shown.coverage.stationSeconds).toEqual({ Af: 1200, Bm: 1200, Fn: 1200 });
    expect(Object.values(scanNumbers)).toEqual(['1', '3']);
  });

  it('shows the source and band that the address names', async () => {
    const { shown } = await sheetOf('ARC-031', { source: 'J0555+3948', band: '8.4 GHz' });
    expect(shown).toMatchObject({ name: 'J0555+3948', band: '8.4 GHz' });
    expect(shown?.coverage.withoutSefd).toEqual(['Cf']);
  });

  it('is empty, not wrong, where there is no scan', async () => {
    const { id } = await makeSession();
    expect(await sheetOf(id)).toMatchObject({ shown: null, observed: [], scanNumbers: {}, refused: null });
  });

  it('keeps the plan that was offered while the draft moves on', async () => {
    const source = 'J0738+1742';
    const scansIn = async (plan: string) =>
      (await sheetOf('ARC-030', { source, plan })).shown?.coverage.scans.length ?? 0;
    const before = await scansIn('draft');
    expect(await scansIn('offered')).toBe(before);
    const { session, versions } = await sheetOf('ARC-030');
    expect(versions).toMatchObject([{ kind: 'draft' }, { kind: 'offered', number: 2, isPublished: true }]);
    const { scans = [], tracks } = (await sheetOf('ARC-030', { source })).shown?.coverage ?? { tracks: [] };
    expect([scans.length > 0, tracks.length > 0]).toEqual([true, true]);
    const stations = ['Af', 'Bm'].map((station) => ({ station, lateSeconds: 0, earlySeconds: 0 }));
    await addScan('ARC-030', { startMs: session.startMs + 4 * 3_600_000, lengthSeconds: 60, stations });
    expect(await scansIn('draft')).toBe(before + 1);
    expect(await scansIn('offered')).toBe(before);
  });
});

describe('an address that asks for what is not there', () => {
  it('is told so in words, and gets the nearest that is', async () => {
    const { id } = await makeSession();
    await addScan(id, { startMs: UP_MS });
    const refusedOf = async (wanted: CoverageWanted) => (await sheetOf(id, wanted)).refused;
    expect(await refusedOf({ source: 'J9999+99' })).toBe(
      'No scan of this plan observes “J9999+99”. Shown is J0738+1742.',
    );
    expect(await refusedOf({ source: 'J0738+1742', band: '5 GHz' })).toBe(
      'No scan of this plan observes J0738+1742 at “5 GHz”. Shown is 22 GHz.',
    );
    expect(await refusedOf({ plan: 'offered' })).toBe(
      'No plan of this session was offered yet. Shown is the draft.',
    );
  });
});

describe('who sees the coverage of a session', () => {
  it.each(['admin', 'scheduler', 'correlator'] as const)('%s sees every one', async (role) => {
    const { id } = await makeSession();
    expect((await readCoverage(await makeViewer(role), id, {})).ok).toBe(true);
  });

  it('an investigator sees the own one and finds no other', async () => {
    const [mine, other] = [await makeSession(), await makeSession()];
    const viewer = await makeViewer('investigator', { sessionId: mine.id });
    expect((await readCoverage(viewer, mine.code, {})).ok).toBe(true);
    expect(await readCoverage(viewer, other.id, {})).toMatchObject({ code: 'not_found' });
  });

  it('an operator has no part in a draft’s, and finds none of a session that is another’s', async () => {
    const { id } = await makeSession();
    const own = await makeViewer('operator', { stationCode: 'Af' });
    const stranger = await makeViewer('operator', { stationCode: 'Cf' });
    expect(await readCoverage(own, id, {})).toMatchObject({ code: 'forbidden' });
    expect(await readCoverage(stranger, id, {})).toMatchObject({ code: 'not_found' });
  });
});
