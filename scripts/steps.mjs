import { spawn } from 'node:child_process';

/** Runs a command; resolves to its exit code and, when `quiet`, what it printed. */
export function execute(args, { quiet = false, env = {} } = {}) {
  return new Promise((resolve, reject) => {
    const child = spawn(process.execPath, args, {
      stdio: ['ignore', quiet ? 'pipe' : 'inherit', quiet ? 'pipe' : 'inherit'],
      env: { ...process.env, ...env },
    });
    let output = '';
    for (const stream of [child.stdout, child.stderr]) stream?.on('data', (chunk) => (output += chunk));
    child.on('error', reject);
    child.on('close', (code) => resolve({ code: code ?? 1, output }));
  });
}

/** Works through jobs in the given order, so many at a time. */
export async function inTurns(jobs, atOnce) {
  const waiting = [...jobs];
  const worker = async () => {
    for (let job = waiting.shift(); job; job = waiting.shift()) await job();
  };
  await Promise.all(Array.from({ length: atOnce }, worker));
}
