import { expect, test } from './fixtures';
import { addScan, DAY_50, makeOwnSession } from './own-session';

const HOUR = 3_600_000;
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

test('the best start is weighed, chosen by keys, set, and taken back', async ({ pageAs }, info) => {
  const code = `SKY-${100 + info.workerIndex}`;
  const page = await pageAs('scheduler');
  await makeOwnSession(page, code, 'When to start');
  await addScan(page, code, DAY_50 + 18.5 * HOUR);
  await page.goto(`/sessions/${code}/sky`);
  const best = page.getByRole('region', { name: 'Best start' });
  const slider = best.getByRole('slider', { name: 'Start to weigh, UT' });
  await expect(slider).toHaveAttribute('aria-valuetext', /GMST \d\d:\d\d: \d+\.\d of 24 station-hours/);
  const length = best.getByLabel('Length of the session, hours');
  await length.fill('60');
  await expect(best.getByRole('alert')).toHaveText('Type hours from 0.2 to 24.');
  await length.fill('6');
  await expect(slider).toHaveAttribute('aria-valuetext', /of 12 station-hours, .* of 6 baseline-hours$/);

  await slider.focus();
  await page.keyboard.press('Home');
  await page.keyboard.press('PageUp');
  await expect(slider).toHaveAttribute('aria-valuetext', /^Day 050 19:00:00/);
  await best.getByRole('button', { name: 'Start at 19:00:00' }).click();
  const dialog = page.getByRole('dialog', { name: 'Start at 19:00:00?' });
  await expect(dialog.getByText(/1 scan stays where it is: 1 would be outside its hours/)).toBeVisible();
  await dialog.getByRole('button', { name: 'Start at 19:00:00' }).click();
  await expect(page.getByText(`${code} starts on day 050 at 19:00:00, for 6 h.`)).toBeVisible();
  await expect(page.getByText('6 h from 2027 day 050, 19:00 UT')).toBeVisible();
  await page.getByRole('button', { name: 'Undo' }).click();
  await expect(page.getByText('12 h from 2027 day 050, 18:00 UT')).toBeVisible();
});

test('a calibrator near a source is found and taken into the session', async ({ pageAs }, info) => {
  const code = `NEA-${100 + info.workerIndex}`;
  const page = await pageAs('scheduler');
  await makeOwnSession(page, code, 'What is near');
  await page.goto(`/sessions/${code}/sky`);
  const panel = page.getByRole('complementary', { name: 'Chosen source' });
  const table = panel.getByRole('table', { name: 'Nearby calibrators' });
  await expect(table.getByRole('row', { name: /^J0927\+3902 16.7° 137° 3.10 \d+%$/ })).toBeVisible();
  const within = panel.getByLabel('Calibrators within so many degrees');
  await within.fill('far');
  await expect(panel.getByRole('alert')).toHaveText('Type degrees above 0, up to 180.');
  await within.fill('2');
  await expect(panel.getByText('The catalogue has no calibrator within 2° of J0827+5217.')).toBeVisible();
  await within.fill('30');
  await table.getByRole('button', { name: 'J0555+3948' }).click();
  await panel.getByRole('button', { name: 'Add J0555+3948 to the session' }).click();
  await expect(panel.getByText(`J0555+3948 is one of ${code}’s sources.`)).toBeVisible();
  await expect(page.getByRole('listbox', { name: /^Sources/ }).getByRole('option')).toHaveCount(2);
});

test('who may not move a session still reads the best start', async ({ pageAs }) => {
  const page = await pageAs('investigator');
  await page.goto(ADDRESS);
  const best = page.getByRole('region', { name: 'Best start' });
  await expect(best.getByText(/^\d+\.\d station-hours$/)).toBeVisible();
  await expect(best.getByRole('button', { name: /^Start at/ })).toHaveCount(0);
});
