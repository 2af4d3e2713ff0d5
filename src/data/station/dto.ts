import type { MountKind } from '../../sky/types';
import type {
  AllowanceValues,
  RecordingValues,
  StationBand,
  WiringValues,
} from '../../exchange/catalogue/station-signal';
import type { Corner, MountValues, PositionValues, Sector } from '../../exchange/catalogue/station-site';
import type { Absence, StationBlockName } from '../../exchange/catalogue/station';

/** Each block of a station's page, as its form reads and writes it. */
export type StationBlocks = {
  position: PositionValues;
  mount: MountValues;
  wrap: { wrapSectors: readonly Sector[] };
  bands: { bands: readonly StationBand[] };
  wiring: WiringValues;
  recording: RecordingValues;
  allowances: AllowanceValues;
  horizon: { horizon: readonly Corner[] };
  away: { away: readonly Absence[] };
  contacts: { contacts: string };
};

export type StationDto = {
  code: string;
  site: { latitudeDeg: number; longitudeDeg: number; heightM: number };
  itrf: { x: number; y: number; z: number };
  recorderFreeAtMs: number | null;
  retiredAtMs: number | null;
  blocks: StationBlocks;
  /** catalogue sources by name, and their apparent declination today: their paths over the sky are drawn */
  skySources: readonly { id: string; name: string; decDeg: number }[];
  /** blocks that the viewer may change */
  canEdit: readonly StationBlockName[];
  canRetire: boolean;
  canReadDesk: boolean;
  canReadClock: boolean;
  /** of the sessions the viewer may know of */
  sessionsAhead: readonly { code: string; title: string; startMs: number }[];
};

export type StationRow = {
  code: string;
  name: string;
  timeZone: string;
  mountKind: MountKind;
  site: { latitudeDeg: number; longitudeDeg: number; heightM: number };
  dishM: number;
  sefdJy: Readonly<Record<string, number>>;
  recorderFreeBytes: number | null;
  nextAway: { startMs: number; endMs: number; why: string } | null;
  sessionsAhead: number;
  retiredAtMs: number | null;
};
