import 'server-only';
import { and, eq } from 'drizzle-orm';
import { z } from 'zod';
import { transact, type Tx } from '../../../db/client';
import { clockEvents } from '../../../db/schema/clock-events';
import { clockReadings } from '../../../db/schema/clock-readings';
import { actingRole, type Viewer } from '../../access/policy';
import { predictClock, segmentAt, type ClockPrediction } from '../../clock/fit';
import { offsetFromWords, offsetWords, readSize, SIZE_UNITS } from '../../clock/reading';
import { suspectSlip, type Slip } from '../../clock/slips';
import { nowMs } from '../../env';
import { ID_PATTERN } from '../../schedule/plan-ids';
import { fullTimeText } from '../../schedule/words';
import { answer, forbiddenFor, invalid, notFound, Refusal, type Failure } from '../errors';
import { parsed } from '../input';
import { fetchStation, fitOf } from './read';

const id = z.string().regex(ID_PATTERN, 'The form has no id. Load the page again.');
const note = z.string().trim().max(500, 'The note is longer than 500 letters. Shorten it.').default('');
const units = Object.keys(SIZE_UNITS) as (keyof typeof SIZE_UNITS)[];

const readingInput = z.strictObject({
  actId: id,
  pulse: z.enum(['formatter', 'maser'], 'Say whose pulse was read.'),
  atMs: z.number('Say when it was read.').int(),
  tick: z.enum(['early', 'late'], 'Which tick came first? Choose Early or Late.'),
  /** as it was typed, without a sign */
  size: z.string().max(40),
  unit: z.enum(units as [keyof typeof SIZE_UNITS, ...(keyof typeof SIZE_UNITS)[]]),
  secondCheck: z.enum(['yes', 'no', 'off'], 'Say whether the formatter’s second was checked against UTC.'),
  secondOff: z.number().int('Whole seconds only.').nullable().default(null),
  note,
  origin: z.enum(['form', 'desk']).default('form'),
  /** the question was asked, and it is right as it stands */
  isSure: z.boolean().default(false),
});

const changeInput = z.strictObject({
  id,
  kind: z.enum(['steered', 'resync', 'cable', 'receiver', 'power', 'other'], 'Say what was changed.'),
  atMs: z.number('Say when it was changed.').int(),
  note,
});

const asideInput = z.discriminatedUnion('state', [
  z.strictObject({
    state: z.literal('set-aside'),
    reason: z
      .string()
      .trim()
      .min(1, 'Say why it is set aside: it stays in the log with the reason.')
      .max(500),
  }),
  z.strictObject({ state: z.literal('used') }),
]);

export type Reported = {
  ok: true;
  offsetSeconds: number;
  /** what the fit expected before this reading; null without a fit */
  expected: ClockPrediction | null;
};

/** A reading that may hold a slip is asked about once, before it is stored. */
export type ReadingFailure = Failure & { slip?: Slip };

const LATEST_MS = 10 * 60_000;
const EARLIEST_MS = 10 * 366 * 86_400_000;

/** The operator's reading of a clock; sent twice it stands once. */
export const reportReading = (
  viewer: Viewer,
  code: string,
  body: unknown,
): Promise<Reported | ReadingFailure> =>
  answer(async () => {
    const given = parsed(readingInput, body);
    return transact(async (tx) => {
      const station = await fetchStation(tx, viewer, code);
      const role = actingRole(viewer, 'clock.write', { stationCode: station.code });
      if (role === null) throw forbiddenFor('clock.write');
      const offsetSeconds = offsetOf(given);
      refuseTime(given.atMs, 'atMs', 'read');
      const { fit } = await fitOf(tx, station, given.pulse, given.atMs);
      const expected = fit && predictClock(fit, new Date(given.atMs));
      const { code: stationCode } = station;
      if (await isKnown(tx, stationCode, given.actId)) return { ok: true, offsetSeconds, expected };
      await refuseTwice(tx, stationCode, given);
      const scatter = fit && segmentAt(fit, new Date(given.atMs))?.scatterSeconds;
      const slip = expected && !given.isSure ? suspectSlip(offsetSeconds, expected, scatter ?? 0) : null;
      if (slip) {
        const failure: ReadingFailure = { ok: false, code: 'conflict', message: slip.question, slip };
        throw new Refusal(failure);
      }
      await tx.insert(clockReadings).values({
        id: given.actId,
        actId: given.actId,
        stationCode,
        pulse: given.pulse,
        atMs: given.atMs,
        offsetSeconds,
        secondCheck: given.secondCheck,
        secondOff: given.secondOff,
        state: 'used',
        note: given.note,
        origin: given.origin,
        enteredBy: viewer.userId,
        enteredRole: role,
        enteredAtMs: nowMs(),
      });
      return { ok: true, offsetSeconds, expected };
    });
  });

