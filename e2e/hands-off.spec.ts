import type { Page } from '@playwright/test';
import { expect, test } from './fixtures';
import { makeOwnSession } from './own-session';

/** What has the focus, in words; "body" is nothing. */
const focused = (page: Page) =>
  page.evaluate(() => {
    const { activeElement } = document;
    if (!activeElement || activeElement === document.body) return 'body';
    return activeElement.getAttribute('aria-label') ?? activeElement.textContent ?? activeElement.tagName;
  });

test('the focus goes back to where it was when a dialog closes', async ({ pageAs }) => {
  const page = await pageAs('scheduler');
  for (const [address, name] of [
    ['/sessions/ARC-030/slots', 'Offer the plan anew'],
    ['/stations/Dp', 'Retire'],
    ['/sessions/ARC-031/settings', 'Cancel the session'],
  ] as const) {
    await page.goto(address);
    const opener = page.getByRole('button', { name, exact: true });
    await opener.focus();
    await page.keyboard.press('Enter');
    await expect(page.getByRole('dialog')).toBeVisible();
    await page.keyboard.press('Tab');
    const inside = await page.evaluate(() => document.activeElement?.closest('dialog') !== null);
    expect(inside, `${name}: focus is held inside`).toBe(true);
    await page.keyboard.press('Escape');
    await expect(page.getByRole('dialog')).toHaveCount(0);
    await expect(opener).toBeFocused();
  }
});

test('the focus is not lost when what had it goes away', async ({ pageAs }) => {
  const page = await pageAs('scheduler');
  await page.goto('/sessions/ARC-031/settings');
  await page
    .getByRole('button', { name: /^Take out/ })
    .first()
    .focus();
  await page.keyboard.press('Enter');
  expect(await focused(page)).not.toBe('body');

  await page.goto('/stations/Dp');
  await page.getByRole('button', { name: 'Edit: Contacts' }).focus();
  await page.keyboard.press('Enter');
  await page.getByRole('button', { name: 'Leave as it was' }).focus();
  await page.keyboard.press('Enter');
  await expect.poll(() => focused(page)).not.toBe('body');
});

test('the timeline’s grid says its size, its cells and what is chosen', async ({ pageAs }) => {
  const page = await pageAs('scheduler');
  await page.goto('/sessions/ARC-031/timeline');
  await expect(page.locator('[data-ready]')).toBeVisible();
  const grid = page.getByRole('grid', { name: /^Timeline/ });
  await expect(grid).toHaveAttribute('aria-rowcount', '7');
  const columns = Number(await grid.getAttribute('aria-colcount'));
  expect(columns).toBeGreaterThan(73);
  await grid.focus();
  await page.keyboard.press('ArrowRight');
  await page.keyboard.press('ArrowDown');
  const active = await grid.getAttribute('aria-activedescendant');
  expect(active).not.toBeNull();
  const cell = page.locator(`[id="${active}"]`);
  await expect(cell).toHaveAttribute('role', /gridcell|columnheader|rowheader/);
  await expect(cell).toHaveText(/\S/);
});

test('nothing moves for those who want no motion', async ({ pageAs }) => {
  const page = await pageAs('scheduler');
  await page.emulateMedia({ reducedMotion: 'reduce' });
  for (const address of [
    '/sessions',
    '/sessions/ARC-031/timeline',
    '/sessions/ARC-030/slots',
    '/stations/Af/desk',
  ]) {
    await page.goto(address);
    const longest = await page.evaluate(() =>
      Math.max(
        ...[...document.querySelectorAll('*')].flatMap((element) => {
          const { transitionDuration, animationDuration } = getComputedStyle(element);
          return `${transitionDuration},${animationDuration}`.split(',').map((text) => parseFloat(text));
        }),
      ),
    );
    expect(longest, address).toBe(0);
  }
});

