import { expect, it } from 'vitest';
import { seedDemo } from '@/db/seed';
import { seedId } from '@/db/seed-ids';
import { demoStartMs } from '@/db/seed-sessions';
import { readTimeline } from '@/src/data/plan/read';
import { checkPlan } from '@/src/schedule/checks';
import type { PlanContext } from '@/src/schedule/context';
import { unpackPlan } from '@/src/schedule/plan-rows';
import { makeViewer, NOW, openDatabase } from '@/tests/helpers/database';

openDatabase();

const byKey = <T, K extends string>(items: readonly T[], key: (item: T) => K) =>
  Object.fromEntries(items.map((item) => [key(item), item])) as Record<K, T>;

async function demoProblems() {
  const answer = await readTimeline(await makeViewer('admin'), 'ARC-031');
  if (!answer.ok) throw new Error(answer.message);
  const { timeline } = answer;
  const context: PlanContext = {
    stations: byKey(timeline.stations, (station) => station.code),
    sources: byKey(timeline.sources, (source) => source.id),
    modes: byKey(timeline.modes, (mode) => mode.id),
    away: {},
    clockReadAtMs: {},
    nowMs: timeline.nowMs,
    settings: timeline.settings,
  };
  const plan = unpackPlan(timeline.plan);
  return { plan, problems: checkPlan(plan, context) };
}

const scan = (number: number) => seedId('scan', `ARC-031 ${number}`);

/** Sidereal shifts keep the geometry; what is left in half a year is aberration and the rounding to 10 s. */
it.each([0, 9, 100, 187])(
  'the demo’s plan, %i days on, has one slew too late (Af to scan 16) and one low scan (Cf in 15), nothing else',
  async (days) => {
    const now = Date.parse(NOW) + days * 86_400_000;
    if (days > 0) expect(await seedDemo(now)).toBe('moved');
    const { plan, problems } = await demoProblems();
    expect(plan.span.startMs).toBe(demoStartMs(now));
    expect(plan.scans).toHaveLength(89);
    expect(problems.map(({ key, severity }) => [key, severity])).toEqual([
      [`slew:${scan(16)}:Af`, 'fix'],
      [`limit:${scan(15)}:Cf`, 'note'],
    ]);
  },
);

it('the demo’s scans cover the whole 24 h', async () => {
  const { plan } = await demoProblems();
  const starts = plan.scans.map(({ startMs }) => startMs - plan.span.startMs);
  const gaps = starts.slice(1).map((start, index) => start - (starts[index] ?? 0));
  expect(Math.max(...gaps)).toBeLessThanOrEqual(55 * 60_000);
  expect(starts.at(-1)).toBeGreaterThan(23 * 3_600_000);
});
