import { expect, test } from './fixtures';

/** One session from its form to its coverage, by all who have a part in it; the steps follow each other. */
test.describe.configure({ mode: 'serial' });

const CODE = 'ARC-030';

test('a scheduler makes a session, mends what was typed wrong, and finds it as a draft', async ({
  pageAs,
}) => {
  const page = await pageAs('scheduler');
  await page.goto('/sessions');
  await page.getByRole('link', { name: 'New session' }).click();
  await page.getByRole('button', { name: 'Make the session' }).click();
  await expect(page.getByText(/fields need another look\. Nothing is kept yet\./)).toBeVisible();
  await expect(page.getByLabel('Code')).toHaveAccessibleDescription(/“Code” is empty/);
  await expect(page.getByText('Choose at least one station.')).toBeVisible();

  await page.getByLabel('Code').fill('wlk-001');
  await page.getByLabel('Title').fill('A walk');
  await page.getByLabel('Start, UT').fill('next week');
  await page.getByLabel('Length').fill('12 h');
  await page.getByRole('checkbox', { name: /^Af/ }).check();
  await page.getByRole('checkbox', { name: /^Bm/ }).check();
  await page.getByLabel('Add a source by name').fill('J0827+5217');
  await page.getByRole('button', { name: 'Add the source' }).click();
  await page.getByLabel('Scans wanted of J0827+5217').fill('3');
  await page.getByLabel('Mode that new scans').selectOption({ index: 1 });
  await page.getByLabel('Fair from SNR').fill('50');
  await page.getByRole('button', { name: 'Make the session' }).click();
  await expect(page.getByLabel('Start, UT')).toHaveAccessibleDescription(/“next week” is no time/);
  await expect(page.getByLabel('Title')).toHaveValue('A walk');
  await page.getByLabel('Start, UT').fill('2027-050 18:00');
  await page.getByRole('button', { name: 'Make the session' }).click();
  await expect(page.getByLabel('Strong from SNR')).toHaveAccessibleDescription(/Strong begins above fair/);
  await page.getByLabel('Fair from SNR').fill('10');
  await page.getByRole('button', { name: 'Make the session' }).click();

  await expect(page).toHaveURL(/\/sessions\/WLK-001\/timeline$/);
  await expect(page.getByText(/WLK-001 · draft · 12 h from 2027 day 050, 18:00 UT/)).toBeVisible();
  await page.goto('/sessions');
  await expect(page.getByRole('row', { name: /A walk/ }).getByText('none yet')).toBeVisible();
});

test('the scheduler offers the plan; an open problem and a time that has passed are named first', async ({
  pageAs,
}) => {
  const page = await pageAs('scheduler');
  await page.goto(`/sessions/${CODE}/slots`);
  await expect(page.getByRole('heading', { name: /^Version 2,/ })).toBeVisible();
  await page.getByRole('button', { name: 'Offer the plan anew' }).click();
  const dialog = page.getByRole('dialog');
  await expect(dialog.getByText(/problems must be fixed/)).toBeVisible();
  const offer = dialog.getByRole('button', { name: /^Offer with \d+ problems$/ });
  await expect(offer).toBeDisabled();
  await dialog.getByRole('checkbox').check();
  await dialog.getByLabel('Answer by, UT').fill('040 12:00');
  await offer.click();
  await expect(dialog.getByLabel('Answer by, UT')).toHaveAccessibleDescription(/has passed/);
  await dialog.getByLabel('Answer by, UT').fill('042 12:00');
  await dialog.getByLabel('A note to the stations').fill('Third offer.');
  await offer.click();
  await expect(page.getByText('Offer 3 is out: 6 messages sent.')).toBeVisible();
  await expect(page.getByRole('heading', { name: /^Offer 3,/ })).toBeVisible();

  const admin = await pageAs('admin');
  await admin.goto('/mail');
  await admin.getByRole('button', { name: /ARC-030 offer 3: can Bm observe\?/ }).click();
  await admin.getByRole('button', { name: 'Plain text' }).click();
  await expect(admin.getByText(/Third offer\.[\s\S]*Answer by 2027-02-11 \(042\) 12:00:00 UT/)).toBeVisible();
});

