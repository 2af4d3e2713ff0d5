// Serves the production build over a fresh demo database of its own: for the browser tests and the weight of the pages.
import { mkdirSync, rmSync } from 'node:fs';
import path from 'node:path';
import './settings.mjs';

process.env.STAGE ||= 'e2e';
const folder = path.resolve('.data', process.env.STAGE);
rmSync(folder, { recursive: true, force: true });
mkdirSync(folder, { recursive: true });

process.env.LOG_LEVEL ||= 'warn';
Object.assign(process.env, {
  DATABASE_URL: `file:${path.join(folder, 'antiphon.db')}`,
  PORT: process.env.E2E_PORT || '4317',
  HOST: '127.0.0.1',
  ANTIPHON_DEMO: '1',
  ANTIPHON_NOW: '2027-02-10T14:32:00Z',
});

const { ensureBuilt } = await import('./build.mjs');
const { runScript } = await import('./run.mjs');
ensureBuilt();
runScript('migrating', 'migrate.mts');
runScript('the demo', 'seed.mts');
await import('./serve.mjs');
