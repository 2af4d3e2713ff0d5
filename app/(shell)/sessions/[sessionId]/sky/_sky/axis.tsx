import { dayText } from '@/app/_ui/format';
import { utcParts } from '@/src/units/time';
import { FIGURES, ROW } from './row-grid';
import { crisp, gmstTicks, hourTicks, type Scale } from './scale';

const two = (value: number) => String(value).padStart(2, '0');

type Props = { scale: Scale; boxRef: (box: HTMLElement | null) => (() => void) | undefined; heads: string[] };

/** UT with day of year, GMST under it, and the heads of the figures. */
export function Axis({ scale, boxRef, heads }: Props) {
  const ticks = hourTicks(scale);
  const midnights = ticks.filter(({ isMidnight, x }) => isMidnight && x <= scale.width - 46);
  const year = utcParts(scale.startMs).year;
  return (
    <div className={`${ROW} border-b border-rule`} aria-hidden="true">
      <div className="hidden pl-[16px] desk:block">
        <div className="mt-[19px] text-small font-head leading-[16px]">UT</div>
        <div className="text-tick leading-[17px] text-ink2">GMST</div>
      </div>
      <div ref={boxRef} className="min-w-0 overflow-hidden desk:overflow-visible">
        <svg width={scale.width} height={54} className="block overflow-visible">
          {(midnights[0]?.x ?? scale.width) > 96 && (
            <text x={0} y={13} fontSize={12} fontWeight={600}>
              {year} day {dayText(scale.startMs)}
            </text>
          )}
          {midnights.map(({ x, ms }) => (
            <text key={ms} x={x + 6} y={13} fontSize={12} fontWeight={600}>
              day {dayText(ms)}
            </text>
          ))}
          {ticks.map(({ x, ms, hour, isLabelled, isMidnight }) => (
            <g key={ms}>
              <line
                x1={crisp(x)}
                x2={crisp(x)}
                y1={isMidnight ? 3 : 33}
                y2={37}
                stroke={isMidnight ? 'var(--ink)' : 'var(--rule)'}
                strokeWidth={isMidnight ? 1.75 : 1}
              />
              {isLabelled && (
                <text x={x} y={30} fontSize={13} fontWeight={600} textAnchor={anchorAt(x, scale.width)}>
                  {two(hour)}
                </text>
              )}
            </g>
          ))}
          <line x1={0} x2={scale.width} y1={37.5} y2={37.5} stroke="var(--ink)" />
          {gmstTicks(scale).map(({ x, hour }) => (
            <g key={x}>
              <line x1={crisp(x)} x2={crisp(x)} y1={47} y2={53} stroke="var(--ink3)" />
              {x < scale.width - 16 && (
                <text x={x + 3} y={49} fontSize={10} className="fill-ink3">
                  {two(hour)}
                </text>
              )}
            </g>
          ))}
        </svg>
      </div>
      <div className={`${FIGURES} hidden desk:grid`}>
        {heads.map((head, index) => (
          <div key={head} className="pt-[18px] text-right text-[11.5px] font-head leading-[16px] text-ink2">
            {head}
            <div className="text-[10.5px] font-text leading-[18px] text-ink3">
              {head === '' ? '' : index < 2 ? 'h:min' : '°'}
            </div>
          </div>
        ))}
      </div>
    </div>
  );
}

/** An hour at an end stays inside the drawing. */
const anchorAt = (x: number, width: number) => (x < 8 ? 'start' : x > width - 8 ? 'end' : 'middle');