test('an operator answers in part after what was missing is said, and the scheduler sees it at once', async ({
  pageAs,
}) => {
  const scheduler = await pageAs('scheduler');
  await scheduler.goto(`/sessions/${CODE}/slots`);
  const row = scheduler.getByRole('button', { name: /^Bright Moor: / });
  await expect(row).toHaveAccessibleName(/not answered/);

  const page = await pageAs('operatorBm');
  await page.goto('/');
  await expect(page).toHaveURL(/\/stations\/Bm\/desk$/);
  await page.getByRole('link', { name: 'Answer for the slot' }).click();
  const form = page.getByRole('form', { name: 'Your answer' });
  await form.getByRole('button', { name: 'Send the answer' }).click();
  await expect(form.getByText('Choose one of the three.')).toBeVisible();
  await form.getByRole('button', { name: 'In part' }).click();
  await form.getByLabel('Cannot from, UT').fill('half past');
  await form.getByLabel('until, UT').fill('23:50');
  await form.getByRole('button', { name: 'Send: in part' }).click();
  await expect(form.getByLabel('Cannot from, UT')).toHaveAccessibleDescription(/“half past” is no time/);
  await expect(form.getByLabel('Why')).toHaveAccessibleDescription(/Say why/);
  await form.getByLabel('Cannot from, UT').fill('23:00');
  await form.getByLabel('Why').fill('receiver warm-up');
  await expect(form.getByText(/^Hits \d+ of 73 scans$|^Hits \d+ of \d+ scans$/)).toBeVisible();
  await expect(form.getByText(/Bm observes \d\d:\d\d to 23:00 and 23:50 to \d\d:\d\d UT/)).toBeVisible();
  await form.getByRole('button', { name: 'Send: in part' }).click();
  await expect(page.getByText('Sent: Bm in part.')).toBeVisible();

  await expect(row).toHaveAccessibleName(/partly/, { timeout: 15_000 });
  await scheduler.goto('/sessions');
  const listed = scheduler.getByRole('row', { name: /North arc, 22 GHz, second epoch/ });
  await expect(listed.getByTitle('Bright Moor: partly')).toBeVisible();
  await scheduler.goto(`/sessions/${CODE}/timeline`);
  await expect(scheduler.getByText(/receiver warm-up/).first()).toBeVisible();
});

test('another operator reports the clock: no sign, a word for it, and the sentence says it back', async ({
  pageAs,
}) => {
  const page = await pageAs('operatorAf');
  await page.goto('/stations/Af/clock');
  const form = page.getByRole('form', { name: 'Clock reading' });
  const early = form.getByRole('button', { name: /^Early/ });
  await expect(early).toHaveAttribute('aria-pressed', 'false');
  await expect(form.getByRole('button', { name: /^Late/ })).toHaveAttribute('aria-pressed', 'false');
  await form.getByRole('button', { name: 'Send the reading' }).click();
  await expect(form.getByText('Which tick came first? Choose Early or Late.')).toBeVisible();

  await early.click();
  await form.getByLabel('By how much?').fill('-3.2');
  await expect(form.getByText('Type the size without a sign. Which tick came first?')).toBeVisible();
  await expect(early).toHaveAttribute('aria-pressed', 'false');
  await expect(form.getByText('Expected from the fit')).toBeHidden();

  await form.getByRole('button', { name: /^Late/ }).click();
  await form.getByLabel('By how much?').fill('3.208');
  await expect(form.getByText('Af clock is LATE by 3.208 µs.')).toBeVisible();
  await expect(form.getByText('Expected from the fit')).toBeVisible();
  await form
    .getByRole('group', { name: 'Formatter second checked' })
    .getByRole('button', { name: 'Yes' })
    .click();
  await form.getByRole('button', { name: 'Send the reading' }).click();
  await expect(form.getByRole('alert').filter({ hasText: 'Is it the other tick?' })).toBeVisible();
  await form.getByRole('button', { name: /^It is EARLY by 3\.208 µs$/ }).click();
  await expect(page.getByText('Stored: Af clock is EARLY by 3.208 µs.')).toBeVisible();
  await expect(page.getByRole('row', { name: /\+3\.208 early/ })).toBeVisible();
});

