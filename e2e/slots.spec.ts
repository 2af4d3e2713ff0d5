import type { Page } from '@playwright/test';
import { expect, expectAccessible, setThemeCookie, test, THEMES } from './fixtures';
import { addScan, DAY_50, makeOwnSession } from './own-session';

/** A session of its own, from its first scan to an answer that is asked again: the steps follow each other. */
test.describe.configure({ mode: 'serial' });

let code = '';
const HOUR = 3_600_000;

const offerAnew = async (page: Page, button: string) => {
  await page.getByRole('button', { name: button }).click();
  const dialog = page.getByRole('dialog');
  if (await dialog.getByRole('checkbox').isVisible()) await dialog.getByRole('checkbox').check();
  return dialog;
};

test('nothing is offered before there is a scan, and nobody at a station sees the plan', async ({
  pageAs,
}, info) => {
  code = `SLT-${100 + info.workerIndex}`;
  const page = await pageAs('scheduler');
  await makeOwnSession(page, code, 'Two antennas');

  await page.goto(`/sessions/${code}/slots`);
  await expect(page.getByRole('heading', { name: 'Nothing is offered yet' })).toBeVisible();
  await expect(page.getByRole('button', { name: `Offer ${code} to its stations` })).toBeDisabled();
  await addScan(page, code, DAY_50 + 22 * HOUR);
  await page.reload();
  await expect(page.getByRole('button', { name: `Offer ${code} to its stations` })).toBeEnabled();

  const operator = await pageAs('operatorAf');
  await operator.goto('/slots');
  await expect(operator.getByRole('heading', { name: 'Slots', exact: true })).toBeVisible();
  await expect(operator.getByText(code)).toHaveCount(0);
});

test('an offer gives each station its hours in UT and in its time, and its operators a message', async ({
  pageAs,
}) => {
  const page = await pageAs('scheduler');
  await page.goto(`/sessions/${code}/slots`);
  const dialog = await offerAnew(page, `Offer ${code} to its stations`);
  await dialog.getByLabel('Answer by, UT').fill('soon');
  await dialog.getByRole('button', { name: /^Offer/ }).click();
  await expect(dialog.getByLabel('Answer by, UT')).toHaveAccessibleDescription(/“soon” is no time/);
  await dialog.getByLabel('Answer by, UT').fill('045 12:00');
  await dialog.getByRole('button', { name: /^Offer/ }).click();
  await expect(page.getByText('Offer 1 is out: 2 messages sent.')).toBeVisible();
  await page.getByRole('button', { name: 'Arrow Fell: not answered, 21:45 to 22:20 UT' }).click();
  const side = page.getByRole('complementary', { name: 'Chosen station' });
  await expect(side.getByText('2027-02-19 (050) 21:45:00 UT')).toBeVisible();
  await expect(side.getByText('22:45 CET, Europe/Berlin')).toBeVisible();
  await expect(side.getByText('23:20 CET, Europe/Berlin')).toBeVisible();

  const admin = await pageAs('admin');
  await admin.goto('/mail');
  await admin.getByRole('button', { name: new RegExp(`${code} offer 1: can Af observe\\?`) }).click();
  await expect(admin.getByRole('heading', { name: `${code} offer 1: can Af observe?` })).toBeVisible();
  await expect(
    admin.frameLocator('iframe').getByRole('link', { name: 'Answer for the slot' }),
  ).toHaveAttribute('href', new RegExp(`/sessions/${code}/slots$`));
});

