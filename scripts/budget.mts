// npm run budget: first-load JavaScript of every page, gzip, beside a bare page of the framework.
import path from 'node:path';
import type { BrowserContext, Request } from '@playwright/test';
import { bareBytes, gzipped, scriptsOf } from './bare-page.mjs';
import { PAGES, type ShownPage } from './pages';
import { root } from './settings.mjs';
import { onStage } from './staged';

const ALLOWANCE = 115_000;
const LIMITED = 'timeline';
/** States of a page load the same scripts as the page. */
const WEIGHED = PAGES.filter(
  ({ by, status, isPrinted, act, name }) =>
    by !== null && !status && !isPrinted && (act === undefined || name === LIMITED),
);

type Weight = { named: number; loaded: number; total: number };

const bare = await bareBytes();
let over = 0;
console.log(
  `First-load JavaScript, gzip, kB: what the HTML names, what was loaded; all that was transferred`,
);
console.log(line('bare page of the framework', bare));
await onStage('budget', process.env.BUDGET_PORT ?? '4318', async ({ address, browser, as }) => {
  for (const shown of WEIGHED) {
    if (shown.by === null) continue;
    const visitor = await as(shown.by);
    // a new context has an empty cache: what it loads is what a first visit loads
    const first = await browser.newContext({ baseURL: address, storageState: await visitor.storageState() });
    const weight = await weigh(shown, first);
    await first.close();
    console.log(line(shown.name, weight.named, weight.loaded, weight.total));
    if (shown.name === LIMITED) over = Math.max(weight.named, weight.loaded) - (bare + ALLOWANCE);
  }
});
console.log(line(`limit of the ${LIMITED}: bare page + ${ALLOWANCE / 1000}`, bare + ALLOWANCE));
console.log(over > 0 ? `FAILED: ${over} bytes over` : `passed: ${-over} bytes to spare`);
if (over > 0) process.exitCode = 1;

function line(title: string, ...bytes: number[]): string {
  return title.padEnd(44) + bytes.map((count) => (count / 1000).toFixed(1).padStart(9)).join('');
}

async function weigh({ address, name, heading }: ShownPage, context: BrowserContext): Promise<Weight> {
  const page = await context.newPage();
  const loaded = new Set<string>();
  const sizes: Promise<number>[] = [];
  const onFinished = (request: Request) => {
    const script = new URL(request.url()).pathname.match(/_next\/(static\/.+\.js)$/)?.[1];
    if (script) loaded.add(script);
    sizes.push(
      request
        .sizes()
        .then(({ responseBodySize, responseHeadersSize }) => responseBodySize + responseHeadersSize),
    );
  };
  page.on('requestfinished', onFinished);
  const answer = await page.goto(address, { waitUntil: 'load' });
  if (!answer) throw new Error(`${name} gave no answer.`);
  const named = scriptsOf(await answer.text());
  if (named.length === 0) throw new Error(`${name} names no scripts: nothing was weighed.`);
  // the timeline is weighed when it can be worked with; what it loads after that keeps nobody waiting
  if (name === LIMITED) await page.locator('[data-ready]').first().waitFor();
  else {
    await page.getByRole('heading', { name: heading }).first().waitFor();
    await page.waitForLoadState('networkidle');
  }
  page.off('requestfinished', onFinished);
  // a poll that ends as the page closes has no size
  const settled = await Promise.allSettled(sizes);
  const total = settled.reduce((all, one) => all + (one.status === 'fulfilled' ? one.value : 0), 0);
  return { named: sum(named), loaded: sum([...loaded]), total };
}

function sum(scripts: readonly string[]): number {
  return scripts.reduce(
    (all, script) => all + gzipped(path.join(root, '.next', decodeURIComponent(script))),
    0,
  );
}
