import { createHash } from 'node:crypto';
import { existsSync, readFileSync, readdirSync, rmSync, statSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { run } from './run.mjs';
import { nextBin, say, stop } from './settings.mjs';

const sources = [
  'app',
  'src',
  'db',
  'public',
  'fonts',
  'migrations',
  'proxy.ts',
  'instrumentation.ts',
  'next.config.mjs',
  'tailwind.config.ts',
  'postcss.config.mjs',
  'tsconfig.json',
  'package-lock.json',
];
const stamp = '.next/source-stamp';

/** Builds when there is no build of exactly these sources by this Node. */
export function ensureBuilt() {
  const hash = sourceHash();
  if (existsSync('.next/BUILD_ID') && existsSync(stamp) && readFileSync(stamp, 'utf8') === hash) {
    say('the build is up to date');
    return;
  }
  rmSync(stamp, { force: true });
  run('the build', process.execPath, [nextBin, 'build'], { NODE_ENV: 'production' });
  writeFileSync(stamp, hash);
}

function sourceHash() {
  const hash = createHash('sha256').update(process.version);
  for (const source of sources) {
    if (!existsSync(source)) stop(`scripts/build.mjs lists ${source}, which does not exist: mend the list.`);
    hashInto(hash, source);
  }
  return hash.digest('hex');
}

function hashInto(hash, file) {
  if (statSync(file).isDirectory())
    for (const name of readdirSync(file).sort()) hashInto(hash, path.join(file, name));
  else hash.update(`${file}\0`).update(readFileSync(file)).update('\0');
}

if (process.argv[1] === fileURLToPath(import.meta.url)) ensureBuilt();
