import { spawn } from 'node:child_process';
import type { Browser, BrowserContext } from '@playwright/test';
import { chromium } from '@playwright/test';
import { DEMO_PASSWORD } from '../db/seed-data/accounts';
import { findChromium } from './chromium.mjs';
import { emailOf, type Visitor } from './pages';

const FLAGS = [
  '--no-sandbox',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
  '--no-first-run',
];

export type Stage = { address: string; browser: Browser; as: (visitor: Visitor) => Promise<BrowserContext> };

/** The production build over a fresh demo with its clock fixed, and a browser before it; both end with the work. */
export async function onStage(
  name: string,
  port: string,
  work: (stage: Stage) => Promise<void>,
): Promise<void> {
  const address = `http://127.0.0.1:${port}`;
  const server = spawn(process.execPath, ['scripts/stage.mjs'], {
    stdio: ['ignore', 'ignore', 'inherit'],
    env: { ...process.env, E2E_PORT: port, STAGE: name, LOG_LEVEL: 'error' },
  });
  const ended = new Promise<never>((_, fail) =>
    server.on('exit', () => fail(new Error(`The server of ${name} ended before the work was done.`))),
  );
  const browser = await chromium.launch({ executablePath: findChromium(), args: FLAGS });
  const signedIn = new Map<Visitor, Promise<BrowserContext>>();
  const as = (visitor: Visitor) => {
    const known = signedIn.get(visitor) ?? signIn(browser, address, visitor);
    signedIn.set(visitor, known);
    return known;
  };
  try {
    await Promise.race([ended, answering(address).then(() => work({ address, browser, as }))]);
  } finally {
    ended.catch(() => undefined);
    await browser.close();
    server.kill('SIGTERM');
  }
}

async function answering(address: string): Promise<void> {
  for (;;) {
    const isUp = await fetch(`${address}/sign-in`).then(
      ({ ok }) => ok,
      () => false,
    );
    if (isUp) return;
    await new Promise((resolve) => setTimeout(resolve, 200));
  }
}

async function signIn(browser: Browser, address: string, visitor: Visitor): Promise<BrowserContext> {
  const context = await browser.newContext({ baseURL: address, reducedMotion: 'reduce' });
  const page = await context.newPage();
  await page.goto('/sign-in');
  await page.getByLabel('E-mail').fill(emailOf(visitor));
  await page.getByRole('textbox', { name: 'Password' }).fill(DEMO_PASSWORD);
  await page.getByRole('button', { name: 'Sign in', exact: true }).click();
  await page.waitForURL((url) => url.pathname !== '/sign-in');
  await page.close();
  return context;
}
