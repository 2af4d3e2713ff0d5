import type { PathLeg } from '@/src/schedule/paths';
import { blocksOf, type Block } from '@/src/schedule/blocks';
import { scanStopMs, stationOnMs, type Plan, type Scan } from '@/src/schedule/plan';
import { tableElevationDeg, type SkyTable } from '@/src/schedule/sky-table';
import type { PlanStation } from '@/src/schedule/context';
import { crisp, staveTop, ticks, viewEndMs, xOf, yOf, type Frame } from './scale';

type Legs = ReadonlyMap<string, readonly PathLeg[]>;

export const inView = (frame: Frame, scan: Pick<Scan, 'startMs' | 'lengthSeconds'>) =>
  scanStopMs(scan) > frame.view.startMs && scan.startMs < viewEndMs(frame.view);

export const isBlockInView = (frame: Frame, block: Pick<Block, 'startMs' | 'stopMs'>) =>
  block.stopMs > frame.view.startMs && block.startMs < viewEndMs(frame.view);

/** Tints, start and stop lines, and the bracket that ties a scan's stations together. */
export function Brackets({
  frame,
  plan,
  stations,
  fadedScanId,
}: {
  frame: Frame;
  plan: Plan;
  stations: readonly PlanStation[];
  fadedScanId: string | null;
}) {
  const blocks = blocksOf(plan).filter((block) => isBlockInView(frame, block));
  const isFaded = (block: Block) => block.legs.some(({ id }) => id === fadedScanId);
  const solid = bracketPaths(
    frame,
    blocks.filter((block) => !isFaded(block)),
    stations,
  );
  const faded = bracketPaths(frame, blocks.filter(isFaded), stations);
  return (
    <>
      <BracketPaths {...solid} />
      {fadedScanId && (
        <g opacity={0.35}>
          <BracketPaths {...faded} />
        </g>
      )}
    </>
  );
}

type Paths = { tint: string; out: string; between: string; start: string; stop: string };

function BracketPaths({ tint, out, between, start, stop }: Paths) {
  return (
    <g fill="none">
      <path d={tint} fill="rgb(var(--shade)/.07)" />
      <path d={out} stroke="var(--ink2)" strokeWidth={0.75} strokeOpacity={0.55} strokeDasharray="1 3" />
      <path d={between} stroke="var(--ink)" strokeOpacity={0.75} />
      <path d={start} stroke="var(--ink)" strokeWidth={1.25} />
      <path d={stop} stroke="var(--ink)" strokeWidth={0.6} strokeOpacity={0.55} />
    </g>
  );
}

function bracketPaths(frame: Frame, blocks: readonly Block[], stations: readonly PlanStation[]): Paths {
  const paths: Paths = { tint: '', out: '', between: '', start: '', stop: '' };
  for (const block of blocks) {
    const bracketX = crisp(xOf(frame, block.startMs));
    const top = frame.headings + 36;
    const members = new Map(stations.map(({ code }) => [code, stationSpan(block, code)]));
    const rows = stations.flatMap(({ code }, index) => (members.get(code) ? [index] : []));
    const last = rows.at(-1);
    if (bracketX >= frame.left && bracketX <= frame.right) {
      paths.out += `M${bracketX} ${top}V${frame.stavesEnd}`;
      if (rows[0] !== undefined) paths.between += `M${bracketX} ${top}V${staveTop(frame, rows[0])}`;
      for (let row = rows[0] ?? 0; last !== undefined && row < last; row++) {
        paths.between += `M${bracketX} ${staveTop(frame, row) + frame.staveHeight}V${staveTop(frame, row + 1)}`;
      }
    }
    stations.forEach(({ code }, index) => {
      const member = members.get(code);
      if (!member) return;
      const x1 = Math.max(frame.left, crisp(xOf(frame, member.startMs)));
      const x2 = Math.min(frame.right, crisp(xOf(frame, member.stopMs)));
      if (x2 <= x1) return;
      const y = staveTop(frame, index);
      const box = `V${y + frame.staveHeight}`;
      paths.tint += `M${x1} ${y}H${x2}${box}H${x1}Z`;
      paths.start += `M${x1} ${y}${box}`;
      paths.stop += `M${x2} ${y}${box}`;
    });
  }
  return paths;
}

