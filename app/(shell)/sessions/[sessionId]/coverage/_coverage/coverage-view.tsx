'use client';

import type { Route } from 'next';
import Link from 'next/link';
import { useRouter } from 'next/navigation';
import { useRef, useState, useTransition } from 'react';
import { EmptySheet } from '@/app/_ui/empty-sheet';
import { longTimeText, numberText } from '@/app/_ui/format';
import { saveFile } from '@/app/_ui/save-file';
import { staveOrder } from '@/app/_ui/stave-order';
import type { CoverageSheet, CoverageVersion, Observed } from '@/src/data/coverage/dto';
import { uvCsv } from './csv';
import { ElevationChart } from './elevation-chart';
import { svgText } from '@/app/_ui/figure-file';
import { baselineRowsOf, MEGA, type Ends } from './model';
import { NumbersPanel } from './numbers-panel';
import { SkyDiscs } from './sky-discs';
import { TimeTables } from './time-tables';
import { UvPlot } from './uv-plot';

/** What the scans of a source give an image: uv plane, numbers, time on source. */
export function CoverageView({ sheet }: { sheet: CoverageSheet }) {
  const { session, shown, refused } = sheet;
  return (
    <>
      {refused !== null && (
        <p role="status" className="error-box">
          {refused}
        </p>
      )}
      {shown ? (
        <Shown sheet={sheet} shown={shown} />
      ) : (
        <EmptySheet
          heading="No scans yet"
          codes={staveOrder(sheet.stations).map(({ code }) => code)}
          actions={
            <Link className="btn btn-primary" href={`/sessions/${session.code}/timeline`}>
              Open the timeline
            </Link>
          }
        >
          <p>The uv plane is drawn from the scans of a source. They are laid out on the timeline.</p>
        </EmptySheet>
      )}
    </>
  );
}

/** The skies in the order of the staves. */
const inOrder = (sheet: CoverageSheet, skies: NonNullable<CoverageSheet['shown']>['skies']) =>
  staveOrder(sheet.stations).flatMap(({ code }) => skies.filter((one) => one.code === code));

type ShownProps = { sheet: CoverageSheet; shown: NonNullable<CoverageSheet['shown']> };

function Shown({ sheet, shown }: ShownProps) {
  const { coverage } = shown;
  const [lit, setLit] = useState<Ends | null>(null);
  const box = useRef<HTMLDivElement>(null);
  const rows = baselineRowsOf(coverage);
  const skies = inOrder(sheet, shown.skies);
  const name = `${sheet.session.code}-${shown.name}-uv`;
  const saveFigures = () => {
    for (const figure of box.current?.querySelectorAll<SVGSVGElement>('svg[data-figure]') ?? [])
      saveFile(
        `${sheet.session.code}-${shown.name}-${figure.dataset.figure ?? 'figure'}.svg`,
        'image/svg+xml',
        svgText(figure),
      );
  };
  return (
    <>
      <div className="min-h-bar flex flex-wrap items-center gap-x-2 border-b border-rule px-3.5 text-table">
        <Choosers sheet={sheet} shown={shown} />
        <div className="ml-auto flex items-center gap-2 py-1">
          <button type="button" className="btn" onClick={saveFigures}>
            Export figures
          </button>
          <button
            type="button"
            className="btn"
            onClick={() => saveFile(`${name}.csv`, 'text/csv', uvCsv(coverage, sheet.scanNumbers))}
          >
            Export table
          </button>
        </div>
      </div>
      <div className="grid min-h-0 flex-1 grid-cols-[minmax(0,1fr)] desk:grid-cols-[minmax(0,1fr)_308px] desk:overflow-hidden">
        <div
          ref={box}
          className="grid min-h-0 grid-cols-[minmax(0,1fr)] content-start bg-sheet desk:overflow-y-auto wide:grid-cols-[522px_minmax(0,1fr)] wide:content-stretch"
        >
          <section className="px-4.5 py-[12px]">
            <div className="mb-1.5 flex items-baseline justify-between gap-2">
              <h2>uv coverage</h2>
              <span className="help">rings: dashed</span>
            </div>
            <div>
              <UvPlot
                tracks={coverage.tracks}
                rows={rows}
                longest={coverage.longest?.wavelengths ?? MEGA}
                lit={lit}
              />
            </div>
            <p className="help mt-1.5">{summaryOf(shown, rows.length)}</p>
          </section>
          <section className="border-rule px-4.5 py-[12px] wide:border-l">
            <TimeTables
              coverage={coverage}
              stations={staveOrder(sheet.stations)}
              rows={rows}
              lit={lit}
              onLight={setLit}
            />
          </section>
          <section className="border-t-head border-ink px-4.5 py-[12px]" aria-labelledby="coverage-elevation">
            <div className="mb-1.5 flex items-baseline justify-between gap-2">
              <h2 id="coverage-elevation">Elevation</h2>
              <span className="help">thick where on the source; numbers are scans</span>
            </div>
            <ElevationChart skies={skies} span={sheet.span} numbers={sheet.scanNumbers} />
          </section>
          <section
            className="border-t-head border-ink px-4.5 py-[12px] wide:border-l wide:border-l-rule"
            aria-labelledby="coverage-sky"
          >
            <div className="mb-1.5 flex items-baseline justify-between gap-2">
              <h2 id="coverage-sky">Sky over each station</h2>
              <span className="help">north up, east left, rim = horizon</span>
            </div>
            <SkyDiscs skies={skies} />
          </section>
        </div>
        <NumbersPanel shown={shown} />
      </div>
    </>
  );
}

