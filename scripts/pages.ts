import type { Page } from '@playwright/test';
import { ACCOUNTS } from '../db/seed-data/accounts';

export type Visitor = 'admin' | 'scheduler' | 'operatorAf' | 'operatorBm' | 'correlator' | 'investigator';

export type ShownPage = {
  /** of its picture and in reports */
  name: string;
  /** who works there; null before anyone is signed in */
  by: Visitor | null;
  address: string;
  /** a heading by which the page is known to have come */
  heading: RegExp;
  status?: number;
  /** what is done on it before it is looked at */
  act?: (page: Page) => Promise<void>;
  /** done once, by who can, before the page is shown */
  before?: { by: Visitor; address: string; act: (page: Page) => Promise<void> };
  /** as it is printed */
  isPrinted?: boolean;
};

const ROLES: Readonly<Record<Visitor, { role: string; stationCode?: string }>> = {
  admin: { role: 'admin' },
  scheduler: { role: 'scheduler' },
  operatorAf: { role: 'operator', stationCode: 'Af' },
  operatorBm: { role: 'operator', stationCode: 'Bm' },
  correlator: { role: 'correlator' },
  investigator: { role: 'investigator' },
};

/** The demo's account of a visitor. */
export function emailOf(visitor: Visitor): string {
  const { role, stationCode } = ROLES[visitor];
  const account = ACCOUNTS.find((entry) => entry.role === role && entry.stationCode === stationCode);
  if (!account) throw new Error(`the demo has no ${visitor}`);
  return account.email;
}

const press = (name: string | RegExp) => (page: Page) => page.getByRole('button', { name }).first().click();

const drawn = async (page: Page) => {
  await page.locator('[data-ready]').waitFor();
};

const chooseScan = async (page: Page) => {
  await drawn(page);
  await page.getByRole('grid', { name: /^Timeline/ }).focus();
  for (let step = 0; step < 4; step += 1) await page.keyboard.press('ArrowRight');
  await page.getByRole('complementary', { name: 'Chosen scan' }).getByRole('heading', { level: 1 }).waitFor();
};

const chooseCell = async (page: Page) => {
  await page.getByRole('grid', { name: /^Expected fringes/ }).focus();
  await page.keyboard.press('n');
  await page.getByRole('complementary', { name: 'Chosen cell' }).getByRole('heading', { level: 1 }).waitFor();
};

