import type { Locator, Page } from '@playwright/test';
import { expect, test } from './fixtures';

const ADDRESS = '/sessions/ARC-031/timeline';

/** One plan, one person: these walks follow each other, and each leaves the plan as it found it. */
test.describe.configure({ mode: 'serial' });

async function openTimeline(page: Page) {
  await page.goto(ADDRESS);
  await expect(page.locator('[data-ready]')).toBeVisible();
  return {
    grid: page.getByRole('grid', { name: /^Timeline/ }),
    inspector: page.getByRole('complementary', { name: 'Chosen scan' }),
  };
}

const sourceRow = (page: Page, name: string) =>
  page.getByRole('complementary', { name: 'Sources' }).getByRole('button', { name });

/** How many scans the plan holds, as the map says. */
const scanCount = async (page: Page) =>
  Number(/(\d+) scans/.exec((await page.getByText(/^\d+ scans$/).textContent()) ?? '')?.[1]);

/** A drag in many steps, as a hand makes it. */
async function drag(page: Page, from: Locator, to: { x: number; y: number }, drop = true) {
  const box = await from.boundingBox();
  if (!box) throw new Error('nothing to drag');
  await page.mouse.move(box.x + box.width / 2, box.y + box.height / 2);
  await page.mouse.down();
  await page.mouse.move(box.x + box.width / 2 + 12, box.y + box.height / 2, { steps: 3 });
  await page.mouse.move(to.x, to.y, { steps: 8 });
  if (drop) await page.mouse.up();
}

test('a scheduler drags a source to a time, reads the verdict, takes it back and brings it again', async ({
  pageAs,
}) => {
  const page = await pageAs('scheduler');
  const { inspector } = await openTimeline(page);
  const before = await scanCount(page);
  const sheet = await page.locator('#timeline-sheet').boundingBox();
  if (!sheet) throw new Error('no sheet');
  const gap = { x: sheet.x + 84 + (864 / 8) * 3.35, y: sheet.y + 260 };

  await drag(page, sourceRow(page, 'J0854+2006'), gap, false);
  await expect(page.getByText('Can watch')).toBeVisible();
  await expect(page.getByText(/^Fits\.$/)).toBeVisible();
  await page.mouse.up();

  await expect(inspector.getByRole('heading', { name: 'Scan 12', exact: true })).toBeVisible();
  await expect(inspector.getByText('J0854+2006')).toBeVisible();
  const fringes = inspector.getByRole('table', { name: 'Expected fringes' });
  await expect(fringes.getByRole('row')).toHaveCount(16);
  await expect(fringes.getByRole('row', { name: /^Fn–Af strong \d+/ })).toBeAttached();
  expect(await scanCount(page)).toBe(before + 1);

  const undo = page.getByRole('button', { name: 'Undo' });
  await expect(undo).toHaveAttribute('title', /adding a scan/);
  await undo.click();
  await expect.poll(() => scanCount(page)).toBe(before);
  await page.getByRole('button', { name: 'Redo' }).click();
  await expect.poll(() => scanCount(page)).toBe(before + 1);

  await page.reload();
  await expect(page.locator('[data-ready]')).toBeVisible();
  expect(await scanCount(page)).toBe(before + 1);
  await page.keyboard.press('Control+z');
  await expect.poll(() => scanCount(page)).toBe(before);
});

