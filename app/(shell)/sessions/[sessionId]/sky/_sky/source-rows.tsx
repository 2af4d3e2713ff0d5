'use client';

import { numberText } from '@/app/_ui/format';
import type { KeyboardEvent } from 'react';
import { sourceWords } from '../../../_plan/source-words';
import { markText, type Mark, type Row, type Span } from './model';
import { FIGURES, ROW } from './row-grid';
import { crisp, hourTicks, xOf, type Scale } from './scale';
import { hoursText } from './words';

const HEIGHT = 40;
/** The bars take this much, however many there are. */
const BARS = 23.4;

type Props = {
  rows: readonly Row[];
  scale: Scale;
  mark: Mark;
  count: number;
  chosenId: string;
  onChoose: (sourceId: string) => void;
  onKeyDown: (event: KeyboardEvent) => void;
};

/** One row for each source: bars of the stations, stations up under them, and how long together. */
export function SourceRows({ rows, chosenId, onKeyDown, ...rest }: Props) {
  return (
    <div
      role="listbox"
      tabIndex={0}
      aria-label="Sources: when each station sees them"
      aria-activedescendant={`sky-${chosenId}`}
      onKeyDown={onKeyDown}
      className="border-b-head border-ink outline-offset-[-2px]"
    >
      {rows.map((row) => (
        <SourceRow key={row.source.id} row={row} isChosen={row.source.id === chosenId} {...rest} />
      ))}
    </div>
  );
}

type RowProps = Omit<Props, 'rows' | 'chosenId' | 'onKeyDown'> & { row: Row; isChosen: boolean };

function SourceRow({ row, isChosen, scale, mark, count, onChoose }: RowProps) {
  const { source, all, marked } = row;
  return (
    <div
      role="option"
      id={`sky-${source.id}`}
      aria-selected={isChosen}
      aria-label={`${source.name}, ${sourceWords(source)}. All ${count} together ${hoursText(all)}${mark.kind === 'all' ? '' : `, ${markText(mark, count)} ${hoursText(marked)}`}. Sun ${numberText(source.sunDeg)}°, Moon ${numberText(source.moonDeg)}° away.`}
      onClick={() => onChoose(source.id)}
      className={`${ROW} relative cursor-pointer border-b border-hair last:border-b-0 ${isChosen ? 'bg-wash' : 'hover:bg-paper'}`}
    >
      {isChosen && <span className="absolute inset-y-0 left-0 w-[5px] bg-ink" />}
      <div className="flex min-w-0 items-baseline gap-2 pt-1 desk:block desk:pl-[16px]">
        <div className="font-head leading-[17px]">{source.name}</div>
        <div className="truncate text-tick text-ink2">{sourceWords(source)}</div>
        <div className="ml-auto whitespace-nowrap text-tick text-ink2 desk:hidden">
          all {hoursText(all)}
          {mark.kind !== 'all' && `, ${markText(mark, count).toLowerCase()} ${hoursText(marked)}`}
        </div>
      </div>
      <div className="min-w-0 overflow-hidden">
        <Bars row={row} isChosen={isChosen} scale={scale} mark={mark} count={count} />
      </div>
      <div className={`${FIGURES} hidden items-center text-right text-small desk:grid`}>
        <span className={all.length > 0 ? 'font-head' : 'text-ink3'}>{hoursText(all)}</span>
        <span className={marked.length > 0 ? '' : 'text-ink3'}>
          {mark.kind !== 'all' && hoursText(marked)}
        </span>
        <span className="text-ink2">{numberText(source.sunDeg)}</span>
        <span className="text-ink2">{numberText(source.moonDeg)}</span>
      </div>
    </div>
  );
}

function Bars({
  row,
  isChosen,
  scale,
  mark,
  count,
}: Pick<RowProps, 'row' | 'isChosen' | 'scale' | 'mark' | 'count'>) {
  const { bars, steps, all, marked } = row;
  const pitch = BARS / Math.max(1, bars.length);
  const thick = Math.min(2.75, pitch * 0.7);
  const box = ([from, to]: Span) => ({
    x: xOf(scale, from),
    width: Math.max(0.5, xOf(scale, to) - xOf(scale, from)),
    y: 1.5,
    height: BARS + 1.6,
  });
  const tintOf = (up: number) => {
    if (up === count) return 'var(--teal)';
    return mark.kind === 'least' && up >= mark.least ? 'var(--teal-wash)' : null;
  };
  return (
    <svg data-time="" width={scale.width} height={HEIGHT} aria-hidden="true" className="block">
      {hourTicks(scale).map(({ x, ms, isMidnight }) => (
        <line
          key={ms}
          x1={crisp(x)}
          x2={crisp(x)}
          y1={0}
          y2={HEIGHT}
          stroke={isMidnight ? 'var(--ink)' : 'var(--hair)'}
          strokeWidth={isMidnight ? 1.75 : 1}
        />
      ))}
      {marked.map((span) => (
        <rect key={span[0]} {...box(span)} fill="var(--teal-wash)" fillOpacity={0.7} />
      ))}
      {all.map((span) => (
        <rect key={span[0]} {...box(span)} fill="var(--teal-wash)" stroke="var(--teal)" />
      ))}
      {bars.map(({ code, spans }, index) =>
        spans.map((span) => (
          <rect
            key={`${code}${span[0]}`}
            {...box(span)}
            y={3 + index * pitch}
            height={thick}
            fill={isChosen ? 'var(--teal)' : 'var(--note)'}
          />
        )),
      )}
      {steps.map(({ startMs, endMs, up }) => {
        const [x, width] = [xOf(scale, startMs), xOf(scale, endMs) - xOf(scale, startMs)];
        const tint = tintOf(up);
        return (
          <g key={startMs}>
            {tint && <rect x={x} y={27.5} width={width} height={11} fill={tint} />}
            <line
              x1={x}
              x2={x}
              y1={27.5}
              y2={38.5}
              stroke={tint ? 'var(--teal)' : 'var(--rule)'}
              strokeWidth={0.75}
            />
            {width > 9 && (
              <text
                x={x + width / 2}
                y={36.5}
                fontSize={10}
                fontWeight={tint ? 640 : 400}
                textAnchor="middle"
                style={{ fill: up === count ? 'var(--on-ink)' : tint ? 'var(--ink)' : 'var(--ink3)' }}
              >
                {up}
              </text>
            )}
          </g>
        );
      })}
    </svg>
  );
}
