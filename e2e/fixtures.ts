import AxeBuilder from '@axe-core/playwright';
import { existsSync, mkdirSync } from 'node:fs';
import path from 'node:path';
import { test as base, expect, type Browser, type Page } from '@playwright/test';
import { DEMO_PASSWORD } from '../db/seed-data/accounts';
import { emailOf, type Visitor } from '../scripts/pages';

export const PASSWORD = DEMO_PASSWORD;

type Person = Visitor;
export { emailOf };

export async function signIn(page: Page, email: string, password = PASSWORD): Promise<void> {
  await page.getByLabel('E-mail').fill(email);
  await page.getByRole('textbox', { name: 'Password' }).fill(password);
  await page.getByRole('button', { name: 'Sign in', exact: true }).click();
}

type WorkerFixtures = {
  /** the file of a signed-in state; each worker signs a person in once */
  stateOf: (person: Person) => Promise<string>;
};

type TestFixtures = {
  /** a page with the person signed in */
  pageAs: (person: Person) => Promise<Page>;
};

export const test = base.extend<TestFixtures, WorkerFixtures>({
  stateOf: [
    async ({ browser }, provide, worker) => {
      const folder = path.join(worker.project.outputDir, 'signed-in', String(worker.workerIndex));
      await provide(async (person) => {
        const file = path.join(folder, `${person}.json`);
        if (!existsSync(file))
          await saveState(browser, { person, file, baseURL: worker.project.use.baseURL });
        return file;
      });
    },
    { scope: 'worker' },
  ],
  pageAs: async ({ browser, stateOf, baseURL, viewport }, provide) => {
    const opened: Page[] = [];
    await provide(async (person) => {
      const storageState = await stateOf(person);
      const context = await browser.newContext({ storageState, baseURL, viewport });
      const page = await context.newPage();
      opened.push(page);
      return page;
    });
    await Promise.all(opened.map((page) => page.context().close()));
  },
});

type Saving = { person: Person; file: string; baseURL: string | undefined };

async function saveState(browser: Browser, { person, file, baseURL }: Saving): Promise<void> {
  mkdirSync(path.dirname(file), { recursive: true });
  const context = await browser.newContext({ baseURL });
  const page = await context.newPage();
  await page.goto('/sign-in');
  await signIn(page, emailOf(person));
  await page.waitForURL((url) => !url.pathname.startsWith('/sign-in'));
  await expect(page.getByRole('timer', { name: 'UT' })).toBeVisible();
  await context.storageState({ path: file });
  await context.close();
}

export const THEMES = ['day', 'night'] as const;

export async function setThemeCookie(
  page: Page,
  theme: (typeof THEMES)[number],
  baseURL: string,
): Promise<void> {
  await page.context().addCookies([{ name: 'antiphon_theme', value: theme, url: baseURL }]);
}

/** Nothing that axe finds against WCAG 2.2 A and AA; or of contrast alone, where only the colours are others. */
export async function expectAccessible(page: Page, of: 'all' | 'contrast' = 'all'): Promise<void> {
  const builder = new AxeBuilder({ page });
  const { violations } = await (
    of === 'contrast'
      ? builder.withRules(['color-contrast'])
      : builder.withTags(['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'])
  ).analyze();
  const said = violations.map(
    ({ id, help, nodes }) => `${id}: ${help}\n  ${nodes.map((n) => n.html).join('\n  ')}`,
  );
  expect(said, said.join('\n')).toEqual([]);
}

export { expect };
