import type { modes } from '../schema/modes';

export const BAND_22 = '22 GHz';
export const BAND_8 = '8.4 GHz';

export const MODES: readonly Omit<typeof modes.$inferInsert, 'id'>[] = [
  {
    name: '22 GHz, 2 × 32 MHz × 2 pol, 2 bit, 512 Mb/s',
    band: BAND_22,
    skyHz: 22.235e9,
    channelBandwidthHz: 32e6,
    channelsPerPolarisation: 2,
    polarisations: 2,
    bits: 2,
    coherenceSeconds: 120,
  },
  {
    name: '8.4 GHz, 2 × 32 MHz × 2 pol, 2 bit, 512 Mb/s',
    band: BAND_8,
    skyHz: 8.415e9,
    channelBandwidthHz: 32e6,
    channelsPerPolarisation: 2,
    polarisations: 2,
    bits: 2,
    coherenceSeconds: 300,
  },
];
