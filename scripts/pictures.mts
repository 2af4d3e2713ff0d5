// npm run pictures [NAME…]: every page in three sizes by day and by night, into pictures/, with the clock fixed.
import { mkdirSync } from 'node:fs';
import type { BrowserContext } from '@playwright/test';
import './settings.mjs';
import { PAGES, type ShownPage } from './pages';
import { onStage } from './staged';

const FOLDER = 'pictures';
const SIZES = [
  [1440, 900],
  [1280, 800],
  [390, 844],
] as const;
const THEMES = ['day', 'night'] as const;
const A4 = [794, 1123] as const;

const wanted = process.argv.slice(2);
const unknown = wanted.filter((name) => !PAGES.some((page) => page.name === name));
if (unknown.length > 0) {
  console.error(
    `No page is called ${unknown.join(', ')}. There are: ${PAGES.map(({ name }) => name).join(', ')}.`,
  );
  process.exit(2);
}

mkdirSync(FOLDER, { recursive: true });
let made = 0;
const failed: string[] = [];
await onStage('pictures', process.env.PICTURES_PORT ?? '4321', async ({ address, browser, as }) => {
  const stranger = await browser.newContext({ baseURL: address, reducedMotion: 'reduce' });
  for (const shown of PAGES.filter(({ name }) => wanted.length === 0 || wanted.includes(name))) {
    const context = shown.by === null ? stranger : await as(shown.by);
    try {
      if (shown.before) await prepare(shown.before, await as(shown.before.by));
      made += await picture(shown, context, address);
      console.log(`pictured  ${shown.name}`);
    } catch (error) {
      failed.push(shown.name);
      console.error(`FAILED    ${shown.name}: ${error instanceof Error ? error.message : String(error)}`);
    }
  }
});
console.log(`${made} pictures in ${FOLDER}/, ${failed.length} pages failed`);
if (failed.length > 0) process.exitCode = 1;

async function prepare({ address, act }: NonNullable<ShownPage['before']>, context: BrowserContext) {
  const page = await context.newPage();
  await page.goto(address);
  await page.waitForLoadState('networkidle');
  await act(page);
  await page.close();
}

async function picture(shown: ShownPage, context: BrowserContext, address: string): Promise<number> {
  const page = await context.newPage();
  let count = 0;
  try {
    for (const theme of shown.isPrinted ? (['day'] as const) : THEMES) {
      await context.addCookies([{ name: 'antiphon_theme', value: theme, url: address }]);
      for (const [width, height] of shown.isPrinted ? [A4] : SIZES) {
        await page.setViewportSize({ width, height });
        await page.goto(shown.address);
        await page.getByRole('heading', { name: shown.heading }).first().waitFor();
        await page.waitForLoadState('networkidle');
        await shown.act?.(page);
        await page.emulateMedia({ media: shown.isPrinted ? 'print' : 'screen' });
        const file = `${FOLDER}/${shown.name}-${width}-${theme}.png`;
        await page.screenshot({ path: file, fullPage: width < 640 || shown.isPrinted });
        count += 1;
      }
    }
  } finally {
    await page.close();
  }
  return count;
}
