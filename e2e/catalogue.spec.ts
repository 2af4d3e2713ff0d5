import type { Page } from '@playwright/test';
import { expect, expectAccessible, setThemeCookie, test, THEMES } from './fixtures';

/** Two letters that no station of the demo and no other test has; the tests share one database. */
const code = (letter: string, worker: number) => `${letter}${worker % 10}`;

async function fill(page: Page, values: Readonly<Record<string, string>>): Promise<void> {
  for (const [label, value] of Object.entries(values))
    await page.getByLabel(label, { exact: true }).fill(value);
}

test('a scheduler adds a station, mends a slip, keeps its mask, retires it and takes it back', async ({
  pageAs,
}, info) => {
  const page = await pageAs('scheduler');
  const mine = code('Q', info.workerIndex);
  await page.goto('/stations');
  await page.getByRole('link', { name: 'Add a station' }).click();
  await expect(page.getByRole('heading', { name: 'New station' })).toBeVisible();
  await fill(page, {
    Code: `${mine}x`,
    Name: 'Quiet Corner',
    'Time zone': 'Europe/Lisbon',
    Latitude: '385.1',
    Longitude: '-9.25',
    'Height above the ellipsoid': '120',
    Dish: '25',
    'Azimuth from': '-270',
    'Azimuth to': '270',
    'Azimuth rate': '1',
    'Azimuth start': '0.5',
    'Elevation axis from': '5',
    'Elevation axis to': '88',
    'Elevation axis rate': '0,7',
    'Elevation axis start': '0.5',
    Settling: '3',
    'Lowest elevation': '8',
    'Highest elevation': '87',
  });
  await page.getByRole('button', { name: 'Add the station' }).click();
  await expect(page.getByText('2 fields need another look.')).toBeVisible();
  await expect(page.getByText(`“${mine}x” is no code.`)).toBeVisible();
  await expect(page.getByLabel('Name', { exact: true })).toHaveValue('Quiet Corner');
  await page.getByRole('button', { name: 'Make it 38.51' }).click();
  await expect(page.getByLabel('Latitude', { exact: true })).toHaveValue('38.51');
  await page.getByLabel('Code', { exact: true }).fill('af');
  await page.getByRole('button', { name: 'Add the station' }).click();
  await expect(page.getByText('Af is the code of Arrow Fell.')).toBeVisible();
  await page.getByLabel('Code', { exact: true }).fill(mine);
  await page.getByRole('button', { name: 'Add the station' }).click();
  await expect(page).toHaveURL(new RegExp(`/stations/${mine}$`));
  await expect(page.getByRole('heading', { name: 'Quiet Corner' })).toBeVisible();
  await expect(page.getByText('ITRF is worked out from them.')).toBeVisible();

  await page.getByRole('button', { name: 'Edit: Horizon mask' }).click();
  const form = page.getByRole('form', { name: 'Horizon mask' });
  await form.getByRole('button', { name: 'Add a corner' }).click();
  await form.getByLabel('Azimuth, row 1').fill('226');
  await form.getByLabel('Elevation, row 1').fill('185');
  await form.getByRole('button', { name: 'Keep mask' }).click();
  await expect(form.getByText('“Elevation” lies between 0 and 90°.')).toBeVisible();
  await form.getByRole('button', { name: 'Make it 18.5' }).click();
  await form.getByRole('button', { name: 'Keep mask' }).click();
  await expect(form).toBeHidden();
  await expect(
    page.getByRole('region', { name: 'Horizon mask' }).getByRole('cell', { name: '18.5' }),
  ).toBeVisible();

  await page.getByRole('button', { name: 'Retire', exact: true }).click();
  await page.getByRole('button', { name: 'Leave it in use' }).click();
  await page.getByRole('button', { name: 'Retire', exact: true }).click();
  await page.getByRole('button', { name: 'Retire Quiet Corner' }).click();
  await expect(page.getByText('cannot be chosen for new ones')).toBeVisible();
  await page.getByRole('button', { name: 'Use again' }).click();
  await page.getByRole('button', { name: 'Retire', exact: true }).click();
  await page.getByRole('button', { name: 'Retire Quiet Corner' }).click();
  await expect(page.getByText('cannot be chosen for new ones')).toBeVisible();
  await page.goto('/stations?show=retired&find=quiet');
  await expect(page.getByRole('link', { name: 'Quiet Corner' }).first()).toBeVisible();
});

