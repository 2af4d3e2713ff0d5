import type { modes } from '../schema/modes';
import type { ModeChannel } from '../../src/schedule/mode-channels';

export const BAND_22 = '22 GHz';
export const BAND_8 = '8.4 GHz';

/** Two channels of 32 MHz that meet at the middle, in both circular polarisations. */
const four = (middleHz: number): readonly ModeChannel[] =>
  [
    { edgeHz: middleHz - 32e6, sideband: 'upper' as const },
    { edgeHz: middleHz + 32e6, sideband: 'lower' as const },
  ].flatMap((edge) =>
    (['R', 'L'] as const).map((polarisation) => ({
      ...edge,
      polarisation,
      bandwidthHz: 32e6,
      bits: 2 as const,
    })),
  );

/** Invented. */
export const MODES: readonly (Omit<typeof modes.$inferInsert, 'id'> & {
  channels: readonly ModeChannel[];
})[] = [
  {
    name: '22 GHz, 2 × 32 MHz × 2 pol, 2 bit, 512 Mb/s',
    band: BAND_22,
    coherenceSeconds: 120,
    toneSpacingHz: 5e6,
    channels: four(22.235e9),
  },
  {
    name: '8.4 GHz, 2 × 32 MHz × 2 pol, 2 bit, 512 Mb/s',
    band: BAND_8,
    coherenceSeconds: 300,
    toneSpacingHz: 5e6,
    channels: four(8.415e9),
  },
];
