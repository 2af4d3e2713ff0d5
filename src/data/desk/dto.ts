import type { Answer } from '../../schedule/slots';
import type { OutcomeDto } from '../outcome/read';
import type { SessionState } from '../session/dto';

/** One scan at the station, or a nodding group as one; angles in degrees, the way there from the scan before. */
export type DeskScan = {
  /** of a group its first leg */
  scanId: string;
  legIds: string[];
  number: string;
  source: string;
  startMs: number;
  stopMs: number;
  startAzDeg: number;
  startElDeg: number;
  stopAzDeg: number;
  stopElDeg: number;
  /** of the mount's first axis */
  motorAxis: string;
  motorStartDeg: number;
  /** whole turns of the cable from 0° to 360°; null for axes that have no cable to wind */
  turn: number | null;
  fromAzDeg: number | null;
  fromElDeg: number | null;
  fromStopMs: number | null;
  slewSeconds: number | null;
  spareSeconds: number | null;
  arriveElDeg: number | null;
  impossible: string | null;
  mode: string;
};

type DeskSlot = { sessionCode: string; title: string; startMs: number; endMs: number; answer: Answer };

export type DeskDto = {
  station: { code: string; name: string; timeZone: string; longitudeDeg: number; minElevationDeg: number };
  /** what the station was given last that is under way, ahead or just over; null is nothing */
  run: {
    sessionId: string;
    code: string;
    title: string;
    state: SessionState;
    number: number;
    kind: 'offer' | 'publish';
    startMs: number;
    endMs: number;
    answer: Answer;
    scans: DeskScan[];
    outcomes: OutcomeDto[];
  } | null;
  /** slots that end after now, by start */
  slots: DeskSlot[];
  clock: { readAtMs: number; offsetSeconds: number } | null;
  canSay: boolean;
  canRead: boolean;
  /** GMST at nowMs */
  gmstHours: number;
  nowMs: number;
};
