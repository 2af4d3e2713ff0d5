import { sweep, type Spans } from '../sky/interval-set';
import type { SkyPosition } from '../sky/types';
import { angularSeparationDeg, positionAngleDeg } from '../units/angle';

/** A source as seen from a target: how far, and in which direction from north through east. */
export type Near<S> = { source: S; separationDeg: number; positionAngleDeg: number };

/**
 * Sources around a target, the nearest first.
 *
 * @param withinDeg  greatest separation, inclusive, [0, 180]
 * @returns separation [0, withinDeg] and position angle [0, 360), degrees, on ICRS axes
 *
 * Error   as angularSeparationDeg and positionAngleDeg
 */
export function nearby<S extends { position: SkyPosition }>(
  target: SkyPosition,
  sources: readonly S[],
  withinDeg: number,
): Near<S>[] {
  const from = onSphere(target);
  return sources
    .map((source) => ({
      source,
      separationDeg: angularSeparationDeg(from, onSphere(source.position)),
      positionAngleDeg: positionAngleDeg(from, onSphere(source.position)),
    }))
    .filter(({ separationDeg }) => separationDeg <= withinDeg)
    .sort((a, b) => a.separationDeg - b.separationDeg);
}

/**
 * The part of a target's station-hours in which another source is up at the same station.
 *
 * @param target  times in which each station sees it, sorted and disjoint
 * @param other   the same of the other source, stations in the same order
 * @returns [0, 1]; null where no station sees the target
 */
export function sharedPart(target: readonly Spans[], other: readonly Spans[]): number | null {
  const whole = target.reduce((sum, spans) => sum + lengthOf(spans), 0);
  if (whole === 0) return null;
  const shared = target.reduce(
    (sum, spans, index) => sum + lengthOf(sweep([spans, other[index] ?? []], 2)),
    0,
  );
  return shared / whole;
}

const onSphere = ({ raDeg, decDeg }: SkyPosition) => ({ longitudeDeg: raDeg, latitudeDeg: decDeg });

const lengthOf = (spans: Spans) => spans.reduce((sum, [from, until]) => sum + (until - from), 0);
