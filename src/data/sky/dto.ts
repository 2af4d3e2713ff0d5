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

/** A catalogue source that could serve as calibrator of a session's source. */
export type NearbySource = {
  id: string;
  name: string;
  role: PlanSource['role'];
  /** in the band of the session's mode; null where it is not known */
  fluxJy: number | null;
  separationDeg: number;
  /** from north through east */
  positionAngleDeg: number;
  /** part of the source's station-hours in the session in which this one is up as well; null where it has none */
  upToo: number | null;
  isInSession: boolean;
};

export type Nearby = {
  withinDeg: number;
  /** the nearest first, at most NEARBY_MOST */
  sources: NearbySource[];
  /** how many more there are */
  more: number;
  canAdd: boolean;
};
