import { clockText } from '@/src/schedule/words';
import { stationsUp, tableElevationDeg, type SkyTable } from '@/src/schedule/sky-table';
import type { PlanStation } from '@/src/schedule/context';
import { crisp, staveTop, ticks, viewEndMs, xOf, yOf, type Frame } from './scale';

type Props = { frame: Frame; table: SkyTable; sourceId: string; stations: readonly PlanStation[] };

/** Elevation of the source in focus, filled where it is above the mask. */
export function Ribbons({ frame, table, sourceId, stations }: Props) {
  let fill = '';
  let edge = '';
  stations.forEach((station, index) => {
    for (const points of ribbonPoints(frame, table, sourceId, station.code, index)) {
      const line = points.map(([x, y]) => `${x.toFixed(1)} ${y.toFixed(1)}`).join('L');
      const base = staveTop(frame, index) + frame.staveHeight;
      edge += `M${line}`;
      fill += `M${line}V${base}H${points[0]?.[0].toFixed(1)}Z`;
    }
  });
  return (
    <g>
      <path d={fill} fill="var(--teal-wash)" />
      <path d={edge} fill="none" stroke="var(--teal)" strokeWidth={1.1} />
    </g>
  );
}

/** "rises 00:06" at the foot of a ribbon that begins or ends inside the view. */
export function RiseAndSet({ frame, table, sourceId, stations }: Props) {
  const endMs = viewEndMs(frame.view);
  const marks = stations.flatMap((station, index) =>
    (table.windows[sourceId]?.[station.code] ?? []).flatMap(([riseMs, setMs]) => [
      ...(riseMs > Math.max(frame.view.startMs, table.startMs) && riseMs < endMs
        ? [{ index, ms: riseMs, word: 'rises' }]
        : []),
      ...(setMs > frame.view.startMs && setMs < Math.min(endMs, lastMs(table))
        ? [{ index, ms: setMs, word: 'sets' }]
        : []),
    ]),
  );
  return (
    <g>
      {marks.map(({ index, ms, word }) => {
        const x = xOf(frame, ms);
        const base = staveTop(frame, index) + frame.staveHeight;
        const isRise = word === 'rises';
        const toLeft = isRise ? x > frame.left + 60 : x > frame.right - 56;
        return (
          <g key={`${index}${word}${ms}`}>
            <line x1={x} x2={x} y1={base - 10} y2={base} stroke="var(--teal)" strokeWidth={1.25} />
            <rect
              x={toLeft ? x - 57 : x + 4}
              y={base - 13}
              width={53}
              height={12}
              fill="var(--sheet)"
              fillOpacity={0.92}
            />
            <text
              x={toLeft ? x - 5 : x + 5}
              y={base - 3}
              fontSize={10.5}
              fontWeight={560}
              textAnchor={toLeft ? 'end' : 'start'}
              className="fill-teal"
            >
              {word} {clockText(ms).slice(0, 5)}
            </text>
          </g>
        );
      })}
    </g>
  );
}

/** Counts the ribbons; without a source in focus there are none. */
export function StationsUpStrip({
  frame,
  table,
  sourceId,
}: Pick<Props, 'frame' | 'table'> & { sourceId: string | null }) {
  const y = frame.upBase;
  const endMs = Math.min(viewEndMs(frame.view), lastMs(table));
  const startMs = Math.max(frame.view.startMs, table.startMs);
  const steps = sourceId !== null && endMs > startMs ? stationsUp(table, sourceId, startMs, endMs) : [];
  return (
    <g>
      <text x={10} y={y - 6} fontSize={11} className="fill-ink2">
        Stations up
      </text>
      {sourceId === null && (
        <text x={frame.left + 6} y={y - 6} fontSize={11} className="fill-ink3">
          Choose a scan or a source to see where it is up.
        </text>
      )}
      {steps.map(({ startMs: from, endMs: to, up }) => {
        const x1 = xOf(frame, from);
        const x2 = xOf(frame, to);
        return (
          <g key={from}>
            <rect
              x={x1}
              y={y - 17}
              width={Math.max(0, x2 - x1)}
              height={16}
              fill="var(--teal-wash)"
              fillOpacity={0.6}
            />
            {from > startMs && (
              <line x1={crisp(x1)} x2={crisp(x1)} y1={y - 17} y2={y - 1} stroke="var(--teal)" />
            )}
            {x2 - x1 > 12 && (
              <text
                x={(x1 + x2) / 2}
                y={y - 5}
                fontSize={11}
                fontWeight={620}
                textAnchor="middle"
                className="fill-teal"
              >
                {up}
              </text>
            )}
          </g>
        );
      })}
    </g>
  );
}

const lastMs = (table: SkyTable) => {
  const nodes = Object.values(Object.values(table.elevations)[0] ?? {})[0]?.length ?? 1;
  return table.startMs + (nodes - 1) * table.stepSeconds * 1000;
};

function ribbonPoints(frame: Frame, table: SkyTable, sourceId: string, code: string, index: number) {
  const viewEnd = viewEndMs(frame.view);
  return (table.windows[sourceId]?.[code] ?? []).flatMap(([riseMs, setMs]) => {
    const from = Math.max(riseMs, frame.view.startMs);
    const to = Math.min(setMs, viewEnd);
    if (to <= from) return [];
    const at = [from, ...ticks(from + 1, to - 1, table.stepSeconds * 1000), to];
    return [
      at.map((ms): [number, number] => [
        xOf(frame, ms),
        yOf(frame, index, tableElevationDeg(table, sourceId, code, ms) ?? 0),
      ]),
    ];
  });
}
