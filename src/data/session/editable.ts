import 'server-only';
import type { Tx } from '../../../db/client';
import { can, type Viewer } from '../../access/policy';
import { forbiddenFor, Refusal } from '../errors';
import { isEnded } from '../../schedule/ended';
import { fetchSession, subjectOf, type SessionRow } from './scope';

/** The session of an address, where the viewer may change it and it is not ended. */
export async function fetchEditable(tx: Tx, viewer: Viewer, key: string): Promise<SessionRow> {
  const session = await fetchSession(tx, viewer, key);
  if (!can(viewer, 'session.edit', subjectOf(session))) throw forbiddenFor('session.edit');
  if (isEnded(session.state)) {
    const message = `${session.code} is ${session.state}: open it again before it is changed.`;
    throw new Refusal({ ok: false, code: 'conflict', message });
  }
  return session;
}