/** From when to when a station takes part; a group from its first leg to its last. */
function stationSpan(block: Block, code: string): { startMs: number; stopMs: number } | null {
  const spans = block.legs.flatMap((scan) => {
    const member = scan.stations.find(({ station }) => station === code);
    return member ? [stationOnMs(scan, member)] : [];
  });
  const first = spans[0];
  if (!first) return null;
  return { startMs: first.startMs, stopMs: Math.max(...spans.map(({ stopMs }) => stopMs)) };
}

/** A note follows the source's elevation from start to stop; late ones are hollow and vermilion. */
export function Notes({
  frame,
  plan,
  stations,
  legs,
  table,
  focusId,
  lateKeys,
  fadedScanId,
}: {
  frame: Frame;
  plan: Plan;
  stations: readonly PlanStation[];
  legs: Legs;
  table: SkyTable;
  focusId: string | null;
  /** scan:station of legs that must be fixed */
  lateKeys: ReadonlySet<string>;
  fadedScanId: string | null;
}) {
  const scanOf = new Map(plan.scans.map((scan) => [scan.id, scan]));
  const paths = { ink: '', focus: '', late: '', lateInner: '', faded: '', leg: '', hollow: '' };
  stations.forEach(({ code }, index) => {
    for (const leg of legs.get(code) ?? []) {
      if (leg.stopMs <= frame.view.startMs || leg.startMs >= viewEndMs(frame.view)) continue;
      const scan = scanOf.get(leg.scanId);
      const sourceId = scan?.sourceId ?? '';
      const kind =
        leg.scanId === fadedScanId
          ? 'faded'
          : lateKeys.has(`${leg.scanId}:${code}`)
            ? 'late'
            : sourceId === focusId
              ? 'focus'
              : 'ink';
      if (scan?.leg && kind === 'ink') {
        const path = `M${xOf(frame, leg.startMs).toFixed(1)} ${yOf(frame, index, leg.startAzEl.elevationDeg).toFixed(1)}L${xOf(frame, leg.stopMs).toFixed(1)} ${yOf(frame, index, leg.stopAzEl.elevationDeg).toFixed(1)}`;
        paths[scan.leg === 'target' ? 'leg' : 'hollow'] += path;
        continue;
      }
      paths[kind] += notePath(frame, table, sourceId, leg, index, 0);
      if (kind === 'late') paths.lateInner += notePath(frame, table, sourceId, leg, index, 2);
    }
  });
  const width = frame.view.hours > 12 ? 5 : 7;
  return (
    <g fill="none">
      <path d={paths.faded} stroke="var(--note)" strokeWidth={width} opacity={0.35} />
      <path d={paths.ink} stroke="var(--note)" strokeWidth={width} />
      <path d={paths.leg} stroke="var(--note)" strokeWidth={width} />
      <path d={paths.hollow} stroke="var(--note)" strokeWidth={width} />
      <path d={paths.hollow} stroke="var(--sheet)" strokeWidth={width - 2} />
      <path d={paths.focus} stroke="var(--teal)" strokeWidth={width} />
      <path d={paths.late} stroke="var(--verm)" strokeWidth={width + 1} />
      <path d={paths.lateInner} stroke="var(--sheet)" strokeWidth={width - 2.5} />
    </g>
  );
}

