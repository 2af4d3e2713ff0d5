import { useCallback, useState } from 'react';
import { utcParts } from '@/src/units/time';

const HOUR = 3_600_000;
const SIDEREAL_PER_UT = 1.00273790935;
/** Labels stand no closer than this. */
const LABEL_PX = 52;

/** One time axis for every drawing of the page. */
export type Scale = { startMs: number; endMs: number; gmstStartHours: number; width: number };

export type Tick = { x: number; ms: number; hour: number; isLabelled: boolean; isMidnight: boolean };

export const xOf = ({ startMs, endMs, width }: Scale, ms: number) =>
  ((ms - startMs) / (endMs - startMs)) * width;

export const msAt = ({ startMs, endMs, width }: Scale, x: number) =>
  startMs + (Math.max(0, Math.min(width, x)) / width) * (endMs - startMs);

/** Crisp 1 px lines. */
export const crisp = (value: number) => Math.round(value) + 0.5;

export const gmstAt = ({ startMs, gmstStartHours }: Scale, ms: number) =>
  (gmstStartHours + ((ms - startMs) / HOUR) * SIDEREAL_PER_UT) % 24;

/** Every whole hour of UT, every few of them labelled. */
export function hourTicks(scale: Scale): Tick[] {
  const every = labelEvery(scale);
  const ticks: Tick[] = [];
  for (let ms = Math.ceil(scale.startMs / HOUR) * HOUR; ms <= scale.endMs; ms += HOUR) {
    const { hour } = utcParts(ms);
    ticks.push({ x: xOf(scale, ms), ms, hour, isLabelled: hour % every === 0, isMidnight: hour === 0 });
  }
  return ticks;
}

/** Every few whole hours of GMST. */
export function gmstTicks(scale: Scale): { x: number; hour: number }[] {
  const every = labelEvery(scale);
  const endHours = scale.gmstStartHours + ((scale.endMs - scale.startMs) / HOUR) * SIDEREAL_PER_UT;
  const ticks: { x: number; hour: number }[] = [];
  for (let hour = Math.ceil(scale.gmstStartHours / every) * every; hour <= endHours; hour += every) {
    const ms = scale.startMs + ((hour - scale.gmstStartHours) / SIDEREAL_PER_UT) * HOUR;
    ticks.push({ x: xOf(scale, ms), hour: hour % 24 });
  }
  return ticks;
}

function labelEvery({ startMs, endMs, width }: Scale): number {
  const perHour = (width * HOUR) / (endMs - startMs);
  return [1, 2, 3, 4, 6, 12].find((hours) => hours * perHour >= LABEL_PX) ?? 24;
}

/** Width of a box on the screen; 808 px until it is known. */
export function useWidth(): { boxRef: (box: HTMLElement | null) => (() => void) | undefined; width: number } {
  const [width, setWidth] = useState(808);
  const boxRef = useCallback((box: HTMLElement | null) => {
    if (!box) return undefined;
    const observer = new ResizeObserver(() => setWidth(box.clientWidth));
    observer.observe(box);
    return () => observer.disconnect();
  }, []);
  return { boxRef, width };
}

/** "05:31" */
export function gmstText(hours: number): string {
  const minutes = Math.floor(hours * 60);
  return `${String(Math.floor(minutes / 60)).padStart(2, '0')}:${String(minutes % 60).padStart(2, '0')}`;
}
