import type { PlanMode } from './context';

export type ModeChannel = {
  /** sky frequency of the edge that the sideband starts from */
  edgeHz: number;
  sideband: 'upper' | 'lower';
  polarisation: 'R' | 'L' | 'X' | 'Y';
  bandwidthHz: number;
  bits: 1 | 2;
};

export type ChannelSummary = Pick<
  PlanMode,
  'skyHz' | 'channelBandwidthHz' | 'channelsPerPolarisation' | 'polarisations' | 'bits'
>;

/**
 * What the plan needs of a mode's channels.
 *
 * @param channels  at least one; all of one bandwidth and of one number of bits, as many in each polarisation
 * @returns skyHz, the middle of the lowest and the highest edge that is covered; the rest as the channels have it
 * @throws RangeError if there is none (programmer error: a mode is stored with its channels)
 */
export function summaryOf(channels: readonly ModeChannel[]): ChannelSummary {
  const [first] = channels;
  if (!first) throw new RangeError('A mode has at least one channel.');
  const covered = channels.map(coverOf);
  const polarisations = new Set(channels.map(({ polarisation }) => polarisation)).size;
  return {
    skyHz:
      (Math.min(...covered.map(({ lowHz }) => lowHz)) + Math.max(...covered.map(({ highHz }) => highHz))) / 2,
    channelBandwidthHz: first.bandwidthHz,
    channelsPerPolarisation: channels.length / polarisations,
    polarisations: polarisations === 1 ? 1 : 2,
    bits: first.bits,
  };
}

/** The sky frequencies, Hz, that a channel covers. */
export function coverOf(channel: Pick<ModeChannel, 'edgeHz' | 'sideband' | 'bandwidthHz'>): {
  lowHz: number;
  highHz: number;
} {
  const { edgeHz, bandwidthHz } = channel;
  return channel.sideband === 'upper'
    ? { lowHz: edgeHz, highHz: edgeHz + bandwidthHz }
    : { lowHz: edgeHz - bandwidthHz, highHz: edgeHz };
}

/**
 * Data rate of a mode, bits a second.
 *
 * Source  two samples a hertz (Nyquist): 2 · B · bits, summed over the channels
 */
export const dataRateOf = (channels: readonly Pick<ModeChannel, 'bandwidthHz' | 'bits'>[]): number =>
  channels.reduce((sum, { bandwidthHz, bits }) => sum + 2 * bandwidthHz * bits, 0);
