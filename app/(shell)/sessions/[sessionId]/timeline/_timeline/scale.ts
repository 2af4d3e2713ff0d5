import { scanStopMs, type Plan } from '@/src/schedule/plan';

export const HEAD = 84;
export const MARGIN = 24;
/** The axis rows end here: day, hours, GMST. */
export const AXIS = { day: 20, hours: 40, gmst: 54 };
/** Where scan headings begin; the staves stand 50 px lower. */
const HEADINGS = 54;
const FIRST_STAVE = 104;
/** Fringe strip and stations-up strip under the staves. */
const BELOW = 102;

export const MINUTE = 60_000;
export const HOUR = 3_600_000;
export const DAY = 86_400_000;

export type Level = {
  hours: number;
  label: string;
  /** thin lines over the sheet */
  minorMs: number;
  /** strong lines over the sheet */
  majorMs: number;
  /** the grid a drop snaps to */
  gridMs: number;
};

export const LEVELS: readonly Level[] = [
  { hours: 24, label: '24 h', minorMs: HOUR, majorMs: 6 * HOUR, gridMs: 10_000 },
  { hours: 8, label: '8 h', minorMs: 10 * MINUTE, majorMs: HOUR, gridMs: 10_000 },
];

export type View = { startMs: number; hours: number };

export type Frame = {
  view: View;
  level: Level;
  /** the whole drawing, head and margin included */
  width: number;
  drawWidth: number;
  left: number;
  right: number;
  pitch: number;
  staveHeight: number;
  staveCount: number;
  headings: number;
  /** bottom of the last stave */
  stavesEnd: number;
  /** base line of the fringe strip */
  fringeBase: number;
  upBase: number;
  height: number;
};

/**
 * Geometry of the sheet for a size in px, a view and a number of staves: pitch 78 up to six staves, closer from
 * seven on or where the room is low, never below 52.
 */
export function frameOf(width: number, view: View, staveCount: number, room: number | null = null): Frame {
  const wanted = staveCount <= 6 ? 78 : Math.floor(468 / staveCount);
  const fitting =
    room === null ? wanted : Math.floor((room - FIRST_STAVE - BELOW + 17) / Math.max(1, staveCount));
  const pitch = Math.max(52, Math.min(wanted, fitting));
  const staveHeight = Math.round(38 + ((pitch - 52) * 20) / 26);
  const stavesEnd = FIRST_STAVE + Math.max(0, staveCount - 1) * pitch + staveHeight;
  return {
    view,
    level: levelOf(view.hours),
    width,
    drawWidth: width - HEAD - MARGIN,
    left: HEAD,
    right: width - MARGIN,
    pitch,
    staveHeight,
    staveCount,
    headings: HEADINGS,
    stavesEnd,
    fringeBase: stavesEnd + 62,
    upBase: stavesEnd + 90,
    height: stavesEnd + BELOW,
  };
}

function levelOf(hours: number): Level {
  const [first, ...rest] = LEVELS;
  if (!first) throw new RangeError('no zoom levels');
  return rest.reduce(
    (best, level) => (Math.abs(level.hours - hours) < Math.abs(best.hours - hours) ? level : best),
    first,
  );
}

export const xOf = (frame: Frame, ms: number) =>
  frame.left + ((ms - frame.view.startMs) / (frame.view.hours * HOUR)) * frame.drawWidth;

export const msAt = (frame: Frame, x: number) =>
  frame.view.startMs + ((x - frame.left) / frame.drawWidth) * frame.view.hours * HOUR;

export const viewEndMs = (view: View) => view.startMs + view.hours * HOUR;

export const msPerPx = (frame: Frame) => (frame.view.hours * HOUR) / frame.drawWidth;

export const staveTop = (frame: Frame, index: number) => FIRST_STAVE + index * frame.pitch;

export const yOf = (frame: Frame, index: number, elevationDeg: number) =>
  staveTop(frame, index) + frame.staveHeight * (1 - Math.max(0, Math.min(90, elevationDeg)) / 90);

/** The stave under a height on the sheet, or null between and outside. */
export function staveAt(frame: Frame, y: number): number | null {
  const index = Math.floor((y - (FIRST_STAVE - 10)) / frame.pitch);
  return index >= 0 && index < frame.staveCount ? index : null;
}

/** Crisp 1 px lines. */
export const crisp = (value: number) => Math.round(value) + 0.5;

export const ticks = (fromMs: number, toMs: number, stepMs: number): number[] => {
  const result: number[] = [];
  for (let ms = Math.ceil(fromMs / stepMs) * stepMs; ms <= toMs; ms += stepMs) result.push(ms);
  return result;
};

/** Keeps the view over the session and the scans that lie outside it; a longer view has the session in its middle. */
export function clampView(view: View, { span, scans }: Pick<Plan, 'span' | 'scans'>): View {
  const spanEndMs = scanStopMs(span);
  const firstMs = Math.min(span.startMs, ...scans.map(({ startMs }) => startMs));
  const lastMs = Math.max(spanEndMs, ...scans.map(scanStopMs));
  const lengthMs = view.hours * HOUR;
  if (lengthMs >= lastMs - firstMs) return { ...view, startMs: (firstMs + lastMs - lengthMs) / 2 };
  return { ...view, startMs: Math.max(firstMs, Math.min(view.startMs, lastMs - lengthMs)) };
}
