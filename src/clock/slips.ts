import type { ClockPrediction } from './fit';
import { offsetWords } from './reading';

export type Slip = {
  kind: 'sign' | 'unit' | 'digit' | 'second';
  /** what the reading would be without it */
  offsetSeconds: number;
  /** the question, in words */
  question: string;
};

const LEAST_SECONDS = 30e-9;

/** How far a reading may lie from the prediction without a question. */
export const allowedSeconds = (prediction: ClockPrediction, scatterSeconds: number): number =>
  Math.max(5 * scatterSeconds, 3 * prediction.sigmaSeconds, LEAST_SECONDS);

/**
 * The likeliest slip of a reading that disagrees with the prediction, where undoing it agrees.
 *
 * @param offsetSeconds   as it was given, early positive
 * @param prediction      of the fit, for the reading's time
 * @param scatterSeconds  of the fit
 * @returns null where the reading agrees, or no slip would explain it
 *
 * Tried in this order: the wrong tick, a unit (10^±3), a digit (10^±1), a whole second. Dates and zones are not tried.
 * Source  definition of this project
 */
export function suspectSlip(
  offsetSeconds: number,
  prediction: ClockPrediction,
  scatterSeconds: number,
): Slip | null {
  const allowed = allowedSeconds(prediction, scatterSeconds);
  const agrees = (value: number) => Math.abs(value - prediction.offsetSeconds) <= allowed;
  if (agrees(offsetSeconds)) return null;
  const tried: readonly (readonly [Slip['kind'], number, string])[] = [
    ['sign', -offsetSeconds, 'Is it the other tick?'],
    ['unit', offsetSeconds * 1e-3, 'Is it a smaller unit?'],
    ['unit', offsetSeconds * 1e3, 'Is it a larger unit?'],
    ['digit', offsetSeconds * 0.1, 'Is the point one figure off?'],
    ['digit', offsetSeconds * 10, 'Is the point one figure off?'],
    ['second', offsetSeconds - 1, 'Is it a whole second off?'],
    ['second', offsetSeconds + 1, 'Is it a whole second off?'],
  ];
  const found = tried.find(([, value]) => agrees(value));
  if (!found) return null;
  const [kind, value, asked] = found;
  const expected = offsetWords(prediction.offsetSeconds);
  return {
    kind,
    offsetSeconds: value,
    question: `The fit expects ${expected}, and this reads ${offsetWords(offsetSeconds)}. ${asked} Then it is ${offsetWords(value)}.`,
  };
}
