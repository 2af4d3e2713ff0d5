import { describe, expect, it } from 'vitest';
import { checkPlan, type Problem } from '@/src/schedule/checks';
import { applyCommand } from '@/src/schedule/commands';
import type { PlanContext } from '@/src/schedule/context';
import type { Plan, Scan } from '@/src/schedule/plan';
import { problemMends } from '@/src/schedule/problem-mends';
import { problemSentence } from '@/src/schedule/problem-words';
import { visibilityWindows } from '@/src/sky/windows';
import { makeContext, MOUNT, SOURCES, STATIONS, withStation } from './context-maker';
import { makePlan, makeScan, member, T0 } from './plan-maker';

const af: Partial<Scan> = { stations: [member('Af')] };

function only(plan: Plan, kind: Problem['kind'], context: PlanContext = makeContext()): Problem {
  const found = checkPlan(plan, context).filter((problem) => problem.kind === kind);
  const [problem] = found;
  if (!problem || found.length !== 1) throw new Error(`${found.length} problems of kind ${kind}`);
  return problem;
}

/** When src-a sets at Af: below 8° from here on. */
function settingMs(): number {
  const [source, station] = [SOURCES['src-a'], STATIONS.Af];
  if (!source || !station) throw new Error('not in the catalogue');
  const span = { start: new Date(T0), end: new Date(T0 + 12 * 3_600_000) };
  const [window] = visibilityWindows(source.position, station, span);
  if (!window) throw new Error('never up');
  return window.end.getTime();
}

function mended(plan: Plan, problem: Problem, context: PlanContext, index: number) {
  const mend = problemMends(problem, plan, context)[index];
  if (!mend) throw new Error('no such mend');
  const after = applyCommand(plan, mend.command).plan;
  return {
    label: mend.label,
    plan: after,
    left: checkPlan(after, context).find(({ key }) => key === problem.key),
  };
}

describe('a plan without faults', () => {
  it('has no problems', () => {
    const plan = makePlan([
      makeScan('a', af),
      makeScan('b', { ...af, sourceId: 'src-c', startMs: T0 + 1_200_000 }),
    ]);
    expect(checkPlan(plan, makeContext())).toEqual([]);
    expect(checkPlan(makePlan(), makeContext())).toEqual([]);
  });
});

describe('a slew', () => {
  // by the formulas (tests/schedule/paths.test.ts) Af needs 121 s from src-a at 01:10 to src-c about 01:12
  const late = makePlan([
    makeScan('a', af),
    makeScan('b', { ...af, sourceId: 'src-c', startMs: T0 + 660_000 }),
  ]);

  it('longer than the gap must be fixed, and the sentence says by how much', () => {
    const problem = only(late, 'slew');
    expect(problem.severity).toBe('fix');
    expect(problem.key).toBe('slew:b:Af');
    const { values } = problem.kind === 'slew' ? problem : { values: null };
    const slew = Math.ceil(values?.slewSeconds ?? NaN);
    const minutes = `${Math.floor(slew / 60)} min ${String(slew % 60).padStart(2, '0')} s`;
    const sentence = problemSentence(problem, late, makeContext());
    expect(sentence.who).toBe('Af, scan 2.');
    expect(sentence.what).toBe(`The slew from scan 1 takes ${minutes} and the gap is 1 min 00 s`);
    const short = slew - 60;
    expect(sentence.shortfall).toMatch(
      new RegExp(`^(${short} s|1 min ${String(short - 60).padStart(2, '0')} s) short$`),
    );
  });

  it('is mended first by joining late, which keeps the least spare time, then by leaving out', () => {
    const problem = only(late, 'slew');
    const joined = mended(late, problem, makeContext(), 0);
    expect(joined.label).toMatch(/^Af joins at 01:1\d:\d0, .* late$/);
    expect(joined.left).toBeUndefined();
    const lateBy = joined.plan.scans[1]?.stations[0]?.lateSeconds ?? 0;
    expect(lateBy % 10).toBe(0);
    const out = mended(late, problem, makeContext(), 1);
    expect(out.label).toBe('Leave Af out');
    expect(out.left).toBeUndefined();
  });

  it('is not mended by joining when nothing of the scan would be left', () => {
    const scans = late.scans.map((scan) => (scan.id === 'b' ? { ...scan, lengthSeconds: 30 } : scan));
    const plan = { ...late, scans };
    expect(problemMends(only(plan, 'slew'), plan, makeContext()).map(({ label }) => label)).toEqual([
      'Leave Af out',
    ]);
  });

  it('that leaves less than the least spare time is a note, and none if it leaves just that', () => {
    const slewSeconds = (() => {
      const problem = only(late, 'slew');
      return problem.kind === 'slew' ? Math.ceil(problem.values.slewSeconds ?? NaN) : NaN;
    })();
    const withGap = (gap: number) =>
      makePlan([
        makeScan('a', af),
        makeScan('b', { ...af, sourceId: 'src-c', startMs: T0 + (600 + gap) * 1000 }),
      ]);
    // the source moves on in the meantime, by less than 2 s of slew
    const tight = withGap(slewSeconds + 4);
    const problem = only(tight, 'slew');
    expect(problem.severity).toBe('note');
    expect(problemSentence(problem, tight, makeContext())).toMatchObject({
      what: expect.stringMatching(/leaves [1-6] s spare, less than 10 s$/) as string,
      shortfall: null,
    });
    expect(mended(tight, problem, makeContext(), 0).left).toBeUndefined();
    expect(checkPlan(withGap(slewSeconds + 14), makeContext())).toEqual([]);
  });

  it('that no turn of the cable allows says so', () => {
    const azimuth = { ...MOUNT.azimuth, minDeg: 100, maxDeg: 234 };
    const context = withStation('Af', { mount: { ...MOUNT, azimuth } });
    const plan = makePlan([makeScan('a', af)]);
    const problem = only(plan, 'slew', context);
    expect(problem.severity).toBe('fix');
    expect(problemSentence(problem, plan, context).what).toMatch(
      /^The dish would run into the azimuth limit at/,
    );
    expect(mended(plan, problem, context, 0)).toMatchObject({ label: 'Leave Af out', left: undefined });
  });
});

