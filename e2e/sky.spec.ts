import { expect, test } from './fixtures';

const ADDRESS = '/sessions/ARC-031/sky';

test('a scheduler finds when all, some and two of the stations see a source', async ({ pageAs }) => {
  const page = await pageAs('scheduler');
  await page.goto(ADDRESS);
  const list = page.getByRole('listbox', { name: /^Sources/ });
  await expect(list.getByRole('option')).toHaveCount(11);
  const panel = page.getByRole('complementary', { name: 'Chosen source' });

  await list.focus();
  await page.keyboard.press('End');
  await expect(panel.getByRole('heading', { name: 'J1159+2914' })).toBeVisible();
  await page.keyboard.press('ArrowUp');
  await expect(panel.getByRole('heading', { name: 'J1058+0133' })).toBeVisible();
  await expect(panel.getByText(/^At least 4 stations see J1058\+0133 together from/)).toBeVisible();

  await page.keyboard.press('ArrowRight');
  await expect(page.getByText(/^At 20:00 UT, GMST \d\d:\d\d$/)).toBeVisible();
  await page.keyboard.press('ArrowRight');
  await expect(page.getByText(/^At 20:10 UT/)).toBeVisible();
  await page.keyboard.press('Escape');
  await expect(page.getByText(/^Highest: /)).toBeVisible();

  await page.getByRole('button', { name: 'One baseline' }).click();
  await page.getByRole('combobox', { name: 'Baseline' }).selectOption('Em–Bm');
  await expect(panel.getByText(/^Em and Bm (never )?see J1058\+0133 together/)).toBeVisible();
  await page.getByRole('button', { name: 'Em, Egret Mesa' }).click();
  await expect(page.getByRole('button', { name: 'All 5', exact: true })).toBeVisible();
  await expect(panel.getByRole('heading', { name: 'Together, of Dp, Fn, Af, Cf, Bm' })).toBeVisible();
});

test('the sky is read as a table and saved as a file', async ({ pageAs }) => {
  const page = await pageAs('investigator');
  await page.goto(ADDRESS);
  await page.getByRole('button', { name: 'As a table' }).click();
  const table = page.getByRole('region', { name: 'Windows of every source' });
  await expect(table.getByRole('row')).toHaveCount(12);
  await expect(table.getByRole('cell', { name: /^\d\d:\d\d–\d\d:\d\d/ }).first()).toBeVisible();
  const saving = page.waitForEvent('download');
  await page.getByRole('button', { name: 'Export table' }).click();
  expect((await saving).suggestedFilename()).toBe('ARC-031-sky.csv');
});
