import { scanStopMs, type Plan, type Scan, type StationCode } from '@/src/schedule/plan';
import { staveAt, xOf, type Frame } from './scale';
import { inView } from './scans';

export type Hit = { scan: Scan; station: StationCode | null; part: 'body' | 'stop' };

/** Half the least target: 24 px wide however short the scan. */
const REACH = 12;
const STOP_REACH = 4;

/** What lies under a point of the sheet: the whole column of a scan counts, from its heading to the fringe strip. */
export function hitAt(
  frame: Frame,
  plan: Plan,
  stations: readonly { code: StationCode }[],
  x: number,
  y: number,
): Hit | null {
  if (y < frame.headings || y > frame.fringeBase || x < frame.left || x > frame.right) return null;
  const index = staveAt(frame, y);
  const station = index === null ? null : (stations[index]?.code ?? null);
  const near = plan.scans
    .filter((scan) => inView(frame, scan))
    .map((scan) => ({
      scan,
      far: distance(frame, scan, x),
      isOn: station === null || takesPart(scan, station),
    }))
    .filter(({ far }) => far <= Math.max(0, REACH))
    .sort((a, b) => a.far - b.far || Number(b.isOn) - Number(a.isOn));
  const [best] = near;
  if (!best) return null;
  const { scan } = best;
  const stopX = xOf(frame, scanStopMs(scan));
  const wide = stopX - xOf(frame, scan.startMs) >= 3 * STOP_REACH;
  return {
    scan,
    station: station !== null && takesPart(scan, station) ? station : null,
    part: wide && Math.abs(x - stopX) <= STOP_REACH ? 'stop' : 'body',
  };
}

const takesPart = (scan: Scan, code: StationCode) => scan.stations.some(({ station }) => station === code);

/** 0 inside the column; a column narrower than the least target is widened about its middle. */
function distance(frame: Frame, scan: Scan, x: number): number {
  const x1 = xOf(frame, scan.startMs);
  const x2 = xOf(frame, scanStopMs(scan));
  if (x >= x1 && x <= x2 + STOP_REACH) return 0;
  const room = Math.max(0, REACH - (x2 - x1) / 2);
  const far = x < x1 ? x1 - x : x - x2;
  return far <= room ? far : Infinity;
}
