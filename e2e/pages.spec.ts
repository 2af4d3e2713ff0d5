import { expect, expectAccessible, setThemeCookie, test, THEMES, type Person } from './fixtures';

/** Pages that no other walk looks at by axe, each by one who works there. */
const PAGES: readonly (readonly [address: string, person: Person, heading: RegExp])[] = [
  ['/clocks', 'correlator', /^Clocks$/],
  ['/stations/Bm/clock', 'operatorBm', /^Clock reading$/],
  ['/stations/Bm/desk', 'operatorBm', /^(Next|Now): scan/],
  ['/sessions/ARC-029/slots', 'scheduler', /^Version 2,/],
  ['/sessions/ARC-029/settings', 'scheduler', /^ARC-029/],
  ['/sessions/ARC-029/comments', 'operatorAf', /^Comments$/],
  ['/sessions/new', 'scheduler', /^New session$/],
];

for (const theme of THEMES) {
  for (const [address, person, heading] of PAGES) {
    test(`${address} is accessible by ${theme}`, async ({ pageAs, baseURL }) => {
      const page = await pageAs(person);
      await setThemeCookie(page, theme, baseURL ?? '');
      await page.goto(address);
      await expect(page.getByRole('heading', { name: heading }).first()).toBeVisible();
      await expectAccessible(page);
    });
  }
}

test('on a phone none of them is wider than the screen', async ({ pageAs }) => {
  for (const [address, person, heading] of PAGES) {
    const page = await pageAs(person);
    await page.setViewportSize({ width: 390, height: 844 });
    await page.goto(address);
    await expect(page.getByRole('heading', { name: heading }).first()).toBeVisible();
    const width = await page.evaluate(() => document.documentElement.scrollWidth);
    expect(width, address).toBeLessThanOrEqual(390);
  }
});