test('at the desk a scan that was lost asks for a reason, and one that was good takes one tap', async ({
  pageAs,
}) => {
  const page = await pageAs('operatorAf');
  await page.goto('/stations/Af/desk');
  await expect(page.getByRole('heading', { name: /^(Next|Now): scan \d+, J/ })).toBeVisible();
  const asked = page.getByRole('heading', { name: /^Scan \d+ ended .* How did it go\?$/ });
  const number = /Scan (\d+)/.exec(await asked.innerText())?.[1] ?? '';
  await page.getByRole('button', { name: 'Lost', exact: true }).click();
  await page.getByRole('button', { name: `Say scan ${number} was lost` }).click();
  await expect(page.getByText('Choose one reason of the eight.')).toBeVisible();
  await page.getByRole('radio', { name: 'Wind or stow' }).check();
  await page.getByRole('button', { name: `Say scan ${number} was lost` }).click();
  const row = page.getByRole('button', { name: `Scan ${number}: lost, amend` });
  await expect(row).toBeVisible();

  await row.click();
  await page.getByRole('button', { name: 'Good', exact: true }).click();
  await expect(page.getByText(`Scan ${number} was good.`)).toBeVisible();
  await page.getByRole('button', { name: 'Undo' }).click();
  await expect(row).toBeVisible();
});

test('correlator staff see which baselines will show fringes, and where the clocks put them', async ({
  pageAs,
}) => {
  const page = await pageAs('correlator');
  await page.goto(`/sessions/${CODE}/fringes`);
  await expect(page.getByText(/baselines in scans should show fringes/)).toBeVisible();
  await expect(page.getByRole('gridcell', { name: /decl\./ }).first()).toBeVisible();
  await page
    .getByRole('gridcell', { name: /Em–Fn.*strong|strong, SNR/ })
    .first()
    .click();
  const panel = page.getByRole('complementary', { name: 'Chosen cell' });
  await expect(panel.getByText(/The fringe lies inside the search window of ±1\.00 µs\./)).toBeVisible();
});

test('the investigator reads the coverage of the session, and has no part in its settings', async ({
  pageAs,
}) => {
  const page = await pageAs('investigator');
  await page.goto(`/sessions/${CODE}/coverage?source=J0827%2B5217`);
  await expect(page.getByRole('heading', { name: /J0827\+5217/ }).first()).toBeVisible();
  await expect(page.getByText(/Longest/).first()).toBeVisible();
  const settings = await page.goto(`/sessions/${CODE}/settings`);
  expect(settings?.status()).toBe(403);
  await expect(page.getByText('An administrator can give the right.')).toBeVisible();
  const other = await page.goto('/sessions/WLK-001/timeline');
  expect(other?.status()).toBe(404);
});

test('what is another’s is not found, and what is not for the role says who can give it', async ({
  pageAs,
}) => {
  const operator = await pageAs('operatorAf');
  for (const address of ['/stations/Bm/clock', '/stations/Bm/desk', '/sessions/WLK-404/slots'])
    expect((await operator.goto(address))?.status(), address).toBe(404);
  for (const address of ['/sessions/new', '/mail', `/sessions/${CODE}/settings`])
    expect((await operator.goto(address))?.status(), address).toBe(403);
  const correlator = await pageAs('correlator');
  expect((await correlator.goto('/stations/Af/desk'))?.status()).toBe(403);
  await expect(correlator.getByText('An administrator can give the right.')).toBeVisible();
});
