import { existsSync, readdirSync } from 'node:fs';
import { execute } from './steps.mjs';

const places = ['app', 'src', 'db', 'e2e', 'tests', 'scripts', 'proxy.ts', 'instrumentation.ts'];

/** Holds the layer rules, and proves that every source file on disk was really read. */
export async function checkLayers() {
  const present = places.filter((place) => existsSync(place));
  const cruiser = 'node_modules/dependency-cruiser/bin/dependency-cruise.mjs';
  const { output } = await execute(
    [cruiser, '--config', '.dependency-cruiser.cjs', '-T', 'json', ...present],
    {
      quiet: true,
    },
  );
  if (!output.startsWith('{')) return { code: 1, output };
  const { modules, summary } = JSON.parse(output);

  const read = new Set(modules.map(({ source }) => source));
  const unread = present.flatMap(sourceFiles).filter((file) => !read.has(file));
  const found = summary.violations.map(({ rule, from, to, cycle }) => {
    const path = cycle?.length ? cycle.map(({ name }) => name).join(' → ') : to;
    const { comment } = summary.ruleSetUsed.forbidden.find(({ name }) => name === rule.name) ?? {};
    return `${rule.name}: ${from} → ${path}${comment ? `\n    ${comment}` : ''}`;
  });
  const problems = [...found, ...unread.map((file) => `not read by dependency-cruiser: ${file}`)];
  return { code: problems.length ? 1 : 0, output: problems.join('\n') };
}

function sourceFiles(place) {
  if (/\.(ts|tsx|mts|mjs|cjs)$/.test(place)) return place.endsWith('.d.mts') ? [] : [place];
  if (/\.[a-z0-9]+$/.test(place)) return [];
  return readdirSync(place, { withFileTypes: true }).flatMap((entry) =>
    entry.isDirectory() || /\.(ts|tsx|mts|mjs|cjs)$/.test(entry.name)
      ? sourceFiles(`${place}/${entry.name}`)
      : [],
  );
}
