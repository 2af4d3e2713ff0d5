import { writeFileSync } from 'node:fs';
import { checkLayers } from './layers.mjs';
import { nextBin } from './settings.mjs';
import { execute, inTurns } from './steps.mjs';

// What has not changed since it was last found right is not looked at again; --fresh looks at all of it, since a
// change in one file can make another one's promises wrong.
const kept = (name) =>
  process.argv.includes('--fresh')
    ? []
    : ['--cache', '--cache-strategy', 'content', '--cache-location', `.data/cache/${name}`];
const bin = (file) => `node_modules/${file}`;
const call = async (...args) => execute(args, { quiet: true });

const checks = [
  {
    name: 'lint',
    check: () => call(bin('eslint/bin/eslint.js'), '.', '--max-warnings', '0', ...kept('eslint')),
  },
  { name: 'types', check: checkTypes },
  { name: 'layers', check: checkLayers },
  { name: 'nothing unused', check: () => call(bin('knip/bin/knip.js'), '--no-progress') },
  {
    name: 'format',
    check: () =>
      call(bin('prettier/bin/prettier.cjs'), '--check', '--log-level', 'warn', '.', ...kept('prettier')),
  },
  { name: 'architecture', check: () => call(bin('vitest/vitest.mjs'), 'run', 'tests/architecture.test.ts') },
];

const began = Date.now();
const results = [];
await inTurns(
  checks.map(({ name, check }) => async () => {
    const start = Date.now();
    const { code, output } = await check();
    results.push({ name, passed: code === 0 });
    if (code !== 0) console.log(`${output.trim()}\n`);
    console.log(`${code === 0 ? 'passed' : 'FAILED'}  ${name}  ${seconds(start)} s`);
  }),
  2,
);

const failed = results.filter(({ passed }) => !passed);
console.log(`verify: ${results.length - failed.length} passed, ${failed.length} failed, ${seconds(began)} s`);
if (process.env.VERIFY_REPORT) writeFileSync(process.env.VERIFY_REPORT, JSON.stringify(results));
if (failed.length) process.exitCode = 1;

async function checkTypes() {
  const routes = await call(nextBin, 'typegen');
  return routes.code === 0 ? call(bin('typescript/bin/tsc'), '--noEmit', '-p', '.') : routes;
}

function seconds(since) {
  return ((Date.now() - since) / 1000).toFixed(1);
}
