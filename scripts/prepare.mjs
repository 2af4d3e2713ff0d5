// Runs before `npm start`, `npm run dev` and `npm test`, on a clone that may have nothing installed: Node's own modules only.
import { existsSync, mkdirSync, readFileSync } from 'node:fs';
import path from 'node:path';
import { ensureBuilt } from './build.mjs';
import { findChromium } from './chromium.mjs';
import { run, runScript } from './run.mjs';
import { say, stop } from './settings.mjs';

const goal = process.argv[2];

installPackages();
if (goal === 'test') getChromium();
if (goal === 'start' || goal === 'dev') prepareDatabase();
if (goal === 'start') ensureBuilt();

function installPackages() {
  if (holdsLockedPackages()) return;
  say('installing packages');
  const npm = process.env.npm_execpath ? [process.execPath, process.env.npm_execpath] : ['npm'];
  run('installing', npm[0], [...npm.slice(1), 'ci', '--include=dev', '--no-audit', '--no-fund']);
}

/** Compares npm's own record of what it installed with the lock, so that an install by hand counts too. */
function holdsLockedPackages() {
  const record = 'node_modules/.package-lock.json';
  if (!existsSync(record)) return false;
  const installed = JSON.parse(readFileSync(record, 'utf8')).packages;
  const locked = JSON.parse(readFileSync('package-lock.json', 'utf8')).packages;
  delete locked['']; // the project itself
  const isMissing = ([place, { optional, devOptional }]) => !installed[place] && !optional && !devOptional;
  const isOther = ([place, { version }]) => locked[place]?.version !== version;
  return !Object.entries(locked).some(isMissing) && !Object.entries(installed).some(isOther);
}

function getChromium() {
  if (findChromium()) return;
  if (process.getuid?.() !== 0 || !existsSync('/usr/bin/apt-get')) {
    stop(
      "The tests need a Chromium: install Debian's with `apt-get install chromium`, or set CHROMIUM to one.",
    );
  }
  say("installing Debian's chromium");
  const quiet = { DEBIAN_FRONTEND: 'noninteractive' };
  run('apt-get update', 'apt-get', ['update', '-qq'], quiet);
  run('apt-get install', 'apt-get', ['install', '-y', '-qq', '--no-install-recommends', 'chromium'], quiet);
}

function prepareDatabase() {
  const url = process.env.DATABASE_URL;
  if (url.startsWith('file:')) mkdirSync(path.dirname(url.slice('file:'.length)), { recursive: true });
  runScript('migrating', 'migrate.mts');
  runScript('the demo', 'seed.mts');
}
