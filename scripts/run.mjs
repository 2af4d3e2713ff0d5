import { spawnSync } from 'node:child_process';
import { say, stop } from './settings.mjs';

/** Runs a command to its end with its output passed on; a failure ends this process with the same code. */
export function run(title, command, args, env = {}) {
  const began = Date.now();
  const { status, signal, error } = spawnSync(command, args, {
    stdio: 'inherit',
    env: { ...process.env, ...env },
  });
  if (error) stop(`${title} could not start: ${error.message}`);
  if (signal) process.exit(1);
  if (status !== 0) {
    console.error(`[antiphon] ${title} failed: ${[command, ...args].join(' ')}`);
    process.exit(status ?? 1);
  }
  say(`${title} took ${((Date.now() - began) / 1000).toFixed(1)} s`);
}

/** Runs one of the TypeScript scripts of this folder. */
export const runScript = (title, file) =>
  run(title, process.execPath, ['--conditions=react-server', '--import', 'tsx', `scripts/${file}`]);
