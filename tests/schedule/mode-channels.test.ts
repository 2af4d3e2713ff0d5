import { describe, expect, it } from 'vitest';
import { coverOf, dataRateOf, summaryOf, type ModeChannel } from '@/src/schedule/mode-channels';

const channel = (over: Partial<ModeChannel> = {}): ModeChannel => ({
  edgeHz: 22.203e9,
  sideband: 'upper',
  polarisation: 'R',
  bandwidthHz: 32e6,
  bits: 2,
  ...over,
});

const FOUR = [
  channel(),
  channel({ polarisation: 'L' }),
  channel({ edgeHz: 22.267e9, sideband: 'lower' }),
  channel({ edgeHz: 22.267e9, sideband: 'lower', polarisation: 'L' }),
];

describe('the channels of a mode', () => {
  it('reach up from the edge in the upper sideband and down from it in the lower', () => {
    expect(coverOf(channel())).toEqual({ lowHz: 22.203e9, highHz: 22.235e9 });
    expect(coverOf(channel({ edgeHz: 22.267e9, sideband: 'lower' }))).toEqual({
      lowHz: 22.235e9,
      highHz: 22.267e9,
    });
  });

  it('sum up to the middle of what they cover, two a polarisation', () => {
    expect(summaryOf(FOUR)).toEqual({
      skyHz: 22.235e9,
      channelBandwidthHz: 32e6,
      channelsPerPolarisation: 2,
      polarisations: 2,
      bits: 2,
    });
  });

  it('record four bits for each hertz at two bits a sample', () => {
    expect(dataRateOf(FOUR)).toBe(512e6);
    expect(dataRateOf([channel({ bits: 1 })])).toBe(64e6);
  });

  it('are never none', () => {
    expect(() => summaryOf([])).toThrow(RangeError);
  });
});