describe('a limit', () => {
  const overEdge = () =>
    makePlan([makeScan('a', { ...af, startMs: Math.floor(settingMs() / 1000) * 1000 - 300_000 })]);

  it('crossed in a scan must be fixed, from the minute it is crossed', () => {
    const plan = overEdge();
    const problem = only(plan, 'limit');
    expect(problem).toMatchObject({ severity: 'fix', key: 'limit:a:Af', station: 'Af' });
    expect(Math.abs(problem.atMs - settingMs())).toBeLessThanOrEqual(60_000);
    const sentence = problemSentence(problem, plan, makeContext());
    expect(sentence.what).toMatch(
      /^The source is at 7\.\d° and the lowest limit is 8\.0°, from 05:3\d:\d\d$/,
    );
    expect(sentence.shortfall).toMatch(/^0\.\d° too low$/);
  });

  it('is mended by leaving before the source sets: what stays is the note of being near', () => {
    const plan = overEdge();
    const problem = only(plan, 'limit');
    const shorter = mended(plan, problem, makeContext(), 0);
    expect(shorter.label).toMatch(/^Af leaves at 05:3\d:\d0, .* early$/);
    expect(shorter.left?.severity).toBe('note');
    expect(mended(plan, problem, makeContext(), 1)).toMatchObject({ label: 'Leave Af out', left: undefined });
  });

  it('near above is a note within 5°', () => {
    // elevation falls by 8° in the hour before: half an hour before setting it is about 4° above the limit
    const plan = makePlan([
      makeScan('a', { ...af, startMs: Math.floor(settingMs() / 1000) * 1000 - 1_800_000 }),
    ]);
    const problem = only(plan, 'limit');
    expect(problem.severity).toBe('note');
    expect(problemSentence(problem, plan, makeContext())).toMatchObject({ shortfall: null });
    expect(mended(plan, problem, makeContext(), 0).left).toBeUndefined();
  });

  it('of a mask is told as the mask', () => {
    const horizon = [
      { azimuthDeg: 200, elevationDeg: 50 },
      { azimuthDeg: 280, elevationDeg: 50 },
    ];
    const context = withStation('Af', { horizon });
    const plan = makePlan([makeScan('a', af)]);
    const problem = only(plan, 'limit', context);
    expect(problemSentence(problem, plan, context).what).toContain('the mask is 50.0°');
  });

  it('set for the whole session holds on top of the station’s own', () => {
    const { settings } = makeContext();
    const context = makeContext({ settings: { ...settings, minElevationDeg: 47 } });
    expect(only(makePlan([makeScan('a', af)]), 'limit', context)).toMatchObject({
      severity: 'fix',
      atMs: T0,
    });
  });

  it('above the highest must be fixed, and below it there is no note', () => {
    const plan = makePlan([makeScan('a', af)]);
    const problem = only(plan, 'limit', withStation('Af', { maxElevationDeg: 46 }));
    expect(problemSentence(problem, plan, makeContext()).shortfall).toBe('0.3° too high');
    expect(checkPlan(plan, withStation('Af', { maxElevationDeg: 46.5 }))).toEqual([]);
  });
});