test('search and sort stand in the address and come back with it', async ({ pageAs }) => {
  const page = await pageAs('correlator');
  await page.goto('/sources');
  await page.keyboard.press('/');
  await page.keyboard.type('target');
  await expect(page).toHaveURL(/find=target/);
  await page.getByRole('button', { name: 'Flux 22 GHz' }).click();
  await page.getByRole('button', { name: 'Flux 22 GHz' }).click();
  await expect(page).toHaveURL(/sort=-flux-22ghz/);
  const rows = page.getByRole('row');
  await expect(rows.nth(1)).toContainText('J1058+0133');
  await page.reload();
  await expect(rows.nth(1)).toContainText('J1058+0133');
  await expect(page.getByRole('columnheader', { name: /Flux 22 GHz/ })).toHaveAttribute(
    'aria-sort',
    'descending',
  );
  await expect(page.getByRole('link', { name: 'Add a source' })).toBeHidden();
  await page.getByLabel('Find by name or role').fill('nothing like it');
  await expect(page.getByRole('heading', { name: 'No sources match' })).toBeVisible();
  await page.getByRole('button', { name: 'Show all' }).click();
  await expect(page.getByRole('link', { name: 'J0825+0309' })).toBeVisible();
});

test('an operator keeps mask, sensitivity, availability and contacts of the own station', async ({
  pageAs,
}) => {
  const page = await pageAs('operatorAf');
  await page.goto('/stations/Af');
  await expect(page.getByRole('button', { name: /^Edit: / })).toHaveCount(4);
  await page.getByRole('button', { name: 'Edit: Contacts' }).click();
  await page.getByRole('textbox', { name: 'Contacts' }).fill('Control room: +00 555 010 110');
  await page.keyboard.press('Escape');
  await expect(page.getByText('+00 555 010 110')).toBeHidden();
  await page.getByRole('button', { name: 'Edit: Contacts' }).click();
  await page.getByRole('textbox', { name: 'Contacts' }).fill('Control room: +00 555 010 110');
  await page.getByRole('button', { name: 'Keep contacts' }).click();
  await expect(page.getByRole('region', { name: 'Contacts' }).getByText('+00 555 010 110')).toBeVisible();

  await page.goto('/stations/Bm');
  await expect(page.getByRole('heading', { name: 'Bright Moor' })).toBeVisible();
  await expect(page.getByRole('button', { name: /^Edit: / })).toHaveCount(0);
  expect((await page.goto('/stations/new'))?.status()).toBe(403);
  expect((await page.goto('/modes/new'))?.status()).toBe(403);
  expect((await page.goto('/stations/Zz'))?.status()).toBe(404);
});

test('a source is typed in hours, and its slips are said beside the field', async ({ pageAs }, info) => {
  const page = await pageAs('scheduler');
  const name = `T${Date.now()}-${info.workerIndex}`;
  await page.goto('/sources/new');
  await fill(page, {
    Name: name,
    'Right ascension, ICRS': '08 25 60.5',
    'Declination, ICRS': '\u221203 09 24.5',
  });
  await expect(page.getByText('= \u22123.156806°')).toBeVisible();
  await page.getByRole('button', { name: 'Add a band' }).click();
  await page.getByLabel('Band, row 1').fill('22ghz');
  await page.getByLabel('Flux, row 1').fill('0,5');
  await page.getByRole('button', { name: 'Add the source' }).click();
  await expect(page.getByText('“08 25 60.5” has 60.5 seconds of time.')).toBeVisible();
  await page.getByLabel('Right ascension, ICRS').fill('08 25 50.5');
  await page.getByRole('button', { name: 'Add the source' }).click();
  await expect(page.getByRole('heading', { name })).toBeVisible();
  await expect(page.getByRole('row', { name: '22 GHz 0.50 point' })).toBeVisible();
  await page.getByRole('button', { name: 'Retire', exact: true }).click();
  await page.getByRole('button', { name: `Retire ${name}` }).click();
  await expect(page.getByText('cannot be chosen for new ones')).toBeVisible();
});