test('in forced colours notes and marks take the text’s colour, and the chosen scan the highlight', async ({
  pageAs,
}) => {
  const page = await pageAs('scheduler');
  await page.emulateMedia({ forcedColors: 'active' });
  await page.goto('/sessions/ARC-031/timeline');
  await expect(page.locator('[data-ready]')).toBeVisible();
  const of = (name: string) =>
    page.evaluate((token) => {
      const probe = document.createElement('i');
      probe.style.cssText = `forced-color-adjust: none; color: ${token}`;
      document.body.append(probe);
      const { color } = getComputedStyle(probe);
      probe.remove();
      return color;
    }, name);
  for (const token of ['var(--note)', 'var(--ink)', 'var(--teal)', 'var(--verm)'])
    expect(await of(token), token).toBe(await of('CanvasText'));
  expect(await of('var(--wash)')).toBe(await of('Highlight'));
  await page.getByRole('grid', { name: /^Timeline/ }).focus();
  await page.keyboard.press('ArrowRight');
  const outline = await page.evaluate(() => {
    const { outlineStyle, outlineWidth } = getComputedStyle(document.activeElement ?? document.body);
    return `${outlineStyle} ${outlineWidth}`;
  });
  expect(outline).toBe('solid 2px');
});

test('what was typed is kept when the line is lost or the server fails', async ({ pageAs }) => {
  const page = await pageAs('scheduler');
  await page.goto('/stations/Cf');
  await page.getByRole('button', { name: 'Edit: Contacts' }).click();
  const block = page.getByRole('form', { name: 'Contacts' });
  await block.getByRole('textbox').fill('Night desk: extension 99 (invented)');
  let fails: 'line' | 'server' = 'line';
  await page.route('**/*', (route) => {
    if (route.request().method() !== 'POST') return route.fallback();
    return fails === 'line' ? route.abort() : route.fulfill({ status: 500, body: 'no' });
  });
  await block.getByRole('button', { name: 'Keep contacts' }).click();
  await expect(block.getByRole('alert')).toHaveText(/^There is no line\. What you typed is kept/);
  fails = 'server';
  await block.getByRole('button', { name: 'Keep contacts' }).click();
  await expect(block.getByRole('alert')).toHaveText(
    /^The server could not finish this\. What you typed is kept/,
  );
  await expect(block.getByRole('textbox')).toHaveValue('Night desk: extension 99 (invented)');

  fails = 'line';
  await page.goto('/sessions/ARC-031/settings');
  await page.getByLabel('Title').fill('Another title');
  await page.getByRole('button', { name: 'Keep the changes' }).click();
  await expect(page.getByRole('alert').first()).toHaveText(/^There is no line/);
  await expect(page.getByLabel('Title')).toHaveValue('Another title');
  await page.getByRole('button', { name: 'Cancel the session' }).click();
  await page.getByRole('button', { name: 'Cancel it' }).click();
  await expect(page.getByRole('alert').first()).toHaveText(/^There is no line/);
});

test('a list shows what others did, without being asked', async ({ pageAs }, info) => {
  const code = `LST-${100 + info.workerIndex}`;
  const reader = await pageAs('correlator');
  await reader.goto('/sessions');
  await expect(reader.getByRole('heading', { name: 'Sessions' }).first()).toBeVisible();
  const scheduler = await pageAs('scheduler');
  await makeOwnSession(scheduler, code, 'Made meanwhile');
  await expect(reader.getByRole('row', { name: new RegExp(code) })).toBeVisible();
});

test('an address without its page leads to the page where one’s work begins', async ({ pageAs }) => {
  const ends = {
    scheduler: 'timeline',
    correlator: 'fringes',
    investigator: 'coverage',
    operatorAf: 'slots',
  } as const;
  for (const [person, end] of Object.entries(ends)) {
    const page = await pageAs(person as keyof typeof ends);
    await page.goto('/sessions/ARC-031');
    await expect(page).toHaveURL(new RegExp(`/sessions/ARC-031/${end}$`));
  }
  const scheduler = await pageAs('scheduler');
  await scheduler.goto('/sessions/ARC-777');
  await expect(scheduler.getByRole('heading', { name: 'There is no session ARC-777' })).toBeVisible();
});
