import { createHash } from 'node:crypto';
import { expect, type Page } from '@playwright/test';
import { idOf } from '../src/schedule/plan-ids';

/** As the demo names its rows. */
const seedId = (name: string) => idOf(createHash('sha256').update(name).digest());
const MODE = seedId('mode:22 GHz');

export const DAY_50 = Date.UTC(2027, 1, 19);

/** A session that no other test uses: Af and Fn on one source, 12 h from day 050 18:00; the page is its timeline. */
export async function makeOwnSession(page: Page, code: string, title: string): Promise<void> {
  await page.goto('/sessions/new');
  await page.getByLabel('Code').fill(code);
  await page.getByLabel('Title').fill(title);
  await page.getByLabel('Start, UT').fill('2027-050 18:00');
  await page.getByLabel('Length').fill('12 h');
  await page.getByRole('checkbox', { name: /^Af/ }).check();
  await page.getByRole('checkbox', { name: /^Fn/ }).check();
  await page.getByLabel('Add a source by name').fill('J0827+5217');
  await page.getByRole('button', { name: 'Add the source' }).click();
  await page.getByLabel('Mode that new scans').selectOption(MODE);
  await page.getByRole('button', { name: 'Make the session' }).click();
  await expect(page).toHaveURL(new RegExp(`/sessions/${code}/timeline$`));
}

/** Adds ten minutes of Af and Fn, as the timeline would. */
export async function addScan(page: Page, code: string, startMs: number): Promise<void> {
  const scan = {
    id: seedId(`${code} scan ${startMs}`),
    sourceId: seedId('source:J0827+5217'),
    modeId: MODE,
    startMs,
    lengthSeconds: 600,
    stations: ['Af', 'Fn'].map((station) => ({ station, lateSeconds: 0, earlySeconds: 0 })),
    groupId: null,
    leg: null,
    comment: '',
  };
  const command = { verb: 'add-scan', edits: [{ kind: 'add-scan', scan }] };
  const status = await page.evaluate(
    async ([address, body]) => (await fetch(address, { method: 'POST', body })).status,
    [
      `/api/sessions/${code}/commands`,
      JSON.stringify({ kind: 'do', actId: seedId(`${code} act ${startMs}`), command, seen: {} }),
    ] as const,
  );
  expect(status).toBe(200);
}
