import { derivedState, type SessionHead } from './dto';
import type { SessionRow } from './scope';

/** What stands in the title block of a session's pages. */
export function headOf(session: SessionRow, nowMs: number): SessionHead {
  const { id, code, title, startMs, lengthSeconds, stations } = session;
  return { id, code, title, state: derivedState(session, nowMs), startMs, lengthSeconds, stations };
}
