import type { PlanContext } from '../schedule/context';
import type { Scan, StationCode } from '../schedule/plan';
import { lengthText, listText } from '../schedule/words';
import { isExpected, snrText, type OutlookCell } from './fringe-outlook';
import { scanEnd } from './together';

/** Below this share of the whole flux density a source counts as resolved in the sentence. */
const RESOLVED_SHARE = 0.7;

/**
 * The verdict in bold, and how far it is from the next limit.
 *
 * @returns head "None expected: SNR 5.0", detail "Short of the limit of 7.0 by 2.0."
 */
export function verdictWords(
  cell: OutlookCell,
  limits: PlanContext['settings']['snrLimits'],
): { head: string; detail: string } {
  const { verdict, snr } = cell;
  if (verdict === 'not-on')
    return { head: 'Not on source together', detail: NOT_ON[cell.reason ?? 'out'] ?? '' };
  if (verdict === 'unknown')
    return { head: 'No data', detail: `What is missing: ${cell.missing ?? 'an input'}.` };
  const figure = snr === null ? '' : `: SNR ${snrText(snr)}`;
  const shown = snr === null ? 0 : Number(snrText(snr));
  const limit = limits.doubtful.toFixed(1);
  if (cell.reason === 'clock') return CLOCK[verdict === 'none' ? 'none' : 'doubtful'];
  if (verdict === 'none') {
    const detail =
      snr === null ? '' : `Short of the limit of ${limit} by ${(limits.doubtful - shown).toFixed(1)}.`;
    return { head: `None expected${figure}`, detail };
  }
  if (isExpected(cell)) return { head: `Fringes expected${figure}`, detail: `The limit is ${limit}.` };
  const short = (limits.fair - shown).toFixed(1);
  return {
    head: `Doubtful${figure}`,
    detail: `Over the limit of ${limit}, short of fair (${limits.fair}) by ${short}.`,
  };
}

const CLOCK = {
  none: { head: 'None expected: the clock', detail: 'The fringe falls outside the search window.' },
  doubtful: { head: 'Doubtful: the clock', detail: 'The fringe may fall outside the search window.' },
} as const;

const NOT_ON: Readonly<Record<string, string>> = {
  low: 'The source is not above the limits of both all the time they share.',
  out: 'One of the two does not take part.',
  declined: 'One of the two has declined these hours.',
  mode: 'One of the two cannot do this mode.',
};

/**
 * Why a baseline has its verdict: at most two sentences with the numbers that weigh most.
 *
 * @param cell  of this scan
 * @returns sentences, the weightier first
 */
export function whySentences(cell: OutlookCell, scan: Scan, context: PlanContext): string[] {
  if (cell.verdict === 'not-on') return notOnSentences(cell, scan, context);
  if (cell.reason === 'clock') return clockSentences(cell);
  if (cell.verdict === 'unknown') return [`The ${cell.missing ?? 'input'} is not entered in the catalogue.`];
  const sentences = [...sourceSentence(cell, scan, context), ...bitsSentence(cell, scan, context)];
  return [...sentences, ...timeSentence(cell, scan, context)].slice(0, 2);
}

function clockSentences({ verdict, missing, snr }: OutlookCell): string[] {
  if (verdict === 'unknown') return [`There is ${missing ?? 'no clock reading'}.`];
  const signal = snr === null ? [] : [`The signal itself would do: SNR ${snrText(snr)}.`];
  return verdict === 'none'
    ? ['The clocks put it beyond the window that the correlator searches.', ...signal]
    : ['The two clocks are not known well enough for the window that the correlator searches.', ...signal];
}

function sourceSentence(cell: OutlookCell, scan: Scan, context: PlanContext): string[] {
  const mode = context.modes[scan.modeId];
  const components = mode && context.sources[scan.sourceId]?.components[mode.band];
  if (!components || cell.correlatedFluxJy === null || cell.baselineM === null) return [];
  const whole = components.reduce((sum, { fluxJy }) => sum + fluxJy, 0);
  const left = `${cell.correlatedFluxJy.toFixed(2)} Jy of ${whole.toFixed(2)} Jy is left`;
  const far = kilometres(cell.baselineM);
  return cell.correlatedFluxJy / whole < RESOLVED_SHARE
    ? [`The baseline of ${far} resolves the source: ${left}.`]
    : [`On the baseline of ${far} the source is nearly whole: ${left}.`];
}

function bitsSentence({ first, second }: OutlookCell, scan: Scan, context: PlanContext): string[] {
  const mode = context.modes[scan.modeId];
  const coarse = [first, second].filter((code) => mode?.bits === 2 && context.stations[code]?.bits === 1);
  return coarse.length === 0
    ? []
    : [`${listText(coarse)} ${coarse.length === 1 ? 'records' : 'record'} 1 bit.`];
}

function timeSentence(
  { coherence, overlapSeconds }: OutlookCell,
  scan: Scan,
  context: PlanContext,
): string[] {
  const coherenceSeconds = context.modes[scan.modeId]?.coherenceSeconds;
  if (!coherenceSeconds || coherence === null) return [];
  const counts = lengthText(overlapSeconds * coherence * coherence);
  return [`At a coherence of ${coherenceSeconds} s, ${lengthText(overlapSeconds)} count as ${counts}.`];
}

function notOnSentences({ reason, first, second }: OutlookCell, scan: Scan, context: PlanContext): string[] {
  if (reason === 'low') {
    const low = [first, second].filter((code) => isLow(code, scan, context));
    return low.length === 0 ? [] : [`The source is below the limits of ${listText(low)} during the scan.`];
  }
  if (reason !== 'out') return [];
  const out = [first, second].filter((code) => !scan.stations.some(({ station }) => station === code));
  return [`${listText(out)} ${out.length === 1 ? 'is' : 'are'} left out of the scan.`];
}

function isLow(code: StationCode, scan: Scan, context: PlanContext): boolean {
  const station = context.stations[code];
  if (!station) return false;
  const end = scanEnd(scan, station, context);
  return !end.sees(end.on);
}

/** Thin spaces between thousands. */
const kilometres = (metres: number) =>
  `${String(Math.round(metres / 1000)).replace(/\B(?=(\d{3})+$)/g, '\u2009')} km`;
