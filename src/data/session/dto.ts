import type { sessions } from '../../../db/schema/sessions';
import type { Answer } from '../../schedule/slots';

type StoredState = (typeof sessions.$inferSelect)['state'];

/** 'observed' is a published session whose end has passed; it is never stored. */
export type SessionState = StoredState | 'observed';

export type SessionHead = {
  id: string;
  code: string;
  title: string;
  state: SessionState;
  startMs: number;
  lengthSeconds: number;
  stations: string[];
};

export type SessionListItem = SessionHead & {
  /** null where the viewer may not see the draft plan */
  scanCount: number | null;
  canReadPlan: boolean;
  /** what the stations were asked or told last; null before the first offer */
  offer: { number: number; kind: 'offer' | 'publish' } | null;
  /** to it, by station */
  answers: Readonly<Record<string, Answer>>;
};

export function derivedState(
  session: { state: StoredState; startMs: number; lengthSeconds: number },
  nowMs: number,
): SessionState {
  const isOver = session.startMs + session.lengthSeconds * 1000 <= nowMs;
  return session.state === 'published' && isOver ? 'observed' : session.state;
}
