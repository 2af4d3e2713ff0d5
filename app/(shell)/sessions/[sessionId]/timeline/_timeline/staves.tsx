import type { Timeline } from '@/src/data/plan/dto';
import type { PlanStation } from '@/src/schedule/context';
import { AnswerMark } from './away';
import { DAY, HEAD, crisp, staveTop, ticks, viewEndMs, xOf, yOf, type Frame } from './scale';

/** Time lines over the sheet: thin, strong, midnight. */
export function TimeLines({ frame }: { frame: Frame }) {
  const { level, view } = frame;
  const top = frame.headings + 38;
  const bands = { hair: '', rule: '', midnight: '' };
  for (const ms of ticks(view.startMs, viewEndMs(view), level.minorMs)) {
    const x = crisp(xOf(frame, ms));
    const major = ms % level.majorMs === 0;
    const line = `M${x} ${top}V${major ? frame.upBase : frame.fringeBase}`;
    if (ms % DAY === 0) bands.midnight += line;
    else if (major) bands.rule += line;
    else bands.hair += line;
  }
  return (
    <g fill="none">
      <path d={bands.hair} stroke="var(--hair)" />
      <path d={bands.rule} stroke="var(--rule)" />
      <path d={bands.midnight} stroke="var(--ink)" strokeWidth={1.75} />
    </g>
  );
}

/** Lines of 0°, 30°, 60°, 90° and the head of each stave. */
export function Staves({
  frame,
  stations,
  answers,
}: {
  frame: Frame;
  stations: readonly PlanStation[];
  answers: Timeline['answers'];
}) {
  const tight = frame.staveHeight < 50;
  return (
    <g>
      {stations.map((station, index) => {
        const top = staveTop(frame, index);
        const base = top + frame.staveHeight;
        const longitude = station.site.longitudeDeg;
        const answer = answers[station.code];
        return (
          <g key={station.code}>
            {[90, 60, 30].map((elevation) => (
              <line
                key={elevation}
                x1={HEAD - 6}
                x2={frame.right}
                y1={crisp(yOf(frame, index, elevation))}
                y2={crisp(yOf(frame, index, elevation))}
                stroke="var(--rule)"
                strokeWidth={0.75}
                strokeOpacity={0.8}
              />
            ))}
            <line x1={HEAD - 6} x2={frame.right} y1={crisp(base)} y2={crisp(base)} stroke="var(--ink)" />
            <line x1={HEAD - 0.5} x2={HEAD - 0.5} y1={top} y2={base} stroke="var(--ink)" />
            {answer && <AnswerMark answer={answer} top={top} isTight={tight} />}
            <text className="s" x={10} y={top + 15} fontSize={tight ? 16 : 19} fontWeight={600}>
              {station.code}
            </text>
            <text
              x={10}
              y={top + (tight ? 29 : 32)}
              fontSize={12}
              fontWeight={500}
              style={{ fontStretch: '80%' }}
            >
              {station.name}
            </text>
            {!tight && (
              <text x={10} y={top + 47} fontSize={11} className="fill-ink2">
                {Math.abs(longitude).toFixed(1)}° {longitude < 0 ? 'W' : 'E'}
              </text>
            )}
            {index === 0 &&
              [90, 60, 30].map((elevation) => (
                <text
                  key={elevation}
                  x={HEAD - 9}
                  y={yOf(frame, 0, elevation) + 4}
                  fontSize={10}
                  textAnchor="end"
                  className="fill-ink3"
                >
                  {elevation}
                  {elevation === 90 ? '°' : ''}
                </text>
              ))}
          </g>
        );
      })}
      {stations.length > 0 && (
        <line
          x1={4.5}
          x2={4.5}
          y1={staveTop(frame, 0)}
          y2={frame.stavesEnd}
          stroke="var(--ink)"
          strokeWidth={2.5}
        />
      )}
    </g>
  );
}
