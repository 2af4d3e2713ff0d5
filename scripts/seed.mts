import { database } from '../db/client';
import { seedDemo } from '../db/seed';
import { env, nowMs } from '../src/env';

if (env().isDemo) await seedDemo(nowMs());
database().client.close();
