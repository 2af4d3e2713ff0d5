import { baselineLengthM } from '../array/baseline';
import { atmosphereCoherence } from '../array/coherence';
import { baselineNoiseJy } from '../array/sensitivity';
import { correlatedFluxJy } from '../array/structure';
import { baselineUvw } from '../array/uvw';
import type { PlanMode, PlanSource } from '../schedule/context';
import { listText } from '../schedule/words';
import { SPEED_OF_LIGHT } from '../units/constants';
import type { ScanEnd } from './together';

/** The signal chain of a baseline in a scan; null where an input is missing. */
export type Signal = {
  snr: number | null;
  sefd1Jy: number | null;
  sefd2Jy: number | null;
  correlatedFluxJy: number | null;
  baselineM: number | null;
  sigmaJy: number | null;
  coherence: number | null;
};

/** What the SNR lacks: the first kind of it, and all of it in words. */
export type Lack = { reason: 'sefd' | 'flux'; missing: string };

type Ends = Pick<ScanEnd, 'station' | 'place'>;

/**
 * SNR of a baseline: S_corr · C(T) · √n_pol / σ.
 *
 * @param source  undefined where it is not in the catalogue
 * @param on      seconds = time together on source; midMs = the instant at which the baseline is projected
 * @returns all numbers that can be had, and what is missing where there is no SNR. Bits of an end = the lesser of mode
 *          and station; bandwidth = all channels of one polarisation; n_pol = parallel-hand products, 1 or 2;
 *          coherence is the atmosphere's, 1 where the mode has no coherence time
 *
 * Left out: SEFD's change with elevation (zenith value, f = 1); the clocks' coherence; DUT1 (0.9 s turn u, v by 13.5″).
 * Error   1e-9 relative of its inputs (tests/outlook/signal.test.ts)
 * Source  TMS ch. 6, as `baselineNoiseJy`, `correlatedFluxJy`, `atmosphereCoherence`
 */
export function signalOf(
  first: Ends,
  second: Ends,
  source: PlanSource | undefined,
  mode: PlanMode,
  on: { seconds: number; midMs: number },
): { numbers: Signal; lack: Lack | null } {
  const sefd1Jy = first.station.sefdJy[mode.band] ?? null;
  const sefd2Jy = second.station.sefdJy[mode.band] ?? null;
  const sigmaJy =
    sefd1Jy === null || sefd2Jy === null
      ? null
      : baselineNoiseJy({
          sefd1Jy,
          sefd2Jy,
          bandwidthHz: mode.channelBandwidthHz * mode.channelsPerPolarisation,
          seconds: on.seconds,
          bits1: bitsAt(first, mode),
          bits2: bitsAt(second, mode),
        });
  const fluxJy = source ? projectedFluxJy(first, second, source, mode, on.midMs) : null;
  const coherence =
    mode.coherenceSeconds === null ? 1 : atmosphereCoherence(on.seconds, mode.coherenceSeconds);
  const snr =
    sigmaJy === null || fluxJy === null
      ? null
      : (fluxJy * coherence * Math.sqrt(mode.polarisations)) / sigmaJy;
  const baselineM = baselineLengthM(first.place, second.place);
  return {
    numbers: { snr, sefd1Jy, sefd2Jy, correlatedFluxJy: fluxJy, baselineM, sigmaJy, coherence },
    lack: snr === null ? lackOf(first, second, source, mode) : null,
  };
}

function bitsAt({ station }: Ends, mode: PlanMode): 1 | 2 {
  return station.bits === 1 || mode.bits === 1 ? 1 : 2;
}

function projectedFluxJy(
  first: Ends,
  second: Ends,
  source: PlanSource,
  mode: PlanMode,
  atMs: number,
): number | null {
  const components = source.components[mode.band];
  if (!components) return null;
  const { u, v } = baselineUvw(first.place, second.place, source.position, new Date(atMs));
  const perMetre = mode.skyHz / SPEED_OF_LIGHT;
  return correlatedFluxJy(components, u * perMetre, v * perMetre);
}

function lackOf(first: Ends, second: Ends, source: PlanSource | undefined, { band }: PlanMode): Lack {
  const unknown = [first, second].filter(({ station }) => station.sefdJy[band] === undefined);
  const sefds = unknown.map(({ station }) => `SEFD of ${station.code}`);
  const flux = source?.components[band] ? [] : [`flux of ${source?.name ?? 'a source not in the catalogue'}`];
  return {
    reason: sefds.length > 0 ? 'sefd' : 'flux',
    missing: `${listText([...sefds, ...flux])} at ${band}`,
  };
}
