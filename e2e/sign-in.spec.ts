import {
  emailOf,
  expect,
  expectAccessible,
  PASSWORD,
  setThemeCookie,
  signIn,
  test,
  THEMES,
} from './fixtures';

const DRAFT = '/sessions/ARC-031/timeline';

test('a wrong password says so, keeps the e-mail and takes the focus to the sentence', async ({ page }) => {
  await page.goto('/sign-in');
  await signIn(page, 'nobody@antiphon.example', 'not the password');
  const problem = page.getByRole('alert').filter({ hasText: 'That e-mail and password do not match.' });
  await expect(problem).toBeVisible();
  await expect(problem).toBeFocused();
  await expect(page.getByLabel('E-mail')).toHaveValue('nobody@antiphon.example');
  await expect(page.getByRole('textbox', { name: 'Password' })).toHaveValue('');
});

test('what is missing is said beside its field', async ({ page }) => {
  await page.goto('/sign-in');
  await page.getByRole('button', { name: 'Sign in', exact: true }).click();
  await expect(page.getByLabel('E-mail')).toHaveAccessibleDescription('Enter your e-mail.');
  await expect(page.getByRole('textbox', { name: 'Password' })).toHaveAccessibleDescription(
    'Enter your password.',
  );
});

test('the password can be shown and hidden again', async ({ page }) => {
  await page.goto('/sign-in');
  const password = page.getByRole('textbox', { name: 'Password' });
  await password.fill('seen by me');
  const show = page.getByRole('button', { name: 'Show password' });
  await expect(password).toHaveAttribute('type', 'password');
  await show.click();
  await expect(password).toHaveAttribute('type', 'text');
  await show.click();
  await expect(password).toHaveAttribute('type', 'password');
});

test('a demo account fills the form', async ({ page }) => {
  await page.goto('/sign-in');
  const email = emailOf('operatorBm');
  await page.getByRole('button', { name: `Operator Bm ${email}` }).click();
  await expect(page.getByLabel('E-mail')).toHaveValue(email);
  await expect(page.getByRole('textbox', { name: 'Password' })).toHaveValue(PASSWORD);
});

test('sign-in leads back to where one was going, and sign-out ends it', async ({ page }) => {
  await page.goto('/sessions?find=ARC-031');
  await expect(page).toHaveURL(/\/sign-in\?next=/);
  await signIn(page, emailOf('admin'));
  await expect(page).toHaveURL(/\/sessions\?find=ARC-031$/);
  await expect(page.getByRole('searchbox', { name: 'Find by code, title or station' })).toHaveValue(
    'ARC-031',
  );

  const role = page.getByRole('button', { name: 'Administrator' });
  await role.press('Enter');
  const account = page.getByRole('dialog', { name: 'Account' });
  await expect(account).toBeVisible();
  await page.keyboard.press('Escape');
  await expect(account).toBeHidden();
  await expect(role).toBeFocused();
  await role.press('Enter');
  await account.getByRole('button', { name: 'Sign out' }).click();
  await expect(page).toHaveURL(/\/sign-in$/);
  await page.goto('/sessions');
  await expect(page).toHaveURL(/\/sign-in\?next=%2Fsessions$/);
});

test('a way back to another site is not taken', async ({ page }) => {
  await page.goto('/sign-in?next=//elsewhere.example/');
  await signIn(page, emailOf('scheduler'));
  await expect(page).toHaveURL(/\/sessions$/);
});

test('a session that is not there answers 404 and names it', async ({ pageAs }) => {
  const page = await pageAs('scheduler');
  const response = await page.goto('/sessions/ARC-951/timeline');
  expect(response?.status()).toBe(404);
  await expect(page.getByRole('heading', { name: 'There is no session ARC-951' })).toBeVisible();
  await page.getByRole('link', { name: 'Find ARC-951' }).click();
  await expect(page.getByRole('heading', { name: 'No sessions match' })).toBeVisible();
  await page.getByRole('button', { name: /^Show all/ }).click();
  await expect(page.getByRole('link', { name: 'North arc, 22 GHz' }).first()).toBeVisible();
});

test('a draft’s timeline answers an operator 403 and says who can give the right', async ({ pageAs }) => {
  const page = await pageAs('operatorAf');
  await page.goto('/sessions');
  await expect(page.getByRole('link', { name: 'North arc, 22 GHz', exact: true })).toHaveAttribute(
    'href',
    '/sessions/ARC-031/slots',
  );
  const response = await page.goto(DRAFT);
  expect(response?.status()).toBe(403);
  await expect(page.getByRole('heading', { name: /^Draft plans are read by schedulers/ })).toBeVisible();
  await expect(page.getByText('Operator Af')).toBeVisible();
  await expect(page.getByText('An administrator can give the right.')).toBeVisible();
});

test('the theme switch names the other theme and is remembered', async ({ pageAs, baseURL }) => {
  const page = await pageAs('investigator');
  await setThemeCookie(page, 'day', baseURL ?? '');
  await page.goto('/sessions');
  await page.getByRole('button', { name: 'Night' }).click();
  await expect(page.locator('html')).toHaveAttribute('data-theme', 'night');
  await expect(page.getByRole('button', { name: 'Day' })).toBeVisible();
  await expect(async () => {
    const cookies = await page.context().cookies();
    expect(cookies.find(({ name }) => name === 'antiphon_theme')?.value).toBe('night');
  }).toPass();
  await page.reload();
  await expect(page.locator('html')).toHaveAttribute('data-theme', 'night');
});

test('UT ticks', async ({ pageAs }) => {
  const page = await pageAs('scheduler');
  await page.goto('/sessions');
  const clock = page.getByRole('timer', { name: 'UT' });
  const before = await clock.innerText();
  expect(before).toMatch(/^\d\d:\d\d:\d\d\s+UT · day \d{3}$/);
  await expect(clock).not.toHaveText(before);
});

for (const theme of THEMES) {
  test(`sign-in and sessions are accessible by ${theme}`, async ({ page, pageAs, baseURL }) => {
    await setThemeCookie(page, theme, baseURL ?? '');
    await page.goto('/sign-in');
    await expect(page.getByRole('heading', { name: 'Antiphon' })).toBeVisible();
    await expectAccessible(page);

    const signedIn = await pageAs('scheduler');
    await setThemeCookie(signedIn, theme, baseURL ?? '');
    await signedIn.goto('/sessions');
    await expect(signedIn.getByRole('table')).toBeVisible();
    await expectAccessible(signedIn);
    await signedIn.getByRole('button', { name: 'Scheduler' }).click();
    await expectAccessible(signedIn);
  });
}

test('on a phone nothing runs out of the screen', async ({ pageAs }) => {
  const page = await pageAs('scheduler');
  await page.setViewportSize({ width: 390, height: 844 });
  for (const address of [
    '/sessions',
    '/sessions/ARC-951/timeline',
    '/sessions/ARC-031/timeline',
    '/sessions/ARC-031/fringes',
  ]) {
    await page.goto(address);
    await expect(page.getByRole('main')).toBeVisible();
    const overflow = await page.evaluate(() => document.documentElement.scrollWidth - window.innerWidth);
    expect(overflow).toBeLessThanOrEqual(0);
  }
});
