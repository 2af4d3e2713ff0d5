import type { PlanSource, PlanStation } from '../../schedule/context';
import type { SkyTable } from '../../schedule/sky-table';
import type { SessionHead } from '../session/dto';

export type SkySource = Pick<PlanSource, 'id' | 'name' | 'role' | 'position'> & {
  /** in the band of the session's mode; null where it is not known */
  fluxJy: number | null;
  /** distance from the centres of Sun and Moon in the middle of the session, seen from the geocentre */
  sunDeg: number;
  moonDeg: number;
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
  nowMs: number;
};
