import { spawn } from 'node:child_process';
import path from 'node:path';
import { chromium } from '@playwright/test';
import { bareBytes, gzipped, scriptsOf } from './bare-page.mjs';
import { findChromium } from './chromium.mjs';
import { root, stop } from './settings.mjs';

const allowance = 115_000;
const port = process.env.BUDGET_PORT || '4318';
const address = `http://127.0.0.1:${port}`;

const server = spawn(process.execPath, ['scripts/stage.mjs'], {
  stdio: ['ignore', 'ignore', 'inherit'],
  env: { ...process.env, E2E_PORT: port, STAGE: 'budget', LOG_LEVEL: 'error' },
});
let ended = false;
server.on('exit', () => (ended = true));

try {
  const bare = await bareBytes();
  await answering();
  const { named, loaded } = await weighTimeline();
  const limit = bare + allowance;
  const over = Math.max(named, loaded) - limit;
  const row = (title, bytes) => `${title.padEnd(48)}${(bytes / 1000).toFixed(1).padStart(8)} kB`;
  console.log('First-load JavaScript, gzip');
  console.log(row('  bare page of the framework', bare));
  console.log(row('  timeline page, scripts its HTML names', named));
  console.log(row('  timeline page, scripts loaded until it is ready', loaded));
  console.log(row('  limit: bare page + 115 kB', limit));
  console.log(over > 0 ? `FAILED: ${over} bytes over` : `passed: ${-over} bytes to spare`);
  if (over > 0) process.exitCode = 1;
} finally {
  server.kill('SIGTERM');
}

async function answering() {
  for (;;) {
    if (ended) stop('The server for the weight of the pages did not start.');
    const isUp = await fetch(`${address}/sign-in`).then(
      ({ ok }) => ok,
      () => false,
    );
    if (isUp) return;
    await new Promise((resolve) => setTimeout(resolve, 200));
  }
}

async function weighTimeline() {
  const browser = await chromium.launch({ executablePath: findChromium(), args: ['--no-sandbox'] });
  try {
    const visitor = await browser.newContext();
    const timeline = await signInAndFindTimeline(await visitor.newPage());

    // a new context has an empty cache: what it loads is what a first visit loads
    const first = await browser.newContext({ storageState: await visitor.storageState() });
    const page = await first.newPage();
    const loaded = new Set();
    page.on('response', (response) => {
      const script = new URL(response.url()).pathname.match(/_next\/(static\/.+\.js)$/)?.[1];
      if (script) loaded.add(script);
    });
    const answer = await page.goto(timeline, { waitUntil: 'load' });
    const html = await answer.text();
    await page.locator('[data-ready]').first().waitFor();
    return { named: weigh(scriptsOf(html)), loaded: weigh([...loaded]) };
  } finally {
    await browser.close();
  }
}

async function signInAndFindTimeline(page) {
  await page.goto(`${address}/sign-in`);
  await page.getByLabel('E-mail').fill('scheduler@antiphon.example');
  await page.getByRole('textbox', { name: 'Password' }).fill('antiphon-demo');
  await page.getByRole('button', { name: 'Sign in' }).click();
  await page.waitForURL((url) => url.pathname !== '/sign-in');
  await page.goto(`${address}/sessions`);
  const link = page.locator('main a[href$="/timeline"]').first();
  const href = (await link.getAttribute('href')).replace(/\/timeline$/, '');
  return `${address}${href}/timeline`;
}

function weigh(scripts) {
  if (scripts.length === 0) stop('The timeline page names no scripts: nothing was weighed.');
  return scripts.reduce(
    (sum, script) => sum + gzipped(path.join(root, '.next', decodeURIComponent(script))),
    0,
  );
}
