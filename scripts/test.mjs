import { existsSync, mkdirSync, readFileSync, rmSync } from 'node:fs';
import path from 'node:path';
import { root } from './settings.mjs';
import { execute } from './steps.mjs';

const folder = path.join(root, '.data/test');
rmSync(folder, { recursive: true, force: true });
mkdirSync(folder, { recursive: true });
const report = (name) => path.join(folder, `${name}.json`);

const steps = [
  {
    title: 'Verify',
    args: ['scripts/verify.mjs', '--fresh'],
    env: { VERIFY_REPORT: report('verify') },
    count: () => tally(read('verify').map(({ passed }) => passed)),
  },
  {
    title: 'Unit tests',
    // verify has run the architecture test and counted it
    args: [
      ...['node_modules/vitest/vitest.mjs', 'run', '--exclude', 'tests/architecture.test.ts'],
      ...['--reporter=default', '--reporter=json', `--outputFile.json=${report('unit')}`],
    ],
    count: () => countUnit(read('unit')),
  },
  { title: 'Production build', args: ['scripts/build.mjs'] },
  {
    title: 'End-to-end tests',
    args: ['node_modules/@playwright/test/cli.js', 'test'],
    env: { PLAYWRIGHT_JSON_OUTPUT_FILE: report('e2e') },
    count: () => countBrowser(read('e2e')),
  },
  { title: 'Weight of the pages', args: ['--import', 'tsx', 'scripts/budget.mts'] },
];

const total = { passed: 0, failed: 0 };
const summary = [];
for (const step of steps) {
  console.log(`\n── ${step.title} ──`);
  const began = Date.now();
  const { code } = await execute(step.args, { env: step.env });
  const counts = settle(step, code);
  total.passed += counts.passed;
  total.failed += counts.failed;
  const seconds = ((Date.now() - began) / 1000).toFixed(1);
  summary.push(`${step.title}: ${counts.passed} passed, ${counts.failed} failed, ${seconds} s`);
}
console.log(`\n${summary.join('\n')}`);
console.log(`${total.passed} passed, ${total.failed} failed`);
process.exitCode = total.failed > 0 ? 1 : 0;

/** A step that ends badly without a failed test of its own, or that ran nothing, is a failure too. */
function settle({ title, count }, code) {
  if (!count) return tally([code === 0]);
  let counts = { passed: 0, failed: 0 };
  try {
    counts = count();
  } catch (error) {
    console.error(`${title}: no report to count (${error.message})`);
  }
  const isBroken = (code !== 0 && counts.failed === 0) || counts.passed + counts.failed === 0;
  return isBroken ? { ...counts, failed: counts.failed + 1 } : counts;
}

function read(name) {
  if (!existsSync(report(name))) throw new Error(`${name}.json is missing`);
  return JSON.parse(readFileSync(report(name), 'utf8'));
}

function tally(outcomes) {
  const passed = outcomes.filter(Boolean).length;
  return { passed, failed: outcomes.length - passed };
}

/** A skipped test counts as failed: nothing here is left out on purpose. */
function countUnit({ testResults }) {
  const outcomes = testResults.flatMap(({ status, assertionResults }) =>
    assertionResults.length
      ? assertionResults.map((test) => test.status === 'passed')
      : [status === 'passed'],
  );
  return tally(outcomes);
}

function countBrowser({ stats, errors }) {
  return { passed: stats.expected, failed: stats.unexpected + stats.flaky + stats.skipped + errors.length };
}
