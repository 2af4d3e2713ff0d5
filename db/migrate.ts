import 'server-only';
import path from 'node:path';
import { migrate } from 'drizzle-orm/libsql/migrator';
import { env } from '../src/env';
import { database } from './client';

/** Brings the database up to the newest migration; write-ahead logging is set once, it stays in the file. */
export async function migrateDatabase(): Promise<void> {
  const { client, db } = database();
  if (env().isLocalFile) await client.execute('PRAGMA journal_mode = WAL');
  await migrate(db, { migrationsFolder: path.join(import.meta.dirname, '..', 'migrations') });
}
