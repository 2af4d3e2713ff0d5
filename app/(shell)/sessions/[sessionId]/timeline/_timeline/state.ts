import type { Revs, Steps, Timeline } from '@/src/data/plan/dto';
import type { OutlookContext } from '@/src/outlook/fringe-outlook';
import type { PlanMode } from '@/src/schedule/context';
import type { Command } from '@/src/schedule/commands';
import type { Plan, ScanId, ScanStation, StationCode, SubjectId } from '@/src/schedule/plan';
import type { View } from './scale';

/** seen: the revisions that the person saw, fixed when the gesture began */
export type PendingAct = { actId: string } & (
  { kind: 'do'; command: Command; seen: Revs } | { kind: 'undo' | 'redo' }
);

/** What is held over the sheet, by pointer or by keys, before it is dropped. */
export type Placing = {
  by: 'pointer' | 'keys';
  what: 'new' | 'move' | 'length';
  /** null for a scan that does not exist yet */
  scanId: ScanId | null;
  sourceId: string;
  modeId: string;
  startMs: number;
  lengthSeconds: number;
  /** a new scan takes whoever is up; a moved one keeps its stations */
  stations: 'all-up' | readonly ScanStation[];
  /** what the start snapped to, for the read-out */
  snappedTo: string | null;
  /** pointer on the sheet, px; keys have none */
  pointer: { x: number; y: number } | null;
  /** Ctrl or ⌘ is held: the scan stays and a copy is dropped */
  isCopy: boolean;
  /** the revisions when it was taken up */
  seenRevs: Revs;
  /** a scan dragged out of the staves by one note loses this station */
  outStation: StationCode | null;
};

type Notice = {
  message: string;
  /** offered when someone else changed the same thing meanwhile */
  mine: Command | null;
};

export type SnapMode = 'slew' | 'grid' | 'off';

export type TimelineState = {
  session: Timeline['session'];
  stations: Timeline['stations'];
  sources: Timeline['sources'];
  context: OutlookContext;
  answers: Timeline['answers'];
  away: Timeline['away'];
  clocks: Timeline['clocks'];
  mode: PlanMode;
  canEdit: boolean;

  confirmed: Plan;
  revs: Readonly<Record<SubjectId, number>>;
  seq: number;
  steps: Steps;
  pending: readonly PendingAct[];
  /** confirmed with the pending acts applied: what is drawn */
  plan: Plan;
  line: 'ok' | 'lost' | 'signed-out';
  notice: Notice | null;

  view: View;
  snap: SnapMode;
  chosen: { scanId: ScanId; station: StationCode | null } | null;
  /** below desk width the tray is a drawer */
  isTrayOpen: boolean;
  traySourceId: string | null;
  pinnedSourceId: string | null;
  placing: Placing | null;
};
