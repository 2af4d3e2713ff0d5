// npm run bench [NAME…]: measures, one line of JSON for each benchmark: {"name","value","unit","n","peer","peerValue","ratio"}.
// A benchmark is a file scripts/bench/NAME.mts and runs in a process of its own, warmed up; value is the median of its
// repeats, n the number of things done, ratio = peerValue / value. A peer that is not installed is said in "peer", with
// peerValue and ratio null. "wanted" tells what we hope for: a miss is no failure. Exit codes: 0 all ran, 1 one broke,
// 2 no benchmark of that name.
import { readdirSync } from 'node:fs';
import path from 'node:path';
import { execute } from './steps.mjs';

const folder = path.join(import.meta.dirname, 'bench');
const known = readdirSync(folder)
  .filter((file) => file.endsWith('.mts'))
  .map((file) => path.basename(file, '.mts'));
const names = process.argv.length > 2 ? process.argv.slice(2) : known;
const unknown = names.filter((name) => !known.includes(name));

if (unknown.length > 0) {
  console.error(`There is no benchmark ${unknown.join(', ')}. There are: ${known.join(', ')}.`);
  process.exitCode = 2;
} else {
  for (const name of names) {
    const { code } = await execute(['--import', 'tsx', path.join(folder, `${name}.mts`)]);
    if (code === 0) continue;
    console.error(`The benchmark ${name} broke.`);
    process.exitCode = 1;
  }
}