/** A change at the station: the fit starts anew there. */
export const reportChange = (viewer: Viewer, code: string, body: unknown): Promise<{ ok: true } | Failure> =>
  answer(async () => {
    const given = parsed(changeInput, body);
    return transact(async (tx) => {
      const station = await fetchStation(tx, viewer, code);
      const role = actingRole(viewer, 'clock.write', { stationCode: station.code });
      if (role === null) throw forbiddenFor('clock.write');
      refuseTime(given.atMs, 'atMs', 'changed');
      await tx
        .insert(clockEvents)
        .values({
          ...given,
          stationCode: station.code,
          userId: viewer.userId,
          role,
          enteredAtMs: nowMs(),
        })
        .onConflictDoNothing();
      return { ok: true };
    });
  });

/** Takes a reading out of the fit, with the reason, or back into it; it stays in the log. */
export const setReadingAside = (
  viewer: Viewer,
  code: string,
  readingId: string,
  body: unknown,
): Promise<{ ok: true } | Failure> =>
  answer(async () => {
    const given = parsed(asideInput, body);
    return transact(async (tx) => {
      const station = await fetchStation(tx, viewer, code);
      const role = actingRole(viewer, 'clock.set-aside', { stationCode: station.code });
      if (role === null) throw forbiddenFor('clock.set-aside');
      const isAside = given.state === 'set-aside';
      const changed = await tx
        .update(clockReadings)
        .set({
          state: given.state,
          reason: isAside ? given.reason : '',
          setAsideBy: isAside ? viewer.userId : null,
          setAsideRole: isAside ? role : null,
          setAsideAtMs: isAside ? nowMs() : null,
        })
        .where(and(eq(clockReadings.id, readingId), eq(clockReadings.stationCode, station.code)))
        .returning({ id: clockReadings.id });
      if (changed.length === 0) throw notFound(`There is no such reading of ${station.code}.`);
      return { ok: true };
    });
  });

function offsetOf({ tick, size, unit, secondCheck, secondOff }: z.output<typeof readingInput>): number {
  const entry = readSize(size, unit);
  if (!entry.ok) throw invalid(entry.message, { size: [entry.message] });
  if (secondCheck === 'off' && (secondOff === null || secondOff === 0)) {
    const message = 'By how many whole seconds is the formatter off? Type a number that is not 0.';
    throw invalid(message, { secondOff: [message] });
  }
  if (secondCheck !== 'off' && secondOff !== null) {
    const message = 'Whole seconds are given only where the formatter is off by them.';
    throw invalid(message, { secondOff: [message] });
  }
  if (Math.abs(secondOff ?? 0) > 86_400) {
    const message = 'More than a day of seconds. Type at most 86 400.';
    throw invalid(message, { secondOff: [message] });
  }
  return offsetFromWords(tick, entry.seconds);
}

function refuseTime(atMs: number, field: string, done: string): void {
  const now = nowMs();
  const message =
    atMs > now + LATEST_MS
      ? `${fullTimeText(atMs)} lies ahead. Give the time at which it was ${done}.`
      : atMs < now - EARLIEST_MS
        ? `${fullTimeText(atMs)} is more than ten years ago. Give the time at which it was ${done}.`
        : null;
  if (message !== null) throw invalid(message, { [field]: [message] });
}

const isKnown = async (tx: Tx, stationCode: string, actId: string): Promise<boolean> =>
  (await tx.$count(
    clockReadings,
    and(eq(clockReadings.stationCode, stationCode), eq(clockReadings.actId, actId)),
  )) > 0;

async function refuseTwice(
  tx: Tx,
  stationCode: string,
  { pulse, atMs }: z.output<typeof readingInput>,
): Promise<void> {
  const [there] = await tx
    .select({ offsetSeconds: clockReadings.offsetSeconds })
    .from(clockReadings)
    .where(
      and(
        eq(clockReadings.stationCode, stationCode),
        eq(clockReadings.pulse, pulse),
        eq(clockReadings.atMs, atMs),
      ),
    );
  if (!there) return;
  const message = `There is a reading of ${fullTimeText(atMs)} already: ${offsetWords(there.offsetSeconds)}. Give another time, or set that one aside first.`;
  throw invalid(message, { atMs: [message] });
}
