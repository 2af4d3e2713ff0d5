import { radToDeg } from '../units/angle';
import { MS_PER_DAY } from '../units/time';
import { angleBetween } from '../units/vector';
import type { Vector3 } from '../units/vector';
import { spansWhere, stepsOver } from './crossings';
import { apparentIcrs } from './direction';
import { earthFrameAt, sunVector } from './engine';
import type { EarthFrame } from './engine';
import type { Spans } from './interval-set';
import { sunSeparationDeg } from './position';
import type { SkyPosition } from './types';
import { NEVER } from './view';
import type { Whole } from './view';

const STEP_MS = MS_PER_DAY / 8;
/** The Sun moves by 1.02° a day at most; with room for aberration. */
const SUN_DEG_PER_DAY = 1.05;

/**
 * Times in which a source stands away from the Sun, for many sources in one span.
 *
 * @param whole  the span
 * @returns by source and least distance in degrees: sorted and disjoint; whole.set itself where it always is
 *
 * Error   edges ≤ 0.5 ms from sunSeparationDeg
 * Source  the Sun moves a degree a day: most spans are decided by one look in their middle
 */
export function awayFromSun(whole: Whole): (source: SkyPosition, limitDeg: number) => Spans {
  const { set, span } = whole;
  const [startMs, endMs] = [span.start.getTime(), span.end.getTime()];
  const middleMs = (startMs + endMs) / 2;
  const reachDeg = ((endMs - startMs) / 2 / MS_PER_DAY) * SUN_DEG_PER_DAY;
  let frame: EarthFrame | null = null;
  let sun: Vector3 | null = null;
  return (source, limitDeg) => {
    frame ??= earthFrameAt(middleMs);
    sun ??= sunVector(middleMs);
    const middle = radToDeg(angleBetween(apparentIcrs(source, frame), sun)) - limitDeg;
    if (middle > reachDeg) return set;
    if (middle < -reachDeg) return NEVER;
    return spansWhere((ms) => sunSeparationDeg(source, new Date(ms)) - limitDeg, stepsOver(span, STEP_MS));
  };
}