/** Smallest drawn width 3 px; `inset` px are left free at both ends. */
export function notePath(
  frame: Frame,
  table: SkyTable,
  sourceId: string,
  leg: Pick<PathLeg, 'startMs' | 'stopMs' | 'startAzEl' | 'stopAzEl' | 'station'>,
  index: number,
  inset: number,
): string {
  const x1 = xOf(frame, leg.startMs) + inset;
  const x2 = Math.max(xOf(frame, leg.stopMs) - inset, x1 + 3 - Math.min(2, inset));
  const inner = ticks(leg.startMs + 1, leg.stopMs - 1, table.stepSeconds * 1000)
    .map((ms) => [ms, tableElevationDeg(table, sourceId, leg.station, ms)] as const)
    .filter(([ms]) => xOf(frame, ms) > x1 && xOf(frame, ms) < x2)
    .map(([ms, elevation]) => `L${xOf(frame, ms).toFixed(1)} ${yOf(frame, index, elevation ?? 0).toFixed(1)}`)
    .join('');
  const end = yOf(frame, index, leg.stopAzEl.elevationDeg).toFixed(1);
  return `M${x1.toFixed(1)} ${yOf(frame, index, leg.startAzEl.elevationDeg).toFixed(1)}${inner}L${x2.toFixed(1)} ${end}`;
}

/** The path of each dish between notes: slanted while it slews, dotted while it waits. */
export function Slews({
  frame,
  stations,
  legs,
  lateKeys,
  fadedScanId,
}: {
  frame: Frame;
  stations: readonly PlanStation[];
  legs: Legs;
  lateKeys: ReadonlySet<string>;
  fadedScanId: string | null;
}) {
  const paths = { slew: '', late: '', wait: '', faded: '' };
  const endMs = viewEndMs(frame.view);
  stations.forEach(({ code }, index) => {
    const row = legs.get(code) ?? [];
    row.forEach((leg, at) => {
      const before = row[at - 1];
      if (!before || leg.slewSeconds === null || before.stopMs >= endMs || leg.startMs <= frame.view.startMs)
        return;
      const arriveMs = before.stopMs + leg.slewSeconds * 1000;
      const x1 = xOf(frame, before.stopMs);
      const y1 = yOf(frame, index, before.stopAzEl.elevationDeg);
      const x2 = xOf(frame, arriveMs);
      const y2 = yOf(frame, index, leg.arriveElevationDeg ?? leg.startAzEl.elevationDeg);
      const faded = leg.scanId === fadedScanId || before.scanId === fadedScanId;
      const isLate = lateKeys.has(`${leg.scanId}:${code}`);
      const kind = faded ? 'faded' : isLate ? 'late' : 'slew';
      paths[kind] += `M${x1.toFixed(1)} ${y1.toFixed(1)}L${x2.toFixed(1)} ${y2.toFixed(1)}`;
      if (frame.view.hours <= 8) paths[kind] += crossTicks(x1, y1, x2, y2, leg.azimuthMoveDeg ?? 0);
      const startX = xOf(frame, leg.startMs);
      if (!isLate && startX - x2 > 1.5) {
        const startY = yOf(frame, index, leg.startAzEl.elevationDeg);
        paths[faded ? 'faded' : 'wait'] +=
          `M${x2.toFixed(1)} ${y2.toFixed(1)}L${startX.toFixed(1)} ${startY.toFixed(1)}`;
      }
    });
  });
  return (
    <g fill="none">
      <path d={paths.faded} stroke="var(--ink)" opacity={0.35} />
      <path d={paths.slew} stroke="var(--ink)" />
      <path d={paths.wait} stroke="var(--ink2)" strokeDasharray="1.5 2.5" />
      <path d={paths.late} stroke="var(--verm)" strokeWidth={2.25} />
    </g>
  );
}

/** One cross tick for each 30° of azimuth: height alone hides a turn. */
function crossTicks(x1: number, y1: number, x2: number, y2: number, azimuthDeg: number): string {
  const length = Math.hypot(x2 - x1, y2 - y1);
  const turn = Math.abs(azimuthDeg);
  if (length <= 3) return '';
  const nx = (-(y2 - y1) / length) * 3.2;
  const ny = ((x2 - x1) / length) * 3.2;
  let marks = '';
  for (let count = 1; count * 30 <= turn; count++) {
    const share = (count * 30) / turn;
    const x = x1 + (x2 - x1) * share;
    const y = y1 + (y2 - y1) * share;
    marks += `M${(x - nx).toFixed(1)} ${(y - ny).toFixed(1)}L${(x + nx).toFixed(1)} ${(y + ny).toFixed(1)}`;
  }
  return marks;
}