test('the same by keys: add, take a station out, move, remove, undo', async ({ pageAs }) => {
  const page = await pageAs('scheduler');
  const { grid, inspector } = await openTimeline(page);
  const before = await scanCount(page);
  const live = page.getByRole('status').filter({ hasText: /New scan of|Scan \d+, / });

  await grid.focus();
  // ten scans, then the legs of the nodding group one by one
  for (let step = 0; step < 10 + 17; step++) await page.keyboard.press('ArrowRight');
  await expect(inspector.getByRole('heading', { name: 'Scan 11.17', exact: true })).toBeVisible();

  await sourceRow(page, 'J0854+2006').focus();
  await page.keyboard.press('Enter');
  await expect(grid).toBeFocused();
  await expect(live).toContainText(/New scan of J0854\+2006, start \d\d:\d\d:\d\d\. Fits\./);
  await page.keyboard.press('Shift+ArrowRight');
  await page.keyboard.press('Enter');
  await expect(inspector.getByRole('heading', { name: 'Scan 12', exact: true })).toBeVisible();
  expect(await scanCount(page)).toBe(before + 1);

  const chip = inspector.getByText(/of 6 stations/);
  const all = await chip.innerText();
  await page.keyboard.press('ArrowDown');
  await page.keyboard.press('ArrowDown');
  await page.keyboard.press('Space');
  await expect(chip).not.toHaveText(all);
  await page.keyboard.press('Control+z');
  await expect(chip).toHaveText(all);

  const start = inspector.getByText(/^\d\d:\d\d:\d\d$/).first();
  const was = await start.innerText();
  await page.keyboard.press('m');
  await page.keyboard.press('ArrowRight');
  await page.keyboard.press('Escape');
  await expect(start).toHaveText(was);
  await page.keyboard.press('m');
  await page.keyboard.press('Shift+ArrowRight');
  await page.keyboard.press('Enter');
  await expect(start).not.toHaveText(was);

  await page.keyboard.press('Delete');
  await expect.poll(() => scanCount(page)).toBe(before);
  for (let left = 3; left > 0; left--) await page.keyboard.press('Control+z');
  await expect.poll(() => scanCount(page)).toBe(before);
  await expect(page.getByRole('button', { name: 'Undo' })).toHaveAttribute('aria-disabled', 'true');
});

test('a drop that does not fit goes back and says why; with Shift it makes the problem, with its mend', async ({
  pageAs,
}) => {
  const page = await pageAs('scheduler');
  const { inspector } = await openTimeline(page);
  const before = await scanCount(page);
  const sheet = await page.locator('#timeline-sheet').boundingBox();
  if (!sheet) throw new Error('no sheet');
  const at = (hours: number, y: number) => ({ x: sheet.x + 84 + (864 / 8) * hours, y: sheet.y + y });
  const from = at(1.3, 300);
  const onto = at(1.05, 300);

  const dragScan = async () => {
    await page.mouse.move(from.x, from.y);
    await page.mouse.down();
    await page.mouse.move(onto.x, onto.y, { steps: 8 });
  };
  await page.mouse.click(from.x, from.y);
  await expect(inspector.getByRole('heading', { name: /^Scan \d+$/ })).toBeVisible();
  await dragScan();
  await expect(page.getByText('Does not fit.')).toBeVisible();
  await page.mouse.up();
  await expect(page.getByText(/^Not dropped\./)).toBeVisible();

  await dragScan();
  await page.keyboard.down('Shift');
  await page.mouse.up();
  await page.keyboard.up('Shift');
  await expect(page.getByText(/two scans at once|at once|busy/).first()).toBeVisible();
  await page.keyboard.press('Control+z');
  await expect(page.getByText('1 to fix, 2 to note')).toBeVisible();
  expect(await scanCount(page)).toBe(before);
});

test('a late slew is mended by its first button', async ({ pageAs }) => {
  const page = await pageAs('scheduler');
  await openTimeline(page);
  await expect(page.getByText('49 s short')).toBeVisible();
  await page.getByRole('button', { name: 'Af joins at 01:03:00, 1 min late' }).click();
  await expect(page.getByText('49 s short')).toBeHidden();
  await expect(page.getByText('2 to note')).toBeVisible();
  await page.keyboard.press('Control+z');
  await expect(page.getByText('49 s short')).toBeVisible();
});

