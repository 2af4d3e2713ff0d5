'use client';

import { useState } from 'react';
import { dayText, minuteText, numberText, signedText } from '@/app/_ui/format';
import { useWidth } from '@/app/_ui/use-width';
import { offsetWords } from '@/src/clock/reading';
import type { ReadingDto, StationClockDto } from '@/src/data/clock/dto';
import { Changes, SessionBoxes, SetAside } from './chart-marks';
import { dayTicks, isUsed, LEFT, PLOT, scalesOf, STRIP, STRIP_TOP, TOP, type Line } from './chart-scale';

const HEIGHT = STRIP_TOP + STRIP + 62;

type Scales = ReturnType<typeof scalesOf>;

/** Readings over the fit, what is left of them in a strip below, the days, and the sessions they matter to. */
export function Chart({ clock, fromMs }: { clock: StationClockDto; fromMs: number }) {
  const [box, width] = useWidth<HTMLDivElement>(880);
  const [nearId, setNearId] = useState<string | null>(null);
  const scales = scalesOf(clock, fromMs, Math.max(280, width));
  const near = scales.shown.find(({ id }) => id === nearId);
  return (
    <>
      <header className="clk-legend">
        <h2 className="text-lead">Station clock minus UTC, µs</h2>
        <span className="help">via GPS, positive = early; {clock.pulse} PPS</span>
        <span className="ml-auto flex flex-wrap gap-x-3.5" aria-hidden="true">
          <Key draw={<circle cx="5" cy="6" r="2.25" fill="var(--ink)" />}>reading</Key>
          <Key draw={<Cross x={5} y={6} />}>set aside</Key>
          <Key draw={<path d="M0 6h14" stroke="var(--teal)" strokeWidth={1.75} />}>fit</Key>
          <Key draw={<rect y="2" width="14" height="8" fill="var(--teal-wash)" />}>95% for a reading</Key>
        </span>
      </header>
      <p className="help min-h-[18px]" aria-hidden="true">
        {near
          ? `Day ${dayText(near.atMs)}, ${minuteText(near.atMs)} UT: ${offsetWords(near.offsetSeconds)}${near.fromFitSeconds === null ? '' : `, ${signedText(near.fromFitSeconds * 1e9, 0)} ns from the fit`}`
          : ' '}
      </p>
      <div ref={box}>
        <svg
          width={Math.max(280, width)}
          height={HEIGHT}
          viewBox={`0 0 ${Math.max(280, width)} ${HEIGHT}`}
          data-figure="clock"
          role="img"
          aria-label={summaryOf(clock)}
          className="block"
          onPointerMove={(event) => {
            const at = scales.x.invert(event.clientX - event.currentTarget.getBoundingClientRect().left);
            setNearId(nearest(scales.shown, at)?.id ?? null);
          }}
          onPointerLeave={() => setNearId(null)}
        >
          <Frame scales={scales} fromMs={fromMs} nowMs={clock.nowMs} width={Math.max(280, width)} />
          <FitLines scales={scales} />
          <Changes clock={clock} scales={scales} fromMs={fromMs} />
          <Points scales={scales} near={near} />
          <SetAside scales={scales} />
          <SessionBoxes clock={clock} scales={scales} fromMs={fromMs} />
        </svg>
      </div>
    </>
  );
}

const Key = ({ draw, children }: { draw: React.ReactNode; children: string }) => (
  <span className="flex items-center gap-1 text-small">
    <svg width={14} height={12}>
      {draw}
    </svg>
    {children}
  </span>
);

const Cross = ({ x, y }: { x: number; y: number }) => (
  <path
    d={`M${x - 4} ${y - 4}l8 8M${x + 4} ${y - 4}l-8 8`}
    stroke="var(--verm)"
    strokeWidth={1.75}
    fill="none"
  />
);

function Frame({
  scales,
  fromMs,
  nowMs,
  width,
}: {
  scales: Scales;
  fromMs: number;
  nowMs: number;
  width: number;
}) {
  const { x, y, strip, reach, untilMs } = scales;
  const right = width - 1;
  const bottom = STRIP_TOP + STRIP;
  const tick = Math.max(10, Math.round((reach * 0.66) / 10) * 10);
  return (
    <g>
      {y.ticks(5).map((micro) => (
        <g key={micro}>
          <line x1={LEFT} x2={right} y1={y(micro)} y2={y(micro)} stroke="var(--rule)" strokeWidth={0.75} />
          <text x={LEFT - 8} y={y(micro) + 4} fontSize={12} textAnchor="end">
            {signedText(micro, decimalsOf(y.ticks(5)))}
          </text>
        </g>
      ))}
      {dayTicks(fromMs, untilMs, width).map((ms) => (
        <g key={ms}>
          <line x1={x(ms)} x2={x(ms)} y1={TOP} y2={bottom} stroke="var(--hair)" />
          <line x1={x(ms)} x2={x(ms)} y1={bottom} y2={bottom + 5} stroke="var(--ink)" />
          {x(ms) < right - 10 && (
            <text x={x(ms)} y={bottom + 17} fontSize={12} textAnchor="middle">
              {dayText(ms)}
            </text>
          )}
        </g>
      ))}
      {[-tick, 0, tick].map((nano) => (
        <g key={nano}>
          <line
            x1={LEFT}
            x2={right}
            y1={strip(nano)}
            y2={strip(nano)}
            stroke={nano === 0 ? 'var(--teal)' : 'var(--hair)'}
          />
          <text x={LEFT - 8} y={strip(nano) + 4} fontSize={11} textAnchor="end">
            {nano === 0 ? '0' : signedText(Math.round(nano), 0)}
          </text>
        </g>
      ))}
      <text x={0} y={STRIP_TOP - 8} fontSize={12} fontWeight={600}>
        From the fit, ns
      </text>
      <text x={0} y={bottom + 17} fontSize={12} className="fill-ink2">
        Day
      </text>
      {[TOP + PLOT, bottom].map((line) => (
        <line key={line} x1={LEFT} x2={right} y1={line} y2={line} stroke="var(--ink)" />
      ))}
      <line x1={LEFT} x2={LEFT} y1={TOP} y2={TOP + PLOT} stroke="var(--ink)" />
      <line x1={LEFT} x2={LEFT} y1={STRIP_TOP} y2={bottom} stroke="var(--ink)" />
      <line x1={x(nowMs)} x2={x(nowMs)} y1={TOP - 4} y2={bottom} stroke="var(--ink)" strokeWidth={1.5} />
      <text x={x(nowMs) - 5} y={TOP - 3} fontSize={12} fontWeight={600} textAnchor="end">
        now
      </text>
    </g>
  );
}

