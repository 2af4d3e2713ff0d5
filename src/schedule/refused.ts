import type { SubjectId } from './plan';

export type RefusalCode =
  | 'empty'
  | 'length'
  | 'time'
  | 'part-second'
  | 'double-station'
  | 'nothing-left'
  | 'exists'
  | 'gone'
  | 'unknown-group'
  | 'leg'
  | 'group-in-use'
  | 'unknown-station';

/**
 * What `applyCommand` throws when a command cannot be taken as it stands. The message is a sentence for the
 * person who gave it: what was read, what is expected.
 */
export class CommandRefused extends Error {
  override readonly name = 'CommandRefused';

  constructor(
    readonly code: RefusalCode,
    /** the scan, group or 'span' at fault; null for a command that touches nothing */
    readonly subjectId: SubjectId | null,
    message: string,
  ) {
    super(message);
  }
}
