import 'server-only';
import { and, eq, sql } from 'drizzle-orm';
import type { Tx } from './client';
import { clockEvents } from './schema/clock-events';
import { clockReadings } from './schema/clock-readings';
import { stationBands } from './schema/station-bands';
import { stations } from './schema/stations';
import { CLOCK_CHANGE, CLOCK_DAYS, CLOCKS, HOURS_BETWEEN } from './seed-data/clocks';
import { BAND_22 } from './seed-data/modes';
import { EQUIPMENT } from './seed-data/stations';
import { seedId } from './seed-ids';
import { operatorOf } from './seed-sessions';

const HOUR_MS = 3_600_000;

/** What each station records with, and the hills around it. */
export async function fillEquipment(tx: Tx, nowMs: number): Promise<void> {
  for (const one of EQUIPMENT) {
    await tx
      .update(stations)
      .set({
        horizon: JSON.stringify(one.horizon),
        formatter: one.formatter,
        recorder: one.recorder,
        recorderBitsPerS: one.recorderGbits * 1e9,
        recorderFreeBytes: one.freeTB * 1e12,
        recorderFreeAtMs: nowMs,
        maxChannels: one.channels,
        maxBitsPerS: one.recorderGbits * 1e9,
        preScanSeconds: one.preScanSeconds,
        contacts: one.contacts,
      })
      .where(eq(stations.code, one.code));
    await tx
      .update(stationBands)
      .set({ zenithOpacity: one.opacity })
      .where(and(eq(stationBands.stationCode, one.code), eq(stationBands.band, BAND_22)));
  }
}

/** How each station's clock is read: part of the catalogue, so it is filled once. */
export async function fillCounters(tx: Tx, nowMs: number): Promise<void> {
  for (const { code, counter, cables, instrument } of CLOCKS) {
    await tx
      .update(stations)
      .set({
        counterStart: counter[0],
        counterStop: counter[1],
        stationCableSeconds: cables[0],
        gpsCableSeconds: cables[1],
        ...(instrument && {
          instrumentDelaySeconds: instrument[0],
          instrumentDelaySigmaSeconds: instrument[1],
          instrumentDelayFromMs: nowMs - CLOCK_DAYS * 24 * HOUR_MS,
        }),
      })
      .where(eq(stations.code, code));
  }
}

/** Invented readings of the last 60 days: a line, white noise, what was read wrong, and one step that is explained. */
export async function fillClocks(tx: Tx, nowMs: number): Promise<void> {
  const changeMs = wholeSecond(nowMs - CLOCK_CHANGE.daysAgo * 24 * HOUR_MS);
  await tx.insert(clockEvents).values({
    id: seedId('clock-event', CLOCK_CHANGE.code),
    stationCode: CLOCK_CHANGE.code,
    atMs: changeMs,
    kind: 'resync',
    stepSeconds: CLOCK_CHANGE.stepSeconds,
    note: CLOCK_CHANGE.note,
    userId: operatorOf(CLOCK_CHANGE.code),
    role: 'operator',
    enteredAtMs: changeMs,
  });
  const rows = CLOCKS.flatMap((clock) => readingsOf(clock, nowMs, changeMs));
  await tx.run(sql`INSERT INTO ${clockReadings} (id, station_code, pulse, at_ms, offset_seconds, second_check, state,
      reason, set_aside_by, set_aside_role, set_aside_at_ms, origin, entered_by, entered_role, entered_at_ms, act_id)
    SELECT value ->> 0, value ->> 1, 'formatter', value ->> 2, value ->> 3, 'yes',
      CASE WHEN value ->> 4 IS NULL THEN 'used' ELSE 'set-aside' END, coalesce(value ->> 4, ''),
      CASE WHEN value ->> 4 IS NOT NULL THEN value ->> 5 END, CASE WHEN value ->> 4 IS NOT NULL THEN 'operator' END,
      CASE WHEN value ->> 4 IS NOT NULL THEN value ->> 2 END, 'file', value ->> 5, 'operator', value ->> 2, value ->> 0
    FROM json_each(${JSON.stringify(rows)})`);
}

type Row = [
  id: string,
  code: string,
  atMs: number,
  offsetSeconds: number,
  setAside: string | null,
  userId: string,
];

function readingsOf(clock: (typeof CLOCKS)[number], nowMs: number, changeMs: number): Row[] {
  const noise = gaussian(clock.code);
  const count = Math.floor((CLOCK_DAYS * 24 - clock.newestHours) / HOURS_BETWEEN) + 1;
  const rows: Row[] = [];
  for (let back = 0; back < count; back++) {
    const jitterMs = Math.round(noise() * 120) * 1000;
    const atMs =
      wholeSecond(nowMs - (clock.newestHours + back * HOURS_BETWEEN) * HOUR_MS) + Math.min(jitterMs, 0);
    const before = clock.code === CLOCK_CHANGE.code && atMs < changeMs ? CLOCK_CHANGE.stepSeconds : 0;
    const line = clock.offsetSeconds + (clock.rate * (atMs - nowMs)) / 1000 - before;
    const wrong = clock.wrong.find(([index]) => index === back);
    const offset = line + clock.scatterSeconds * noise() + (wrong?.[1] ?? 0);
    const tenths = Math.round(offset * 1e10) / 1e10;
    rows.push([
      seedId('reading', `${clock.code} ${back}`),
      clock.code,
      atMs,
      tenths,
      wrong?.[2] ?? null,
      operatorOf(clock.code),
    ]);
  }
  return rows;
}

const wholeSecond = (ms: number): number => Math.floor(ms / 1000) * 1000;

/** White noise of unit scatter, the same for the same name: a linear congruential generator, then Box and Muller. */
function gaussian(name: string): () => number {
  let state = [...name].reduce((sum, letter) => sum * 256 + letter.charCodeAt(0), 7);
  const uniform = () => {
    state = (Math.imul(state, 1_664_525) + 1_013_904_223) >>> 0;
    return (state + 0.5) / 4_294_967_296;
  };
  return () => Math.sqrt(-2 * Math.log(uniform())) * Math.cos(2 * Math.PI * uniform());
}
