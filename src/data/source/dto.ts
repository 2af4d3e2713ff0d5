import type { Component, SourceBand, SourceValues } from '../../exchange/catalogue/source';

export type SourceDto = {
  id: string;
  blocks: {
    place: SourceValues;
    flux: { bands: readonly SourceBand[]; components: readonly Component[] };
  };
  retiredAtMs: number | null;
  canEdit: boolean;
  /** sessions that have it, of those the viewer may know of */
  sessionsAhead: readonly { code: string; title: string; startMs: number }[];
};

export type SourceRow = Pick<SourceValues, 'name' | 'aliases' | 'role' | 'raDeg' | 'decDeg'> & {
  id: string;
  bands: readonly SourceBand[];
  sessionsAhead: number;
  retiredAtMs: number | null;
};
