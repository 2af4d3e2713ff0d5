import type { Interval } from '../units/time';
import type { Spans } from './interval-set';
import { SIDEREAL_RAD_PER_MS, trackTurnRad } from './track';
import type { Track } from './track';

/** A span in which a track is looked at, as the Earth's turning since its start. */
export type View = {
  startMs: number;
  endMs: number;
  /** Greenwich apparent sidereal time at the start, radians */
  startTurnRad: number;
  lengthRad: number;
  /** how far the place may come from the middle of its track */
  driftRad: number;
  /** the set that holds throughout; always this very one */
  whole: Spans;
  span: Interval;
};

/** A span as a set that holds throughout, and with dates of its own. */
export type Whole = { set: Spans; span: Interval };

const MS_PER_DAY = 86_400_000;
/** 0.35″ aberration, 0.14″ precession and 0.1″ nutation a day, in radians. */
const DRIFT_RAD_PER_MS = 3e-6 / MS_PER_DAY;
export const TURN = 2 * Math.PI;
/** Guesses of edges are better than this (11 minutes). */
export const GUESS_RAD = 0.05;

/** The set that never holds. */
export const NEVER: Spans = [];

/**
 * A span made ready for the cuts of one track.
 *
 * @param whole  the whole span, shared by all views of it
 */
export function viewOf(track: Track, { set, span }: Whole): View {
  const [startMs, endMs] = [span.start.getTime(), span.end.getTime()];
  const outsideMs = Math.max(0, track.startMs - startMs, endMs - track.endMs);
  return {
    startMs,
    endMs,
    startTurnRad: trackTurnRad(track, startMs),
    lengthRad: (endMs - startMs) * SIDEREAL_RAD_PER_MS,
    driftRad: track.middle.driftRad + outsideMs * DRIFT_RAD_PER_MS,
    whole: set,
    span,
  };
}

/** A span made ready to be shared by the views of many tracks. */
export function wholeOf(span: Interval): Whole {
  const [startMs, endMs] = [span.start.getTime(), span.end.getTime()];
  return { set: [[startMs, endMs]], span: { start: new Date(startMs), end: new Date(endMs) } };
}

/** An angle brought into one turn from zero, radians. */
export function withinTurn(rad: number): number {
  return rad - TURN * Math.floor(rad / TURN);
}
