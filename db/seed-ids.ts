import 'server-only';
import { createHash } from 'node:crypto';
import { idOf } from '../src/schedule/plan-ids';

/** The same for the same name on every machine. */
export const seedId = (kind: string, name: string): string =>
  idOf(createHash('sha256').update(`${kind}:${name}`).digest());

export const userId = (email: string): string => seedId('user', email);