function FitLines({ scales: { x, y, lines } }: { scales: Scales }) {
  const point = (at: Line[number], add = 0) =>
    `${x(at.atMs).toFixed(1)} ${y((at.offsetSeconds + add * at.halfSeconds) * 1e6).toFixed(1)}`;
  const path = (line: Line) => line.map((at, k) => `${k === 0 ? 'M' : 'L'}${point(at)}`).join('');
  const band = (line: Line) =>
    line.length === 0
      ? ''
      : `${line.map((at, k) => `${k === 0 ? 'M' : 'L'}${point(at, 1)}`).join('')}${[...line]
          .reverse()
          .map((at) => `L${point(at, -1)}`)
          .join('')}Z`;
  return (
    <g fill="none">
      {lines.map(({ behind, ahead }, index) => (
        <g key={index}>
          <path d={band(behind) + band(ahead)} fill="var(--teal-wash)" />
          <path d={path(behind)} stroke="var(--teal)" strokeWidth={1.75} />
          <path d={path(ahead)} stroke="var(--teal)" strokeWidth={1.75} strokeDasharray="5 4" />
        </g>
      ))}
    </g>
  );
}

function Points({ scales, near }: { scales: Scales; near: ReadingDto | undefined }) {
  const { x, y, strip, reach, shown } = scales;
  const used = shown.filter(isUsed);
  const dot = (cx: number, cy: number, r: number) =>
    `M${(cx - r).toFixed(1)} ${cy.toFixed(1)}a${r} ${r} 0 1 0 ${2 * r} 0a${r} ${r} 0 1 0 ${-2 * r} 0`;
  const dots = used.map(({ atMs, offsetSeconds }) => dot(x(atMs), y(offsetSeconds * 1e6), 2.25)).join('');
  const left = used
    .filter(({ fromFitSeconds }) => Math.abs((fromFitSeconds ?? 0) * 1e9) <= reach)
    .map(({ atMs, fromFitSeconds }) => dot(x(atMs), strip((fromFitSeconds ?? 0) * 1e9), 1.9))
    .join('');
  const off = shown.filter(
    (one) => one.fromFitSeconds !== null && Math.abs(one.fromFitSeconds * 1e9) > reach,
  );
  return (
    <g>
      <path d={dots + left} fill="var(--ink)" />
      {shown
        .filter((one) => !isUsed(one))
        .map(({ id, atMs, offsetSeconds }) => (
          <Cross key={id} x={x(atMs)} y={y(offsetSeconds * 1e6)} />
        ))}
      {off.map(({ id, atMs, fromFitSeconds }) => {
        const isUp = (fromFitSeconds ?? 0) > 0;
        const at = isUp ? STRIP_TOP + 3 : STRIP_TOP + STRIP - 3;
        const isRoom = off.length <= 4;
        return (
          <g key={id}>
            <path d={`M${x(atMs) - 4} ${at + (isUp ? 6 : -6)}h8l-4 ${isUp ? -7 : 7}z`} fill="var(--verm)" />
            {isRoom && (
              <text x={x(atMs) + 8} y={at + (isUp ? 7 : 0)} fontSize={11} style={{ fill: 'var(--verm)' }}>
                {signedText((fromFitSeconds ?? 0) * 1e9, 0)}
              </text>
            )}
          </g>
        );
      })}
      {near && (
        <line x1={x(near.atMs)} x2={x(near.atMs)} y1={TOP} y2={STRIP_TOP + STRIP} stroke="var(--ink3)" />
      )}
    </g>
  );
}

const decimalsOf = (ticks: readonly number[]): number => {
  const step = Math.abs((ticks[1] ?? 1) - (ticks[0] ?? 0));
  return step >= 1 ? 0 : step >= 0.1 ? 1 : step >= 0.01 ? 2 : 3;
};

function nearest(readings: readonly ReadingDto[], atMs: number): ReadingDto | undefined {
  return readings.reduce<ReadingDto | undefined>(
    (best, one) => (!best || Math.abs(one.atMs - atMs) < Math.abs(best.atMs - atMs) ? one : best),
    undefined,
  );
}

function summaryOf({ station, readings, now, fit }: StationClockDto): string {
  if (!now || !fit) return `No reading of the clock of ${station.code} yet.`;
  const aside = readings.filter((one) => !isUsed(one)).length;
  const sigma = numberText(now.sigmaSeconds * 1e6, 3);
  return `${readings.length} readings of ${station.code}, ${aside} set aside; the fit says ${offsetWords(now.offsetSeconds)} now, give or take ${sigma} microseconds. The same readings stand in the table below.`;
}
