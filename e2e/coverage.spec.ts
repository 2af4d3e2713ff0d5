import { readFile } from 'node:fs/promises';
import { expect, test } from './fixtures';

const ADDRESS = '/sessions/ARC-031/coverage';

test('an investigator reads what the session gives a source, and lights a baseline', async ({ pageAs }) => {
  const page = await pageAs('investigator');
  await page.goto(ADDRESS);
  const numbers = page.getByRole('complementary', { name: 'Numbers' });
  await page.getByLabel('Source', { exact: true }).selectOption({ label: 'J0751+3313, 22 GHz' });
  await expect(numbers.getByRole('heading', { name: 'J0751+3313' })).toBeVisible();
  await expect(numbers.getByRole('row', { name: /^Longest Em–Cf, 11\s787 km 874 Mλ$/ })).toBeVisible();
  await expect(numbers.getByRole('row', { name: /^Image noise \d+ µJy\/beam$/ })).toBeVisible();
  await expect(
    page.getByText('10 scans of J0751+3313 at 22 GHz on 15 baselines, from 27 to 874 Mλ.'),
  ).toBeVisible();

  const baseline = page.getByRole('button', { name: 'Fn–Cf' });
  await baseline.focus();
  await page.keyboard.press('Enter');
  await expect(baseline).toHaveAttribute('aria-pressed', 'true');

  await page.getByLabel('Source', { exact: true }).selectOption({ label: 'J0555+3948, 8.4 GHz' });
  await expect(page).toHaveURL(/source=J0555%2B3948&band=8.4\+GHz/);
  await expect(numbers.getByText(/^The SEFD of Cf at 8.4 GHz is not known/)).toBeVisible();
});

test('the plan that was published is looked at beside the draft', async ({ pageAs }) => {
  const page = await pageAs('scheduler');
  await page.goto('/sessions/ARC-030/coverage');
  await page.getByLabel('Plan').selectOption({ index: 1 });
  await expect(page).toHaveURL(/plan=offered/);
  await expect(page.getByLabel('Plan')).toHaveValue('offered');
  await expect(page.getByRole('complementary', { name: 'Numbers' })).toBeVisible();
});

test('figure and table are saved as files that stand alone', async ({ pageAs }) => {
  const page = await pageAs('correlator');
  await page.goto(`${ADDRESS}?source=J0751%2B3313`);
  const saved = async (button: string) => {
    const saving = page.waitForEvent('download');
    await page.getByRole('button', { name: button }).click();
    const download = await saving;
    return { name: download.suggestedFilename(), text: await readFile(await download.path(), 'utf8') };
  };
  const figure = await saved('Export figures');
  expect(figure.name).toBe('ARC-031-J0751+3313-uv.svg');
  expect(figure.text).toMatch(/^<svg [^>]*xmlns="http:\/\/www\.w3\.org\/2000\/svg"/);
  expect(figure.text).not.toContain('var(');
  const table = await saved('Export table');
  expect(table.name).toBe('ARC-031-J0751+3313-uv.csv');
  expect(table.text.split('\r\n')[0]).toBe('scan,first,second,u_wavelengths,v_wavelengths');
});

test('an address that names no source of the plan is told so', async ({ pageAs }) => {
  const page = await pageAs('scheduler');
  await page.goto(`${ADDRESS}?source=J9999`);
  await expect(page.getByText(/^No scan of this plan observes “J9999”\. Shown is J/)).toBeVisible();
});
