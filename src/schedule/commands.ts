import { acceptGroup, acceptScan, acceptSpan, scanWho } from './accepts';
import type { GroupId, NoddingGroup, Plan, PlanSpan, Scan, ScanId, SubjectId } from './plan';
import { compareScans } from './plan';
import { CommandRefused } from './refused';

export { CommandRefused, type RefusalCode } from './refused';

/** One effect on a plan. A change carries the whole new value. */
export type Edit =
  | { kind: 'add-scan'; scan: Scan }
  | { kind: 'remove-scan'; scanId: ScanId }
  | { kind: 'change-scan'; scan: Scan }
  | { kind: 'add-group'; group: NoddingGroup }
  | { kind: 'remove-group'; groupId: GroupId }
  | { kind: 'change-group'; group: NoddingGroup }
  | { kind: 'change-span'; span: PlanSpan };

/** What a person did, for the journal and the name of the undo step. */
export const VERBS = [
  'add-scan',
  'move-scan',
  'change-length',
  'take-station-out',
  'put-station-in',
  'change-station-times',
  'remove-scan',
  'edit-scan',
  'add-group',
  'remove-group',
  'edit-group',
  'change-span',
] as const;

export type Verb = (typeof VERBS)[number];

/** The verb names it; the edits, in order, are the whole effect. */
export type Command = { verb: Verb; edits: readonly Edit[] };

/** The subject that stands for the session's span. */
export const SPAN_SUBJECT: SubjectId = 'span';

/**
 * The plan after a command, and the command that takes it back.
 *
 * Refuses only what the touched scans, groups and span show themselves, so a plan that holds no more than
 * those (and, for a group taken out, its legs) gives the same answer as the whole one.
 *
 * @param plan     scans by start and id, groups by id; not changed
 * @param command  edits are applied in order; all of them or none
 * @returns plan in the same order; inverse with the same verb, so that applying it gives the plan back
 * @throws CommandRefused with a code, the subject at fault and a sentence for the person
 */
export function applyCommand(plan: Plan, command: Command): { plan: Plan; inverse: Command } {
  if (command.edits.length === 0) {
    throw new CommandRefused('empty', null, 'This change holds nothing to do.');
  }
  const draft: Draft = {
    plan,
    span: plan.span,
    scans: new Map(plan.scans.map((scan) => [scan.id, scan])),
    groups: new Map(plan.groups.map((group) => [group.id, group])),
  };
  const inverse: Edit[] = [];
  for (const edit of command.edits) inverse.unshift(applyEdit(draft, edit));
  refuseLooseLegs(draft, command);
  return { plan: finish(draft, command), inverse: { verb: command.verb, edits: inverse } };
}

/**
 * The ids a command touches: its scans, its groups, 'span'. A leg touches its group too, both the one it
 * leaves and the one it joins.
 *
 * @param plan  as `applyCommand` takes it, before the command
 * @returns ids without doubles, sorted
 */
export function subjectsOf(plan: Plan, command: Command): SubjectId[] {
  const subjects = new Set<SubjectId>();
  const asked = new Set(command.edits.map(scanIdOf));
  const groupOf = new Map<ScanId, GroupId | null>();
  for (const scan of plan.scans) if (asked.has(scan.id)) groupOf.set(scan.id, scan.groupId);
  for (const edit of command.edits) {
    if (edit.kind === 'change-span') subjects.add(SPAN_SUBJECT);
    else if (edit.kind === 'remove-group') subjects.add(edit.groupId);
    else if ('group' in edit) subjects.add(edit.group.id);
    else {
      const scanId = 'scan' in edit ? edit.scan.id : edit.scanId;
      const before = groupOf.get(scanId) ?? null;
      const after = 'scan' in edit ? edit.scan.groupId : null;
      groupOf.set(scanId, after);
      subjects.add(scanId);
      for (const groupId of [before, after]) if (groupId !== null) subjects.add(groupId);
    }
  }
  return [...subjects].sort();
}

type Draft = {
  plan: Plan;
  span: PlanSpan;
  scans: Map<ScanId, Scan>;
  groups: Map<GroupId, NoddingGroup>;
};

