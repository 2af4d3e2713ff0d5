import type { PlanSource, PlanStation } from '../../schedule/context';
import type { StationCode } from '../../schedule/plan';
import type { SkyTable } from '../../schedule/sky-table';
import type { SessionHead } from '../session/dto';

export type SkySource = Pick<PlanSource, 'id' | 'name' | 'role' | 'position'> & {
  /** in the band of the session's mode; null where it is not known */
  fluxJy: number | null;
  /** distance from the centres of Sun and Moon in the middle of the session, seen from the geocentre */
  sunDeg: number;
  moonDeg: number;
};

type Span = readonly [startMs: number, endMs: number];

/** What the best start of a session is weighed from. */
export type StartSheet = {
  /** of the targets, or of all sources where none is a target; long enough for every start of a sidereal day */
  windows: readonly Readonly<Record<StationCode, readonly Span[]>>[];
  areTargets: boolean;
  /** lengths up to here can be weighed */
  longestSeconds: number;
  /** revision of the session's hours, and the scans that stand in them; null where the viewer may not move them */
  move: { spanRev: number; scans: readonly Span[] } | null;
};

export type SkySheet = {
  session: SessionHead;
  band: string | null;
  /** on top of masks and each station's own limit */
  minElevationDeg: number;
  /** GMST at the session's start */
  gmstStartHours: number;
  stations: Pick<PlanStation, 'code' | 'name' | 'site'>[];
  sources: SkySource[];
  table: SkyTable;
  starts: StartSheet;
  nowMs: number;
};