test('an operator comes by the list, sees what declining costs, says why, and thinks better of it', async ({
  pageAs,
}) => {
  const page = await pageAs('operatorAf');
  await page.goto('/slots');
  await page.getByRole('link', { name: `Answer: Arrow Fell in ${code}` }).click();
  const form = page.getByRole('form', { name: 'Your answer' });
  await form.getByRole('button', { name: 'Decline' }).click();
  await expect(form.getByText('Hits all 1 scan of Af')).toBeVisible();
  await form.getByRole('button', { name: 'Decline the whole slot' }).click();
  await expect(form.getByLabel('Why, in a few words')).toHaveAccessibleDescription(/Say why/);
  await form.getByRole('button', { name: 'Receiver' }).click();
  await form.getByLabel('Why, in a few words').fill('warming up');
  await form.getByRole('button', { name: 'Decline the whole slot' }).click();
  await expect(page.getByText('Sent: Af declined.')).toBeVisible();
  const said = page.getByRole('region', { name: 'What was said' });
  await expect(said.getByText(/Declined, offer 1, by an operator\. “Receiver: warming up”/)).toBeVisible();

  await form.getByRole('button', { name: 'Confirm' }).click();
  await expect(
    form.getByText(/^Af observes 2027-02-19 \(050\) 21:45:00 UT .*: its one scan\.$/),
  ).toBeVisible();
  await form.getByRole('button', { name: 'Confirm the slot' }).click();
  await expect(page.getByText('Sent: Af confirmed.')).toBeVisible();
  await expect(said.getByRole('listitem')).toHaveCount(2);
  await expect(page.getByRole('button', { name: /^Arrow Fell: confirmed/ })).toBeVisible();
  await page.getByRole('button', { name: /^Fallow Ness: not answered/ }).click();
  await expect(page.getByText('The operators of Fallow Ness answer for it')).toBeVisible();
  await expect(form).toBeHidden();
});

test('a scheduler answers for a station in part, and that is marked', async ({ pageAs }) => {
  const page = await pageAs('scheduler');
  await page.goto(`/sessions/${code}/slots?station=Fn`);
  const form = page.getByRole('form', { name: 'Answer for Fn' });
  await form.getByRole('button', { name: 'In part' }).click();
  await form.getByLabel('Cannot from, UT').fill('22:05');
  await form.getByLabel('until, UT').fill('23:30');
  await expect(form.getByRole('row', { name: /J0827\+5217 5 min of 10 min/ })).toBeVisible();
  await expect(form.getByText('Fn observes 21:45 to 22:05 UT: 20 min of 35 min.')).toBeVisible();
  await form.getByRole('button', { name: 'Power' }).click();
  await form.getByRole('button', { name: 'Send: in part' }).click();
  const row = page.getByRole('button', { name: /^Fallow Ness: partly/ });
  await expect(row.getByText(/on behalf/)).toBeVisible();
  await expect(row.getByText('“Power”')).toBeVisible();
});

test('a plan that leaves the hours of a yes asks again, and tells the others', async ({ pageAs }) => {
  const page = await pageAs('scheduler');
  await page.goto(`/sessions/${code}/slots`);
  await addScan(page, code, DAY_50 + 23 * HOUR);
  await expect(page.getByText('the draft has moved on since')).toBeVisible({ timeout: 15_000 });
  const operator = await pageAs('operatorAf');
  await operator.goto(`/sessions/${code}/slots`);
  await expect(
    operator.getByRole('button', { name: /^Arrow Fell: confirmed, 21:45 to 22:20/ }),
  ).toBeVisible();
  await expect(operator.getByText('the draft has moved on since')).toHaveCount(0);

  const dialog = await offerAnew(page, 'Publish');
  await dialog.getByRole('button', { name: /^Publish/ }).click();
  await expect(page.getByText('Version 2 is out: 2 messages sent.')).toBeVisible();
  await expect(page.getByRole('button', { name: /^Arrow Fell: ask again, 21:45 to 23:20/ })).toBeVisible();
  await expect(operator.getByRole('button', { name: /^Arrow Fell: ask again, 21:45 to 23:20/ })).toBeVisible({
    timeout: 15_000,
  });
  await expect(operator.getByText(/Af is asked again\./)).toBeVisible();
});

const LOOKS = [
  // its page stands in a frame without scripts, where axe cannot go: the text is looked at
  ['the mailbox', 'admin', () => '/mail', 'Plain text'],
] as const;

for (const theme of THEMES) {
  for (const [what, person, address, button] of LOOKS) {
    test(`${what} is accessible by ${theme}, and fits a phone`, async ({ pageAs, baseURL }) => {
      const page = await pageAs(person);
      await setThemeCookie(page, theme, baseURL ?? '');
      await page.goto(address());
      if (button) await page.getByRole('button', { name: button }).click();
      await expect(page.getByRole('main')).toBeVisible();
      await expectAccessible(page);
      await page.setViewportSize({ width: 390, height: 844 });
      const width = await page.evaluate(() => document.documentElement.scrollWidth);
      expect(width).toBeLessThanOrEqual(390);
    });
  }
}
