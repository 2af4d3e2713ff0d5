import { spawnSync } from 'node:child_process';

const PYTHON = '/usr/bin/python3';

/**
 * What Debian's python3 needs for a piece of work, in seconds.
 *
 * @param script   prints a number of seconds as its last line; its modules are looked for first
 * @param modules  that it imports
 * @returns null where python3 or one of the modules is not installed
 */
export function pythonSeconds(script: string, modules: readonly string[]): number | null {
  const looked = spawnSync(PYTHON, ['-c', `import ${modules.join(', ')}`]);
  if (looked.status !== 0) return null;
  const run = spawnSync(PYTHON, ['-c', script], { encoding: 'utf8', maxBuffer: 1 << 24 });
  const seconds = Number(run.stdout.trim().split('\n').at(-1));
  if (run.status !== 0 || !(seconds > 0)) throw new Error(`The python3 peer broke: ${run.stderr}`);
  return seconds;
}
