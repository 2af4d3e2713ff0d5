import { existsSync } from 'node:fs';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import './require-node.mjs';

export const root = path.resolve(path.dirname(fileURLToPath(import.meta.url)), '..');
process.chdir(root);
process.env.NEXT_TELEMETRY_DISABLED = '1';

if (existsSync('.env')) process.loadEnvFile('.env');
process.env.DATABASE_URL ||= 'file:.data/antiphon.db';

export const nextBin = path.join(root, 'node_modules/next/dist/bin/next');

/** The same rule as src/env.ts: on for a local file unless switched off, never for a remote database. */
export function isDemo() {
  const isLocal = process.env.DATABASE_URL.startsWith('file:');
  return isLocal && !['0', 'false', 'off'].includes(process.env.ANTIPHON_DEMO);
}

/** Says one sentence and ends. */
export function stop(sentence) {
  console.error(`[antiphon] ${sentence}`);
  process.exit(1);
}

export const say = (text) => console.log(`[antiphon] ${text}`);