test('a change that someone else made meanwhile is not written over', async ({ pageAs }) => {
  const mine = await pageAs('scheduler');
  const theirs = await pageAs('admin');
  const here = await openTimeline(mine);
  const there = await openTimeline(theirs);
  for (const { grid } of [here, there]) {
    await grid.focus();
    await grid.press('ArrowRight');
  }
  await theirs.keyboard.press('m');
  await theirs.keyboard.press('ArrowRight');
  await theirs.keyboard.press('Shift+Enter');
  await expect(theirs.getByRole('button', { name: 'Undo' })).toHaveAttribute('title', /moving a scan/);

  await mine.keyboard.press('m');
  await mine.keyboard.press('Shift+ArrowRight');
  await mine.keyboard.press('Shift+Enter');
  await expect(mine.getByRole('alert').filter({ hasText: 'was moved by an administrator' })).toBeVisible();
  await mine.getByRole('button', { name: 'Keep theirs' }).click();
  await expect(here.inspector.getByText('20:04:10')).toBeVisible();

  await theirs.keyboard.press('Control+z');
  await expect(there.inspector.getByText('20:04:00')).toBeVisible();
});

test('a correlator reads the draft and cannot change it', async ({ pageAs }) => {
  const page = await pageAs('correlator');
  const { grid, inspector } = await openTimeline(page);
  await expect(page.getByText('Reading only')).toBeVisible();
  await grid.focus();
  await page.keyboard.press('ArrowRight');
  await expect(inspector.getByRole('heading', { name: 'Scan 1', exact: true })).toBeVisible();
  await expect(inspector.getByText('No data: SEFD of Cf at 8.4 GHz.', { exact: true })).toBeVisible();
  await expect(page.getByRole('button', { name: 'Remove' })).toBeHidden();
  await page.keyboard.press('Delete');
  await expect(inspector.getByRole('heading', { name: 'Scan 1', exact: true })).toBeVisible();
});

test('a scan is edited by its form, errors stand beside the field', async ({ pageAs }) => {
  const page = await pageAs('scheduler');
  const { grid, inspector } = await openTimeline(page);
  await grid.focus();
  await page.keyboard.press('ArrowRight');
  await inspector.getByRole('button', { name: 'Edit scan' }).click();
  const dialog = page.getByRole('dialog', { name: 'Edit scan 1' });
  await dialog.getByLabel('Length').fill('long');
  await dialog.getByRole('button', { name: 'Keep scan 1' }).click();
  await expect(dialog.getByLabel('Length')).toHaveAccessibleDescription(
    /“long” is no length\. Write it as 12 min/,
  );
  await dialog.getByLabel('Length').fill('8 min');
  await dialog.getByRole('checkbox', { name: 'Bm' }).uncheck();
  await dialog.getByRole('button', { name: 'Keep scan 1' }).click();
  await expect(dialog).toBeHidden();
  await expect(inspector.getByText('8 min', { exact: true })).toBeVisible();
  await page.keyboard.press('Control+z');
  await expect(inspector.getByText('10 min', { exact: true })).toBeVisible();
});

test('removing a scan, and mending a problem, leave the focus on the grid', async ({ pageAs }) => {
  const page = await pageAs('scheduler');
  const { grid, inspector } = await openTimeline(page);
  const before = await scanCount(page);
  await grid.focus();
  await page.keyboard.press('ArrowRight');
  await inspector.getByRole('button', { name: 'Remove' }).focus();
  await page.keyboard.press('Enter');
  await expect(grid).toBeFocused();
  await expect.poll(() => scanCount(page)).toBe(before - 1);
  await page.keyboard.press('Control+z');
  await expect.poll(() => scanCount(page)).toBe(before);

  await page
    .getByRole('button', { name: /^Leave Cf out/ })
    .first()
    .focus();
  await page.keyboard.press('Enter');
  await expect(grid).toBeFocused();
  await page.keyboard.press('Control+z');
  await expect(page.getByRole('button', { name: /^Leave Cf out/ }).first()).toBeVisible();
});
