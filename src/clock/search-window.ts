/**
 * Half-width of the correlator's delay window.
 *
 * @param channels     spectral channels in one frequency channel, ≥ 1
 * @param bandwidthHz  of one frequency channel, > 0
 * @returns N/(2B), seconds: fringes between − and + this are found
 * @throws RangeError if an argument is out of range (programmer error)
 *
 * Source  sampling theorem across the band, N/B channels of spacing B/N; TMS ch. 8
 */
export function delayWindowSeconds(channels: number, bandwidthHz: number): number {
  if (!(channels >= 1 && bandwidthHz > 0)) throw new RangeError('Channels and bandwidth are positive.');
  return channels / (2 * bandwidthHz);
}

/**
 * Half-width of the correlator's window in clock rate.
 *
 * @param integrationSeconds  of one integration, > 0
 * @param skyHz               frequency on the sky, > 0
 * @returns 1/(2 T ν), s/s: a fringe rate of 1/(2T) Hz
 * @throws RangeError if an argument is out of range (programmer error)
 *
 * Source  sampling theorem in time; TMS ch. 8
 */
export function rateWindow(integrationSeconds: number, skyHz: number): number {
  if (!(integrationSeconds > 0 && skyHz > 0))
    throw new RangeError('Integration time and frequency are positive.');
  return 1 / (2 * integrationSeconds * skyHz);
}

/**
 * Share of the amplitude that is left of a fringe that is off the middle of both windows.
 *
 * @returns sinc(Δν τ) · sinc(f T) in (0, 1], with Δν τ = half the share of the delay window, f T likewise of the rate's
 *
 * Source  averaging over a spectral channel and an integration; sinc x = sin(πx)/(πx); TMS ch. 6
 */
export function windowAmplitude(shareOfDelay: number, shareOfRate: number): number {
  return sinc(shareOfDelay / 2) * sinc(shareOfRate / 2);
}

const sinc = (x: number): number => (x === 0 ? 1 : Math.sin(Math.PI * x) / (Math.PI * x));