test('a mode is copied; channels that do not match are refused in a sentence', async ({ pageAs }, info) => {
  const page = await pageAs('scheduler');
  const name = `Copy ${Date.now()}-${info.workerIndex}`;
  await page.goto('/modes?find=22+ghz');
  await page.getByRole('link', { name: /^22 GHz, 2/ }).click();
  await expect(page.getByText('± 1.000 µs')).toBeVisible();
  await page.getByRole('link', { name: 'Copy mode' }).click();
  await page.getByLabel('Name', { exact: true }).fill(name);
  await page.getByLabel('Polarisation, row 4').selectOption('X');
  await page.getByRole('button', { name: 'Add the mode' }).click();
  await expect(page.getByText('Use R and L, or X and Y, in all channels of a mode.')).toBeVisible();
  await page.getByLabel('Polarisation, row 4').selectOption('L');
  await page.getByRole('button', { name: 'Take row 4 away' }).click();
  await page.getByRole('button', { name: 'Add the mode' }).click();
  await expect(page.getByText('The polarisations have 2 in R, 1 in L.')).toBeVisible();
  await page.getByRole('button', { name: 'Take row 3 away' }).click();
  await expect(page.getByText('2 channels of 64 million samples a second each: 256 Mb/s.')).toBeVisible();
  await page.getByRole('button', { name: 'Add the mode' }).click();
  await expect(page.getByRole('heading', { name })).toBeVisible();
  await page.getByRole('button', { name: 'Retire', exact: true }).click();
  await page.getByRole('button', { name: `Retire ${name}` }).click();
  await expect(page.getByText('cannot be chosen for new ones')).toBeVisible();
});

for (const theme of THEMES) {
  test(`what a catalogue’s form refuses is accessible by ${theme}`, async ({ pageAs, baseURL }) => {
    const page = await pageAs('scheduler');
    await setThemeCookie(page, theme, baseURL ?? '');
    await page.goto('/stations/Em');
    await page.getByRole('button', { name: 'Edit: Sensitivity by band' }).click();
    await page.getByLabel('SEFD, row 1').fill('none');
    await page.getByRole('button', { name: 'Keep sensitivity' }).click();
    await expect(page.getByText('“none” is no number.')).toBeVisible();
    await expectAccessible(page);
    await page.goto('/modes');
    await page.getByRole('link', { name: /^22 GHz, 2/ }).click();
    await expect(page.getByRole('heading', { name: 'Channels' })).toBeVisible();
    await expectAccessible(page);
    await page.goto('/sources');
    await page.getByRole('link', { name: 'J0825+0309' }).click();
    await expect(page.getByRole('heading', { name: 'Flux and size by band' })).toBeVisible();
    await expectAccessible(page);
  });
}

test('a mask is taken from a file after a look, dragged, and left as it was; paths are drawn over it', async ({
  pageAs,
}) => {
  const page = await pageAs('admin');
  await page.goto('/stations/Dp');
  await page.getByLabel('Path of', { exact: true }).selectOption({ label: 'J0827+5217' });
  await page.getByRole('button', { name: 'Draw' }).click();
  await expect(page.getByRole('button', { name: 'Take the path of J0827+5217 away' })).toBeVisible();

  await page.getByRole('button', { name: 'Edit: Horizon mask' }).click();
  const form = page.getByRole('form', { name: 'Horizon mask' });
  const upload = (name: string, text: string) =>
    form
      .getByLabel('A file with two columns')
      .setInputFiles({ name, mimeType: 'text/plain', buffer: Buffer.from(text) });
  await upload('empty.txt', '# nothing yet\n');
  await expect(form.getByRole('alert')).toHaveText(/“empty.txt” holds no corner/);
  await upload('mask.txt', 'az el\n90 30\n0 30\n180 30\n200 high\n');
  const dialog = page.getByRole('dialog', { name: 'The mask in mask.txt' });
  await expect(dialog.getByText('3 corners in place of the 5 that stand now.')).toBeVisible();
  await expect(dialog.getByText('Line 5, “200 high”: “high” is no elevation.')).toBeVisible();
  await page.keyboard.press('Escape');
  await expect(dialog).toHaveCount(0);
  await expect(form.getByLabel('Azimuth, row 5')).toHaveValue('316');

  await upload('mask.txt', 'az el\n90 30\n0 30\n180 30\n');
  await dialog.getByRole('button', { name: 'Take 3 corners' }).click();
  await expect(form.getByLabel('Azimuth, row 2')).toHaveValue('90');
  await expect(form.getByLabel('Azimuth, row 4')).toHaveCount(0);
  // the corner in the east, a third of the way in, is dragged half way to the middle
  const drawing = form.locator('svg.mask-drawing');
  const box = await drawing.boundingBox();
  if (!box) throw new Error('no drawing');
  const [x, y, rim] = [box.x + box.width / 2, box.y + box.height / 2, (97 / 232) * box.width];
  await page.mouse.move(x + rim / 3, y);
  await page.mouse.down();
  await page.mouse.move(x + rim / 2, y, { steps: 4 });
  await page.mouse.up();
  await expect(form.getByLabel('Elevation, row 2')).toHaveValue('22.5');
  await form.getByRole('button', { name: 'Leave as it was' }).click();
  await expect(page.getByText('5 corners, straight lines between them')).toBeVisible();
});