describe('two scans at once', () => {
  const plan = makePlan([
    makeScan('a', af),
    makeScan('b', { sourceId: 'src-c', startMs: T0 + 540_000, stations: [member('Af'), member('Bm')] }),
  ]);

  it('at one station must be fixed, and nothing is said of the slew between', () => {
    const problems = checkPlan(plan, makeContext());
    expect(problems.map(({ key }) => key)).toEqual(['overlap:b:Af']);
    expect(problemSentence(only(plan, 'overlap'), plan, makeContext())).toEqual({
      who: 'Af, scan 2.',
      what: 'It is still on scan 1 when this one starts',
      shortfall: '1 min 00 s in both at once',
    });
  });

  it('is mended by leaving the station out of either', () => {
    const problem = only(plan, 'overlap');
    expect(mended(plan, problem, makeContext(), 0)).toMatchObject({
      label: 'Leave Af out of scan 2',
      left: undefined,
    });
    expect(mended(plan, problem, makeContext(), 1)).toMatchObject({
      label: 'Leave Af out of scan 1',
      left: undefined,
    });
  });

  it('on disjoint stations is no problem', () => {
    const scans = [makeScan('a', af), makeScan('b', { sourceId: 'src-c', stations: [member('Bm')] })];
    expect(checkPlan(makePlan(scans), makeContext())).toEqual([]);
  });

  it('that only touch are judged by their slew', () => {
    const touching = [makeScan('a', af), makeScan('b', { ...af, sourceId: 'src-c', startMs: T0 + 600_000 })];
    expect(checkPlan(makePlan(touching), makeContext()).map(({ kind }) => kind)).toEqual(['slew']);
  });
});

describe('a scan outside the session', () => {
  const span = { startMs: T0, lengthSeconds: 3600 };
  const outside = (startMs: number, lengthSeconds = 600) =>
    makePlan([makeScan('a', { ...af, startMs, lengthSeconds })], [], { span });

  it.each([
    ['before', outside(T0 - 300_000), 'It starts 5 min 00 s before the session', 'Move scan 1 to 01:00:00'],
    ['after', outside(T0 + 3_300_000), 'It ends 5 min 00 s after the session', 'Move scan 1 to 01:50:00'],
    [
      'on both sides',
      outside(T0 - 60_000, 3720),
      'It starts 1 min 00 s before the session and ends 1 min 00 s after the session',
      'Cut scan 1 to the session',
    ],
  ])('%s must be fixed, and each mend takes the problem away', (_where, plan, what, label) => {
    const problem = only(plan, 'outside');
    expect(problem).toMatchObject({ severity: 'fix', station: null, key: 'outside:a:*' });
    expect(problemSentence(problem, plan, makeContext())).toEqual({ who: 'Scan 1.', what, shortfall: null });
    expect(mended(plan, problem, makeContext(), 0)).toMatchObject({ label, left: undefined });
    expect(mended(plan, problem, makeContext(), 1)).toMatchObject({
      label: 'Remove scan 1',
      left: undefined,
    });
  });

  it('is inside when it fills the session to the second', () => {
    expect(checkPlan(outside(T0, 3600), makeContext())).toEqual([]);
  });
});

describe('a station that is away', () => {
  const awayFor = (from: number, until: number): PlanContext =>
    makeContext({
      away: {
        Af: [{ start: new Date(T0 + from * 1000), end: new Date(T0 + until * 1000), why: 'declined: wind' }],
      },
    });
  const plan = makePlan([makeScan('a', af)]);

  it('for a part of a scan must be fixed, and is mended by the longer part that is left', () => {
    const context = awayFor(-600, 120);
    const problem = only(plan, 'away', context);
    expect(problem).toMatchObject({ severity: 'fix', station: 'Af' });
    expect(problemSentence(problem, plan, context)).toMatchObject({ shortfall: 'a part of it' });
    const { label, left } = mended(plan, problem, context, 0);
    expect(label).toBe('Af joins at 01:02:00, 2 min late');
    expect(left).toBeUndefined();
  });

  it('for all of it can only be left out', () => {
    const context = awayFor(-600, 1200);
    const problem = only(plan, 'away', context);
    expect(problemSentence(problem, plan, context)).toEqual({
      who: 'Af, scan 1.',
      what: 'The station is away from 00:50:00 to 01:20:00, declined: wind',
      shortfall: 'all of it',
    });
    expect(problemMends(problem, plan, context).map(({ label }) => label)).toEqual(['Leave Af out']);
  });

  it('for several scans is one problem, and is mended in one step', () => {
    const two = makePlan([makeScan('a', af), makeScan('b', { ...af, startMs: T0 + 900_000 })]);
    const context = awayFor(300, 1200);
    const problem = only(two, 'away', context);
    expect(problemSentence(problem, two, context)).toMatchObject({
      who: 'Af, from scan 1.',
      shortfall: '2 scans',
    });
    const { label, plan: after } = mended(two, problem, context, 0);
    expect(label).toBe('Leave Af out of 2 scans');
    expect(after.scans.map(({ stations }) => stations)).toEqual([[], []]);
  });

  it('before or after it is no problem', () => {
    expect(checkPlan(plan, awayFor(-600, 0)).filter(({ kind }) => kind === 'away')).toEqual([]);
    expect(checkPlan(plan, awayFor(600, 900)).filter(({ kind }) => kind === 'away')).toEqual([]);
  });
});

