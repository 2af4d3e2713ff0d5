import type { Coverage } from '../../outlook/coverage';
import type { StationSky } from '../../outlook/source-sky';
import type { PlanSource, PlanStation } from '../../schedule/context';
import type { SessionHead } from '../session/dto';

export type CoverageVersion =
  { kind: 'draft' } | { kind: 'offered'; number: number; isPublished: boolean; madeAtMs: number };

/** A source in a band in which the plan observes it. */
export type Observed = Pick<PlanSource, 'name' | 'role'> & {
  sourceId: string;
  band: string;
  fluxJy: number | null;
};

export type CoverageSheet = {
  session: SessionHead;
  stations: Pick<PlanStation, 'code' | 'name' | 'site'>[];
  /** those the viewer may see, the one that is shown among them */
  versions: CoverageVersion[];
  version: CoverageVersion;
  observed: Observed[];
  /** null where the plan has no scan */
  shown: (Observed & { modes: string[]; coverage: Coverage; skies: StationSky[] }) | null;
  span: { startMs: number; endMs: number };
  /** numbers of the scans that have a track */
  scanNumbers: Readonly<Record<string, string>>;
  /** what was asked for and is not there */
  refused: string | null;
  nowMs: number;
};
