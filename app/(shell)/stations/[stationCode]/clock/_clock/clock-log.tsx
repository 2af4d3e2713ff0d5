'use client';

import type { Route } from 'next';
import Link from 'next/link';
import { useRef, useState } from 'react';
import { svgText } from '@/app/_ui/figure-file';
import { saveFile } from '@/app/_ui/save-file';
import { Segments } from '@/app/_ui/segments';
import type { StationClockDto } from '@/src/data/clock/dto';
import { ChangeForm } from './change-form';
import { Chart } from './chart';
import { clockCsv } from './clock-csv';
import { Numbers } from './numbers';
import { ReadingForm } from './reading-form';
import { Readings } from './readings';

const SPANS = [
  { value: '3', label: '3' },
  { value: '14', label: '14' },
  { value: '60', label: '60' },
  { value: 'all', label: 'All' },
] as const;
type Span = (typeof SPANS)[number]['value'];

const DAY_MS = 86_400_000;

/** A station's clock log: readings over the fit, what it says now, the form of its operator. */
export function ClockLog({ clock, codes }: { clock: StationClockDto; codes: readonly string[] }) {
  const [span, setSpan] = useState<Span>('14');
  const [isChanging, setIsChanging] = useState(false);
  const plot = useRef<HTMLElement>(null);
  const { station, readings, nowMs } = clock;
  const oldest = readings.at(-1)?.atMs ?? nowMs - DAY_MS;
  const fromMs = span === 'all' ? oldest - DAY_MS / 2 : nowMs - Number(span) * DAY_MS;
  const shown = readings.filter(({ atMs }) => atMs >= fromMs);
  return (
    <>
      <div className="clk-bar">
        {codes.length > 1 && (
          <nav aria-label="Stations" className="seg">
            {codes.map((code) => (
              <Link
                key={code}
                className="clk-code"
                href={`/stations/${code}/clock` as Route}
                aria-current={code === station.code ? 'page' : undefined}
              >
                {code}
              </Link>
            ))}
          </nav>
        )}
        <h1 className="text-h2">{station.name}</h1>
        <div className="ml-auto flex flex-wrap items-center gap-2">
          <span className="text-ink2">Days</span>
          <Segments label="Days shown" value={span} options={SPANS} onChoose={setSpan} />
          {clock.canWrite && (
            <button type="button" className="btn" onClick={() => setIsChanging(true)}>
              Change at the station
            </button>
          )}
          <button
            type="button"
            className="btn"
            onClick={() => {
              const figure = plot.current?.querySelector<SVGSVGElement>('svg[data-figure]');
              if (figure) saveFile(`${station.code}-clock.svg`, 'image/svg+xml', svgText(figure));
            }}
          >
            Export figure
          </button>
          <button
            type="button"
            className="btn"
            aria-disabled={readings.length === 0}
            onClick={() =>
              readings.length > 0 && saveFile(`${station.code}-clock.csv`, 'text/csv', clockCsv(clock))
            }
          >
            Export table
          </button>
        </div>
      </div>
      <div className="clk">
        <section ref={plot} aria-label="Plot" className="clk-plot">
          <Chart clock={clock} fromMs={fromMs} />
        </section>
        <section aria-label="Readings" className="clk-table">
          <Readings clock={clock} shown={shown} isAll={shown.length === readings.length} />
        </section>
        <aside aria-label="Clock" className="clk-side">
          {clock.canWrite && <ReadingForm clock={clock} onChange={() => setIsChanging(true)} />}
          <Numbers clock={clock} />
        </aside>
      </div>
      {clock.canWrite && (
        <ChangeForm clock={clock} isOpen={isChanging} onClose={() => setIsChanging(false)} />
      )}
    </>
  );
}
