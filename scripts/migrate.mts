import { database } from '../db/client';
import { migrateDatabase } from '../db/migrate';

await migrateDatabase();
database().client.close();
