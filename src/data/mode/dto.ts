import type { Channel, CorrelatorValues, ModeStation, ModeValues } from '../../exchange/catalogue/mode';

export type ModeDto = {
  id: string;
  blocks: {
    head: ModeValues;
    channels: { channels: readonly Channel[] };
    correlator: CorrelatorValues;
    stations: { stations: readonly ModeStation[] };
  };
  retiredAtMs: number | null;
  canEdit: boolean;
  sessionsAhead: readonly { code: string; title: string; startMs: number }[];
  /** every station in use, and what it can record */
  stations: readonly ModeAbility[];
};

export type ModeAbility = {
  code: string;
  name: string;
  site: { longitudeDeg: number };
  bits: 1 | 2;
  maxBitsPerS: number | null;
  maxChannels: number | null;
  /** of the mode's band; null where the station has no such band */
  feeds: 'circular' | 'linear' | null;
};

export type ModeRow = {
  id: string;
  name: string;
  band: string;
  channels: readonly Channel[];
  coherenceSeconds: number | null;
  sessionsAhead: number;
  retiredAtMs: number | null;
};
