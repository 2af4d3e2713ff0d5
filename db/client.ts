import 'server-only';
import { mkdirSync } from 'node:fs';
import path from 'node:path';
import { createClient, type Client } from '@libsql/client';
import { drizzle } from 'drizzle-orm/libsql';
import { env } from '../src/env';
import { createSerialClient, inTransaction } from './serial-client';

function open() {
  const { databaseUrl: url, databaseAuthToken: authToken, isLocalFile } = env();
  if (isLocalFile) mkdirSync(path.dirname(url.slice('file:'.length)), { recursive: true });
  const client: Client = isLocalFile ? createSerialClient({ url }) : createClient({ url, authToken });
  return { client, db: drizzle(client) };
}

type Opened = ReturnType<typeof open>;
export type Database = Opened['db'];
export type Tx = Parameters<Parameters<Database['transaction']>[0]>[0];

// Lazy, so that build workers never open the file; on globalThis, so that bundles and dev reloads share it.
const store: typeof globalThis & { antiphonDatabase?: Opened } = globalThis;
export const database = (): Opened => (store.antiphonDatabase ??= open());
export const db = (): Database => database().db;

/** The only way to open a transaction. */
export const transact = <T>(work: (tx: Tx) => Promise<T>): Promise<T> =>
  inTransaction(() => db().transaction(work));
