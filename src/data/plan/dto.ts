import type { Command, Verb } from '../../schedule/commands';
import type { PlanMode, PlanSettings, PlanSource, PlanStation } from '../../schedule/context';
import type { StationClock } from '../../outlook/clock-place';
import type { NoddingGroup, PlanSpan, Scan, StationCode, SubjectId } from '../../schedule/plan';
import type { PlanRows } from '../../schedule/plan-rows';
import type { Answer } from '../../schedule/slots';
import type { Failure } from '../errors';
import type { SessionHead } from '../session/dto';

/** Hours in which a station is not there, by its own word or by plan. */
export type AwayDto = { startMs: number; endMs: number; why: string; isDeclined: boolean };

export type Revs = Readonly<Record<SubjectId, number>>;

export type TimelineStation = PlanStation & { timeZone: string; dishM: number };
export type TimelineSource = PlanSource & { wantedScans: number };

/** The viewer's next undo and redo; isBlocked where someone changed the same things since. */
export type Steps = { undo: Step | null; redo: Step | null };
export type Step = { of: number; verb: Verb; isBlocked: boolean };

export type Timeline = {
  session: SessionHead & { modeId: string };
  plan: PlanRows;
  stations: TimelineStation[];
  sources: TimelineSource[];
  modes: PlanMode[];
  settings: PlanSettings;
  away: Readonly<Record<StationCode, readonly AwayDto[]>>;
  clocks: Readonly<Record<StationCode, StationClock>>;
  /** to the newest offer; a station without a slot is absent */
  answers: Readonly<Record<StationCode, Answer>>;
  /** revision of every subject ever touched; an absent one is 0 */
  revs: Revs;
  /** newest journal row of the session that the plan holds */
  seq: number;
  steps: Steps;
  canEdit: boolean;
  nowMs: number;
};

export type Taken = {
  ok: true;
  seq: number;
  kind: 'do' | 'undo' | 'redo';
  of: number | null;
  command: Command;
  /** the new revision of each subject touched */
  subjects: Revs;
  steps: Steps;
};

/** Who touched a subject last. */
export type Change = {
  subjectId: SubjectId;
  rev: number;
  verb: Verb;
  kind: 'do' | 'undo' | 'redo';
  role: string;
  isMine: boolean;
  atMs: number;
};

export type ActFailure = Failure & {
  /** of a conflict */
  reason?: 'changed' | 'blocked' | 'nothing' | 'closed' | 'act-id';
  changes?: Change[];
  /** the subjects as they are now; a changed one that is absent here is gone */
  theirs?: { span: PlanSpan; scans: readonly Scan[]; groups: readonly NoddingGroup[] };
  revs?: Revs;
};

export type JournalEntry = {
  seq: number;
  actId: string;
  kind: 'do' | 'undo' | 'redo';
  of: number | null;
  verb: Verb;
  role: string;
  isMine: boolean;
  atMs: number;
  command: Command;
  subjects: Revs;
};

export type JournalPage = {
  ok: true;
  entries: JournalEntry[];
  /** the seq to ask after next */
  seq: number;
  hasMore: boolean;
};
