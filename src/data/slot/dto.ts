import type { Answer, Hours } from '../../schedule/slots';
import type { SessionHead } from '../session/dto';

/** A word of a station on its slot, as it was said. */
export type SlotWord = {
  atMs: number;
  /** of the offer that it answers */
  number: number;
  kind: 'offer' | 'publish';
  reply: 'confirmed' | 'partly' | 'declined';
  hours: Hours[];
  reason: string;
  role: string;
  isOnBehalf: boolean;
};

/** A slot's hours, and how the station's newest word stands to it. */
export type Answered = {
  startMs: number;
  endMs: number;
  answer: Answer;
  /** the hours it gave */
  hours: Hours[];
  /** the hours of its slot that it cannot */
  without: Hours[];
  reason: string;
  answeredAtMs: number | null;
  role: string | null;
  isOnBehalf: boolean;
};

export type SlotDto = Answered & {
  stationCode: string;
  stationName: string;
  timeZone: string;
  longitudeDeg: number;
  /** its scans in the offer: start, stop, number, source */
  scans: { startMs: number; stopMs: number; number: string; source: string }[];
  /** a nodding group counts once */
  scanCount: number;
  /** names of the modes it records in */
  modes: string[];
  /** all that the station said, newest first */
  words: SlotWord[];
  /** whether the viewer may answer, and how */
  canReply: boolean;
  isOwn: boolean;
};

/** What was put to the stations, and when. */
export type OfferFacts = {
  number: number;
  kind: 'offer' | 'publish';
  madeAtMs: number;
  answerByMs: number | null;
  note: string;
  checksum: string;
};

export type SlotBoard = {
  session: SessionHead;
  /** null before the first offer */
  offer: (OfferFacts & { id: string; /** whether the draft has moved on since */ isBehind: boolean }) | null;
  span: { startMs: number; endMs: number };
  slots: SlotDto[];
  /** stations of the session without a scan in the offer */
  unasked: string[];
  canOffer: boolean;
  /** messages of the session that did not go out; only for those who offer */
  unsent: { to: string; trouble: string }[];
  /** null where the viewer may not see the draft */
  draft: { scans: number } | null;
  nowMs: number;
};

/** A slot in a list over the sessions. */
export type ListedSlot = Pick<
  SlotDto,
  | 'stationCode'
  | 'stationName'
  | 'timeZone'
  | 'startMs'
  | 'endMs'
  | 'answer'
  | 'hours'
  | 'reason'
  | 'isOnBehalf'
> & {
  sessionCode: string;
  title: string;
  answerByMs: number | null;
};
