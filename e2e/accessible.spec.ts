import type { Page } from '@playwright/test';
import { PAGES, type ShownPage } from '../scripts/pages';
import { expect, expectAccessible, setThemeCookie, test } from './fixtures';

const SIZES = [
  { width: 1440, height: 900 },
  { width: 1280, height: 800 },
  { width: 390, height: 844 },
];

const SHOWN = PAGES.filter(({ isPrinted, before }) => !isPrinted && !before);

async function open(page: Page, { address, heading, act }: ShownPage) {
  await page.goto(address);
  await expect(page.getByRole('heading', { name: heading }).first()).toBeVisible();
  await act?.(page);
  // a few rows have every kind of cell; axe takes a second for each hundred
  if (address.endsWith('/fringes'))
    await page.getByLabel('Source', { exact: true }).selectOption({ label: 'J0738+1742' });
}

const inTheme = (page: Page, theme: string) =>
  page.evaluate((name) => {
    document.documentElement.dataset.theme = name;
  }, theme);

for (const shown of SHOWN) {
  test(`${shown.name} is accessible in three sizes, by day and by night`, async ({
    page: stranger,
    pageAs,
    baseURL,
  }) => {
    const page = shown.by === null ? stranger : await pageAs(shown.by);
    await setThemeCookie(page, 'day', baseURL ?? '');
    await open(page, shown);
    for (const size of SIZES) {
      await page.setViewportSize(size);
      await inTheme(page, 'day');
      await expectAccessible(page);
      await inTheme(page, 'night');
      await expectAccessible(page, 'contrast');
    }
    // 200% and 400% of 1280: everything is still there, and the page itself never scrolls sideways
    for (const width of [640, 390, 320]) {
      await page.setViewportSize({ width, height: 480 });
      await expect(page.getByRole('heading', { name: shown.heading }).first()).toBeAttached();
      await expect
        .poll(() => page.evaluate(() => document.documentElement.scrollWidth), { message: `at ${width} px` })
        .toBeLessThanOrEqual(width);
    }
  });
}
