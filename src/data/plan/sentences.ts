import type { Verb } from '../../schedule/commands';
import { clockText } from '../../schedule/words';
import type { Change } from './dto';

const DONE: Readonly<Record<Verb, string>> = {
  'add-scan': 'was added',
  'move-scan': 'was moved',
  'change-length': 'was made longer or shorter',
  'take-station-out': 'had a station taken out',
  'put-station-in': 'had a station put in',
  'change-station-times': 'had a station’s times changed',
  'remove-scan': 'was removed',
  'edit-scan': 'was edited',
  'add-group': 'was added',
  'remove-group': 'was removed',
  'edit-group': 'was edited',
  'change-span': 'had its start or length changed',
};

const WHO: Readonly<Record<string, string>> = { admin: 'an administrator', scheduler: 'a scheduler' };

const STEP_WORDS = { undo: 'an undo', redo: 'a redo' } as const;

/** "The scan at 01:02:50 was moved by a scheduler at 14:35:10 UT." */
export function changeSentence(what: string, change: Change | undefined): string {
  if (!change) return `${what} changed.`;
  const who = change.isMine ? 'you in another window' : (WHO[change.role] ?? change.role);
  const how =
    change.kind === 'do' ? `${DONE[change.verb]} by` : `was changed by ${STEP_WORDS[change.kind]} of`;
  return `${what} ${how} ${who} at ${clockText(change.atMs)} UT.`;
}

/** How a sentence names a subject: a scan by its start, while it is still known. */
export function subjectWords(subjectId: string, scanStartMs: number | undefined): string {
  if (subjectId === 'span') return 'The session';
  return scanStartMs === undefined ? 'A nodding group' : `The scan at ${clockText(scanStartMs)}`;
}
