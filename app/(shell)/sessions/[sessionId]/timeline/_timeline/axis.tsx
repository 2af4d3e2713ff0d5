import { gmstHours } from '@/src/sky/position';
import { dayOfYear, utcParts } from '@/src/units/time';
import { AXIS, DAY, HOUR, MINUTE, crisp, ticks, viewEndMs, xOf, type Frame } from './scale';

const two = (value: number) => String(value).padStart(2, '0');
const day3 = (ms: number) => String(dayOfYear(ms)).padStart(3, '0');

/** UT with day of year, and GMST under it. */
export function Axis({ frame }: { frame: Frame }) {
  const { view, width } = frame;
  const endMs = viewEndMs(view);
  const perHour = frame.drawWidth / view.hours;
  const every = perHour >= 30 ? HOUR : 2 * HOUR;
  const midnights = ticks(view.startMs, endMs, DAY);
  const firstLabelFits = midnights.every(
    (ms) => xOf(frame, ms) < frame.left || xOf(frame, ms) > frame.left + 96,
  );
  const startYear = utcParts(view.startMs).year;
  return (
    <g>
      <text x={10} y={14} fontSize={11.5} className="fill-ink2">
        UT
      </text>
      {firstLabelFits && (
        <text x={frame.left + 6} y={14} fontSize={12} fontWeight={600}>
          {startYear} day {day3(view.startMs)}
        </text>
      )}
      {midnights.map((ms) => {
        const x = xOf(frame, ms);
        if (x > frame.right - 50) return null;
        return (
          <text key={ms} x={x + 7} y={14} fontSize={12} fontWeight={600}>
            {firstLabelFits ? '' : `${startYear} `}day {day3(ms)}
          </text>
        );
      })}
      {ticks(view.startMs, endMs, Math.min(frame.level.minorMs, HOUR)).map((ms) => {
        const x = crisp(xOf(frame, ms));
        const midnight = ms % DAY === 0;
        const hour = ms % HOUR === 0;
        return (
          <line
            key={ms}
            x1={x}
            x2={x}
            y1={midnight ? 2 : hour ? 22 : 34}
            y2={AXIS.hours}
            stroke={midnight ? 'var(--ink)' : hour ? 'var(--rule)' : 'var(--hair)'}
            strokeWidth={midnight ? 1.75 : 1}
          />
        );
      })}
      {ticks(view.startMs, endMs, every).map((ms) => {
        const x = xOf(frame, ms);
        const atEnd = x > frame.right - 14;
        return (
          <text
            key={ms}
            x={atEnd ? x : x + 5}
            y={35}
            fontSize={13}
            fontWeight={600}
            textAnchor={atEnd ? 'middle' : 'start'}
          >
            {two(utcParts(ms).hour)}
          </text>
        );
      })}
      {perHour >= 90 &&
        ticks(view.startMs, endMs, 20 * MINUTE)
          .filter((ms) => ms % HOUR !== 0 && xOf(frame, ms) > frame.left + 6)
          .map((ms) => (
            <text key={ms} x={xOf(frame, ms)} y={31} fontSize={10} textAnchor="middle" className="fill-ink3">
              {two(utcParts(ms).minute)}
            </text>
          ))}
      <line x1={0} x2={width} y1={AXIS.hours + 0.5} y2={AXIS.hours + 0.5} stroke="var(--ink)" />
      <GmstRow frame={frame} />
    </g>
  );
}

const SIDEREAL_PER_UT = 1.00273790935;

function GmstRow({ frame }: { frame: Frame }) {
  const { view } = frame;
  const start = gmstHours(new Date(view.startMs));
  const step = frame.drawWidth / view.hours >= 60 ? 1 / 3 : 1;
  const labelEvery = frame.drawWidth / view.hours >= 30 ? 1 : 2;
  const marks: { x: number; hour: number | null }[] = [];
  for (let k = Math.ceil(start / step - 1e-9); k * step < start + view.hours * SIDEREAL_PER_UT; k++) {
    const gmst = k * step;
    const ms = view.startMs + ((gmst - start) / SIDEREAL_PER_UT) * HOUR;
    const whole = Math.abs(gmst - Math.round(gmst)) < 1e-6;
    marks.push({ x: xOf(frame, ms), hour: whole ? Math.round(gmst) % 24 : null });
  }
  return (
    <g>
      <text x={10} y={51} fontSize={11} className="fill-ink2">
        GMST
      </text>
      {marks.map(({ x, hour }) => (
        <g key={x}>
          <line
            x1={crisp(x)}
            x2={crisp(x)}
            y1={hour === null ? 50 : 41}
            y2={AXIS.gmst}
            stroke={hour === null ? 'var(--rule)' : 'var(--edge)'}
          />
          {hour !== null && hour % labelEvery === 0 && x < frame.right - 24 && (
            <text x={x + 4} y={51} fontSize={10} className="fill-ink2">
              {two(hour)} h
            </text>
          )}
        </g>
      ))}
      <line x1={0} x2={frame.width} y1={AXIS.gmst + 0.5} y2={AXIS.gmst + 0.5} stroke="var(--rule)" />
    </g>
  );
}
