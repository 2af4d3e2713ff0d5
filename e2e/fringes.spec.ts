import { expect, test } from './fixtures';

const ADDRESS = '/sessions/ARC-031/fringes';

test('correlator staff read the matrix, find what fails and why, and go to it on the timeline', async ({
  pageAs,
}) => {
  const page = await pageAs('correlator');
  await page.goto(ADDRESS);
  const grid = page.getByRole('grid', { name: /^Expected fringes/ });
  await expect(grid).toBeVisible();
  await expect(page.getByText(/baselines in scans should show fringes/)).toBeVisible();

  await grid.focus();
  await page.keyboard.press('n');
  const panel = page.getByRole('complementary', { name: 'Chosen cell' });
  await expect(panel.getByRole('heading', { name: 'Em–Cf, scan 1' })).toBeVisible();
  await expect(panel.getByText('What is missing: SEFD of Cf at 8.4 GHz.')).toBeVisible();
  await page.keyboard.press('ArrowLeft');
  await expect(panel.getByRole('heading', { name: 'Em–Af, scan 1' })).toBeVisible();
  await expect(panel.getByText(/^Fringes expected: SNR \d+$/)).toBeVisible();

  await page.getByRole('checkbox', { name: /^Strong/ }).uncheck();
  await page.getByRole('checkbox', { name: /^Fair/ }).uncheck();
  await page.getByRole('checkbox', { name: /^Not on/ }).uncheck();
  await page.getByLabel('Source', { exact: true }).selectOption({ label: 'J0738+1742' });
  await panel.getByRole('button', { name: 'Next that fails' }).click();
  await expect(panel.getByText(/^Doubtful: SNR|^None expected: SNR/)).toBeVisible();
  const heading = await panel.getByRole('heading', { level: 1 }).innerText();

  await panel.getByRole('link', { name: 'Show on timeline' }).click();
  await expect(page.locator('[data-ready]')).toBeVisible();
  const number = heading.split('scan ')[1] ?? '';
  await expect(page.getByRole('heading', { name: `Scan ${number}`, exact: true })).toBeVisible();
});

test('the table is saved as a file', async ({ pageAs }) => {
  const page = await pageAs('correlator');
  await page.goto(ADDRESS);
  await expect(page.getByRole('grid', { name: /^Expected fringes/ })).toBeVisible();
  const saving = page.waitForEvent('download');
  await page.getByRole('button', { name: 'Export table' }).click();
  expect((await saving).suggestedFilename()).toBe('ARC-031-fringes.csv');
});

test('an operator has no part in a draft’s fringes', async ({ pageAs }) => {
  const page = await pageAs('operatorAf');
  const response = await page.goto(ADDRESS);
  expect(response?.status()).toBe(403);
});