function Choosers({ sheet, shown }: ShownProps) {
  const router = useRouter();
  const [isPending, startTransition] = useTransition();
  const { session, observed, versions, version } = sheet;
  const show = (one: Observed, kind: CoverageVersion['kind']) => {
    const query = new URLSearchParams({ source: one.name, band: one.band, plan: kind });
    const address = `/sessions/${session.code}/coverage?${query.toString()}` as Route;
    startTransition(() => router.replace(address));
  };
  return (
    <>
      <span className="flex items-center gap-2 py-1">
        <label htmlFor="coverage-source" className="text-ink2">
          Source
        </label>
        <select
          id="coverage-source"
          className="field w-[176px] font-head"
          value={keyOf(shown)}
          onChange={(event) => {
            const one = observed.find((item) => keyOf(item) === event.target.value);
            if (one) show(one, version.kind);
          }}
        >
          {observed.map((one) => (
            <option key={keyOf(one)} value={keyOf(one)}>
              {one.name}, {one.band}
            </option>
          ))}
        </select>
      </span>
      <span className="flex items-center gap-2 py-1">
        <label htmlFor="coverage-plan" className="text-ink2">
          Plan
        </label>
        <select
          id="coverage-plan"
          className="field w-[196px]"
          value={version.kind}
          onChange={(event) => show(shown, event.target.value === 'offered' ? 'offered' : 'draft')}
        >
          {versions.map((one) => (
            <option key={one.kind} value={one.kind}>
              {versionText(one)}
            </option>
          ))}
        </select>
      </span>
      <span role="status" className="text-ink2">
        {isPending ? 'Working out the coverage' : ''}
      </span>
    </>
  );
}

const keyOf = ({ sourceId, band }: Observed) => `${sourceId} ${band}`;

function versionText(version: CoverageVersion): string {
  if (version.kind === 'draft') return 'Draft';
  return `${version.isPublished ? 'Published' : 'Offer'} ${version.number}, ${longTimeText(version.madeAtMs)}`;
}

function summaryOf({ name, band, coverage }: ShownProps['shown'], baselines: number): string {
  const { scans, longest, shortest } = coverage;
  if (!longest || !shortest)
    return `No two stations are on ${name} together at ${band}: nothing reaches the uv plane.`;
  const [from, to] = [shortest, longest].map(({ wavelengths }) => numberText(wavelengths / MEGA));
  return `${scans.length} ${scans.length === 1 ? 'scan' : 'scans'} of ${name} at ${band} on ${baselines} ${baselines === 1 ? 'baseline' : 'baselines'}, from ${from} to ${to} Mλ.`;
}