describe('a clock', () => {
  const hour = 3_600_000;
  const plan = makePlan([makeScan('a'), makeScan('b', { startMs: T0 + 2 * hour })]);
  const readAgo = (hours: number | null) =>
    makeContext({
      nowMs: T0 - 10 * hour,
      clockReadAtMs: { Bm: hours === null ? null : T0 - (10 + hours) * hour },
    });

  it('read more than the note age ago is told once, at the first scan, with nothing to mend', () => {
    const context = readAgo(31);
    const problem = only(plan, 'clock', context);
    expect(problem).toMatchObject({ key: 'clock:*:Bm', severity: 'note', scanId: 'a' });
    expect(problemSentence(problem, plan, context)).toEqual({
      who: 'Bm.',
      what: 'The newest reading of its clock is 31 h old',
      shortfall: null,
    });
    expect(problemMends(problem, plan, context)).toEqual([]);
  });

  it('read days ago, or never, says so', () => {
    const words = (context: PlanContext) => problemSentence(only(plan, 'clock', context), plan, context).what;
    expect(words(readAgo(80))).toBe('The newest reading of its clock is 3 days old');
    expect(words(readAgo(null))).toBe('Its clock was never read');
  });

  it('read within the note age, or not judged, is no problem', () => {
    expect(checkPlan(plan, readAgo(24)).filter(({ kind }) => kind === 'clock')).toEqual([]);
    expect(checkPlan(plan, makeContext()).filter(({ kind }) => kind === 'clock')).toEqual([]);
  });
});

describe('the whole second of a formatter', () => {
  const plan = makePlan([makeScan('a'), makeScan('b', { startMs: T0 + 3_600_000 })]);
  const at = Date.UTC(2027, 1, 10, 12, 10);

  it('that is off must be fixed, once for each station', () => {
    const context = makeContext({ clockSecond: { Bm: { off: -1, atMs: at } } });
    const problem = only(plan, 'second', context);
    expect(problem).toMatchObject({ key: 'second:*:Bm', severity: 'fix', scanId: 'a' });
    expect(problemSentence(problem, plan, context)).toEqual({
      who: 'Bm.',
      what: 'The second of its formatter is off by −1 s, checked on day 041 at 12:10:00. Re-synchronise it and check again',
      shortfall: null,
    });
    expect(problemMends(problem, plan, context)).toEqual([]);
  });

  it('that was not checked since a re-sync, or ever, is a note', () => {
    const words = (sinceMs: number | null) => {
      const context = makeContext({ clockSecond: { Bm: { off: null, atMs: sinceMs } } });
      const problem = only(plan, 'second', context);
      expect(problem.severity).toBe('note');
      return problemSentence(problem, plan, context).what;
    };
    expect(words(at)).toBe(
      'The second of its formatter was not checked against UTC since it was re-synchronised on day 041 at 12:10:00',
    );
    expect(words(null)).toBe('The second of its formatter was not checked against UTC');
  });

  it('of which nothing is wrong is no problem', () => {
    const context = makeContext({ clockSecond: {} });
    expect(checkPlan(plan, context).filter(({ kind }) => kind === 'second')).toEqual([]);
    expect(checkPlan(plan, makeContext()).filter(({ kind }) => kind === 'second')).toEqual([]);
  });
});

describe('the list of problems', () => {
  it('has what must be fixed first, then goes by time', () => {
    const plan = makePlan(
      [
        makeScan('note', { ...af, startMs: Math.floor(settingMs() / 1000) * 1000 - 1_800_000 }),
        makeScan('late', { ...af, sourceId: 'src-b', startMs: T0 + 60_000 }),
        makeScan('first', { ...af, startMs: T0 - 7_200_000 }),
        makeScan('start', af),
      ],
      [],
    );
    const problems = checkPlan(plan, makeContext());
    expect(problems.map(({ key }) => key)).toEqual(['outside:first:*', 'overlap:late:Af', 'limit:note:Af']);
    expect(new Set(problems.map(({ key }) => key)).size).toBe(problems.length);
  });
});
