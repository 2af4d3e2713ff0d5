import { ID_BYTES, idOf } from '@/src/schedule/plan-ids';

/** `randomUUID` is missing on plain http off localhost. */
export const newId = (): string => idOf(crypto.getRandomValues(new Uint8Array(ID_BYTES)));
