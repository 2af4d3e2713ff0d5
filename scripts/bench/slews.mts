import { pointingsOf, type PointedScan } from '../../src/sky/pointing';
import { firstPointing, pointingAtEnd, slewBetween, type SlewStation } from '../../src/sky/slew';
import type { DrivenAxis, Mount, MountKind, Pointing } from '../../src/sky/types';
import { SPAN, inventedSources, inventedStations } from './invented-sky';
import { medianSeconds, report } from './measure';

const KINDS: readonly MountKind[] = ['az-el', 'ha-dec', 'xy-ns', 'xy-ew'];
const SCANS = 1000;

function mountOf(kind: MountKind): Mount {
  const first: DrivenAxis = { minDeg: -170, maxDeg: 170, rateDegPerS: 1.5, accelDegPerS2: 0.5 };
  const second: DrivenAxis = { minDeg: -85, maxDeg: 85, rateDegPerS: 1, accelDegPerS2: 0.5 };
  const settleSeconds = 3;
  switch (kind) {
    case 'az-el':
      return { kind, azimuth: { ...first, minDeg: -90, maxDeg: 450 }, elevation: second, settleSeconds };
    case 'ha-dec':
      return { kind, hourAngle: first, declination: second, settleSeconds };
    case 'xy-ns':
    case 'xy-ew':
      return { kind, x: first, y: second, settleSeconds };
  }
}

/** Every station in every scan, below its horizon or not: nothing is left out of the work. */
const sources = inventedSources(100);
const startMs = SPAN.start.getTime();
const everyMs = (SPAN.end.getTime() - startMs) / SCANS;
const scans = Array.from({ length: SCANS }, (_, index): PointedScan[] => {
  const source = sources[(index * 37) % sources.length];
  const fromMs = startMs + Math.round(index * everyMs);
  const scan = { start: new Date(fromMs), end: new Date(fromMs + 60_000) };
  return source ? [{ source, scan }] : [];
}).flat();
const sites = inventedStations(16, false).map(({ site }) => site);
const azEl: SlewStation[] = sites.map((site) => ({ site, mount: mountOf('az-el') }));
const mixed: SlewStation[] = sites.map((site, index) => ({
  site,
  mount: mountOf(KINDS[index % KINDS.length] ?? 'az-el'),
}));

/** Scan by scan and station by station, each call on its own. */
function oneByOne(stations: readonly SlewStation[]): number {
  let total = 0;
  for (const station of stations) {
    let held: Pointing | null = null;
    for (const target of scans) {
      const found: ReturnType<typeof slewBetween> | ReturnType<typeof firstPointing> = held
        ? slewBetween(station, held, target)
        : firstPointing(station, target);
      if ('impossible' in found) continue;
      const pointing: Pointing = 'pointing' in found ? found.pointing : found;
      if ('seconds' in found) total += found.seconds;
      held = pointingAtEnd(station, pointing, target);
    }
  }
  return total;
}

const inOnePass = (stations: readonly SlewStation[]) =>
  pointingsOf(scans, stations).slewSeconds.reduce((sum, s) => (s > 0 ? sum + s : sum), 0);

for (const [name, stations] of [
  ['slews', azEl],
  ['slews-all-mounts', mixed],
] as const) {
  const [together, apart] = [inOnePass(stations), oneByOne(stations)];
  if (!(Math.abs(together - apart) < 1e-3)) throw new Error(`Slews differ: ${together} and ${apart} s`);
  report({
    name,
    unit: 'ms',
    n: scans.length * stations.length,
    seconds: medianSeconds(() => inOnePass(stations)),
    peer: {
      peer: 'the straightforward route in this process: slewBetween and pointingAtEnd for each scan and station',
      seconds: medianSeconds(() => oneByOne(stations), { warmupSeconds: 0.5, seconds: 1 }),
    },
    wanted: { atMost: 10 },
  });
}