/** Applies one edit to the draft and returns the edit that takes it back. */
function applyEdit(draft: Draft, edit: Edit): Edit {
  switch (edit.kind) {
    case 'add-scan': {
      if (draft.scans.has(edit.scan.id)) {
        const message = `${scanWho(edit.scan)} is in the plan already. It was added before.`;
        throw new CommandRefused('exists', edit.scan.id, message);
      }
      putScan(draft, edit.scan);
      return { kind: 'remove-scan', scanId: edit.scan.id };
    }
    case 'remove-scan': {
      const before = fetchScan(draft, edit.scanId);
      draft.scans.delete(edit.scanId);
      return { kind: 'add-scan', scan: before };
    }
    case 'change-scan': {
      const before = fetchScan(draft, edit.scan.id);
      putScan(draft, edit.scan);
      return { kind: 'change-scan', scan: before };
    }
    case 'add-group': {
      if (draft.groups.has(edit.group.id)) {
        const message = 'This nodding group is in the plan already. It was added before.';
        throw new CommandRefused('exists', edit.group.id, message);
      }
      draft.groups.set(edit.group.id, acceptGroup(edit.group));
      return { kind: 'remove-group', groupId: edit.group.id };
    }
    case 'remove-group': {
      const before = fetchGroup(draft, edit.groupId);
      draft.groups.delete(edit.groupId);
      return { kind: 'add-group', group: before };
    }
    case 'change-group': {
      const before = fetchGroup(draft, edit.group.id);
      draft.groups.set(edit.group.id, acceptGroup(edit.group));
      return { kind: 'change-group', group: before };
    }
    case 'change-span': {
      const before = draft.span;
      draft.span = acceptSpan(edit.span);
      return { kind: 'change-span', span: before };
    }
  }
}

function putScan(draft: Draft, scan: Scan): void {
  draft.scans.set(scan.id, acceptScan(scan, draft.plan.stations));
}

function fetchScan(draft: Draft, id: ScanId): Scan {
  const scan = draft.scans.get(id);
  if (scan) return scan;
  throw new CommandRefused('gone', id, 'This scan is no longer in the plan. It was removed.');
}

function fetchGroup(draft: Draft, id: GroupId): NoddingGroup {
  const group = draft.groups.get(id);
  if (group) return group;
  throw new CommandRefused('gone', id, 'This nodding group is no longer in the plan. It was removed.');
}

/** A leg needs its group once all edits are in, whatever their order: so an inverse is never refused. */
function refuseLooseLegs(draft: Draft, command: Command): void {
  const removed = new Set(
    command.edits.flatMap((edit) => (edit.kind === 'remove-group' ? [edit.groupId] : [])),
  );
  const touched = new Set(command.edits.map(scanIdOf));
  for (const scan of draft.scans.values()) {
    if (scan.groupId === null || draft.groups.has(scan.groupId)) continue;
    if (removed.has(scan.groupId)) {
      const message = `${scanWho(scan)} is still a leg of this nodding group. Remove its legs with it.`;
      throw new CommandRefused('group-in-use', scan.groupId, message);
    }
    if (!touched.has(scan.id)) continue;
    const message = `${scanWho(scan)} belongs to a nodding group that is not in the plan.`;
    throw new CommandRefused('unknown-group', scan.id, message);
  }
}

function finish(draft: Draft, command: Command): Plan {
  const touchesScans = command.edits.some((edit) => scanIdOf(edit) !== null);
  const touchesGroups = command.edits.some((edit) => edit.kind === 'remove-group' || 'group' in edit);
  return {
    ...draft.plan,
    span: draft.span,
    scans: touchesScans ? [...draft.scans.values()].sort(compareScans) : draft.plan.scans,
    groups: touchesGroups
      ? [...draft.groups.values()].sort((a, b) => (a.id < b.id ? -1 : 1))
      : draft.plan.groups,
  };
}

function scanIdOf(edit: Edit): ScanId | null {
  if ('scan' in edit) return edit.scan.id;
  return edit.kind === 'remove-scan' ? edit.scanId : null;
}