/** Every page there is, in the states one meets. */
export const PAGES: readonly ShownPage[] = [
  { name: 'sign-in', by: null, address: '/sign-in', heading: /./ },
  {
    name: 'sign-in-refused',
    by: null,
    address: '/sign-in',
    heading: /./,
    act: async (page) => {
      await page.getByLabel('E-mail').fill('nobody@antiphon.example');
      await page.getByRole('textbox', { name: 'Password' }).fill('not the one');
      await page.getByRole('button', { name: 'Sign in', exact: true }).click();
      await page.getByRole('alert').filter({ hasText: /./ }).first().waitFor();
    },
  },
  { name: 'sessions', by: 'scheduler', address: '/sessions', heading: /^Sessions$/ },
  { name: 'sessions-operator', by: 'operatorBm', address: '/sessions', heading: /^Sessions$/ },
  {
    name: 'sessions-none',
    by: 'scheduler',
    address: '/sessions?find=nothing',
    heading: /^No sessions match$/,
  },
  { name: 'session-new', by: 'scheduler', address: '/sessions/new', heading: /^New session$/ },
  {
    name: 'session-new-wrong',
    by: 'scheduler',
    address: '/sessions/new',
    heading: /^New session$/,
    act: press('Make the session'),
  },
  { name: 'settings', by: 'scheduler', address: '/sessions/ARC-031/settings', heading: /^ARC-031/ },
  { name: 'comments', by: 'operatorAf', address: '/sessions/ARC-029/comments', heading: /^Comments$/ },
  { name: 'comments-none', by: 'scheduler', address: '/sessions/ARC-031/comments', heading: /^Comments$/ },
  { name: 'timeline', by: 'scheduler', address: '/sessions/ARC-031/timeline', heading: /./, act: drawn },
  {
    name: 'timeline-24h',
    by: 'scheduler',
    address: '/sessions/ARC-031/timeline',
    heading: /./,
    act: async (page) => {
      await drawn(page);
      await press('24 h')(page);
    },
  },
  {
    name: 'timeline-scan',
    by: 'scheduler',
    address: '/sessions/ARC-031/timeline',
    heading: /./,
    act: chooseScan,
  },
  {
    name: 'timeline-move',
    by: 'scheduler',
    address: '/sessions/ARC-031/timeline',
    heading: /./,
    act: async (page) => {
      await chooseScan(page);
      await page.keyboard.press('m');
      await page.keyboard.press('ArrowRight');
    },
  },
  {
    name: 'timeline-edit',
    by: 'scheduler',
    address: '/sessions/ARC-031/timeline',
    heading: /./,
    act: async (page) => {
      await chooseScan(page);
      await press('Edit scan')(page);
      await page.getByRole('dialog').waitFor();
    },
  },
  { name: 'sky', by: 'scheduler', address: '/sessions/ARC-031/sky', heading: /./ },
  {
    name: 'sky-start',
    by: 'scheduler',
    address: '/sessions/ARC-031/sky',
    heading: /./,
    act: async (page) => {
      await page.getByRole('button', { name: /^Start at/ }).click();
      await page.getByRole('dialog').waitFor();
    },
  },
  {
    name: 'sky-table',
    by: 'scheduler',
    address: '/sessions/ARC-031/sky',
    heading: /./,
    act: press('As a table'),
  },
  { name: 'fringes', by: 'correlator', address: '/sessions/ARC-031/fringes', heading: /./ },
  {
    name: 'fringes-cell',
    by: 'correlator',
    address: '/sessions/ARC-031/fringes',
    heading: /./,
    act: chooseCell,
  },
  { name: 'coverage', by: 'investigator', address: '/sessions/ARC-031/coverage', heading: /^J\d/ },
  { name: 'slots', by: 'scheduler', address: '/sessions/ARC-030/slots', heading: /^Version 2,/ },
  {
    name: 'slots-offer',
    by: 'scheduler',
    address: '/sessions/ARC-030/slots',
    heading: /^Version 2,/,
    act: press('Offer the plan anew'),
  },
  { name: 'slots-none', by: 'scheduler', address: '/sessions/ARC-031/slots', heading: /./ },
  { name: 'slots-own', by: 'operatorBm', address: '/slots', heading: /./ },
  { name: 'slots-answer', by: 'operatorBm', address: '/sessions/ARC-030/slots', heading: /^Bright Moor$/ },
  {
    name: 'slots-part',
    by: 'operatorBm',
    address: '/sessions/ARC-030/slots',
    heading: /^Bright Moor$/,
    act: press('In part'),
  },
  {
    name: 'slots-decline',
    by: 'operatorBm',
    address: '/sessions/ARC-030/slots',
    heading: /^Bright Moor$/,
    act: press('Decline'),
  },
  { name: 'clocks', by: 'correlator', address: '/clocks', heading: /^Clocks$/ },
  { name: 'clock', by: 'correlator', address: '/stations/Af/clock', heading: /^Arrow Fell$/ },
  { name: 'clock-reading', by: 'operatorBm', address: '/stations/Bm/clock', heading: /^Clock reading$/ },
  {
    name: 'clock-change',
    by: 'operatorBm',
    address: '/stations/Bm/clock',
    heading: /^Clock reading$/,
    act: press('Change at the station'),
  },
  { name: 'desk', by: 'operatorAf', address: '/stations/Af/desk', heading: /^(Next|Now): scan/ },
  {
    name: 'desk-lost',
    by: 'operatorAf',
    address: '/stations/Af/desk',
    heading: /^(Next|Now): scan/,
    act: press('Lost'),
  },
  { name: 'stations', by: 'scheduler', address: '/stations', heading: /^Stations$/ },
  { name: 'station', by: 'scheduler', address: '/stations/Dp', heading: /^Drum Point$/ },
  {
    name: 'station-edit',
    by: 'scheduler',
    address: '/stations/Dp',
    heading: /^Drum Point$/,
    act: press(/^Edit/),
  },
  {
    name: 'station-retire',
    by: 'scheduler',
    address: '/stations/Dp',
    heading: /^Drum Point$/,
    act: press('Retire'),
  },
  {
    name: 'station-paths',
    by: 'scheduler',
    address: '/stations/Dp',
    heading: /^Drum Point$/,
    act: async (page) => {
      const choice = page.getByLabel('Path of', { exact: true });
      for (const label of ['J0530+1331', 'J0827+5217', 'J1058+0133']) {
        await choice.selectOption({ label });
        await press('Draw')(page);
      }
    },
  },
  {
    name: 'station-mask',
    by: 'scheduler',
    address: '/stations/Dp',
    heading: /^Drum Point$/,
    act: async (page) => {
      await press('Edit: Horizon mask')(page);
      await page.getByLabel('A file with two columns').setInputFiles({
        name: 'mask.txt',
        mimeType: 'text/plain',
        buffer: Buffer.from('0 12\n90 30\nx 1\n'),
      });
      await page.getByRole('dialog').waitFor();
    },
  },
  { name: 'station-new', by: 'scheduler', address: '/stations/new', heading: /./ },
  { name: 'sources', by: 'scheduler', address: '/sources', heading: /^Sources$/ },
  { name: 'source-new', by: 'scheduler', address: '/sources/new', heading: /./ },
  { name: 'modes', by: 'investigator', address: '/modes', heading: /^Modes$/ },
  { name: 'mode-new', by: 'scheduler', address: '/modes/new', heading: /./ },
  { name: 'mail-none', by: 'admin', address: '/mail', heading: /./ },
  {
    name: 'mail',
    by: 'admin',
    address: '/mail',
    heading: /./,
    before: {
      by: 'scheduler',
      address: '/sessions/ARC-031/slots',
      act: async (page) => {
        await press(/^Offer ARC-031/)(page);
        const dialog = page.getByRole('dialog');
        await dialog.getByRole('checkbox').check();
        await dialog.getByRole('button', { name: /^Offer with/ }).click();
        await dialog.waitFor({ state: 'hidden' });
      },
    },
  },
  {
    name: 'no-page',
    by: 'scheduler',
    address: '/sessions/NOPE-1/timeline',
    heading: /^There is no/,
    status: 404,
  },
  { name: 'no-right', by: 'investigator', address: '/mail', heading: /is for administrators$/, status: 403 },
  {
    name: 'print-desk',
    by: 'operatorAf',
    address: '/stations/Af/desk',
    heading: /^(Next|Now): scan/,
    isPrinted: true,
  },
  {
    name: 'print-fringes',
    by: 'correlator',
    address: '/sessions/ARC-031/fringes',
    heading: /./,
    isPrinted: true,
  },
  {
    name: 'print-timeline',
    by: 'scheduler',
    address: '/sessions/ARC-031/timeline',
    heading: /./,
    act: drawn,
    isPrinted: true,
  },
  {
    name: 'print-clock',
    by: 'correlator',
    address: '/stations/Af/clock',
    heading: /^Arrow Fell$/,
    isPrinted: true,
  },
  {
    name: 'print-station',
    by: 'scheduler',
    address: '/stations/Dp',
    heading: /^Drum Point$/,
    isPrinted: true,
  },
  {
    name: 'print-slots',
    by: 'scheduler',
    address: '/sessions/ARC-030/slots',
    heading: /^Version 2,/,
    isPrinted: true,
  },
];
