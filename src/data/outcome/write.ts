import 'server-only';
import { and, eq } from 'drizzle-orm';
import { z } from 'zod';
import { transact, type Tx } from '../../../db/client';
import { scanOutcomes } from '../../../db/schema/scan-outcomes';
import { actingRole, type Viewer } from '../../access/policy';
import { nowMs } from '../../env';
import { ID_PATTERN } from '../../schedule/plan-ids';
import { unpackPlan } from '../../schedule/plan-rows';
import { stationOnMs } from '../../schedule/plan';
import { within, type Hours } from '../../schedule/slots';
import { clockText } from '../../schedule/words';
import { answer, forbiddenFor, invalid, notFound, Refusal, type Failure } from '../errors';
import { parsed } from '../input';
import { newestSnapshot } from '../offer/read';
import { fetchSession } from '../session/scope';
import { outcomesOf, REASONS, wordOn, type Outcome, type OutcomeDto } from './read';
import { isEnded } from '../../schedule/ended';

const common = {
  actId: z.string().regex(ID_PATTERN, 'This has no id. Load the page again.'),
  scanId: z.string().max(32),
};
const text = z.string().trim().max(500, 'The text is longer than 500 letters. Shorten it.').default('');
const off = z.tuple([z.number().int(), z.number().int()]);
const reason = z.enum(REASONS, 'Choose one reason of the eight.');

const input = z.discriminatedUnion(
  'outcome',
  [
    z.strictObject({ ...common, outcome: z.literal('good'), text }),
    z.strictObject({ ...common, outcome: z.literal('partly'), lost: off, reason, text }),
    z.strictObject({ ...common, outcome: z.literal('lost'), reason, text }),
  ],
  'Say how it went: good, partly or lost.',
);

/**
 * A station's word on how a scan went; said again it amends, sent twice it stands once. A nodding group is said as one:
 * each leg gets its part of the hours off source.
 */
export const sayOutcome = (
  viewer: Viewer,
  key: string,
  station: string,
  body: unknown,
): Promise<{ ok: true; outcome: OutcomeDto } | Failure> =>
  answer(async () => {
    const said = parsed(input, body);
    return transact(async (tx) => {
      const session = await fetchSession(tx, viewer, key);
      const legs = await findLegs(tx, session.id, station, said.scanId);
      const on = { startMs: legs[0].startMs, stopMs: legs.at(-1)?.stopMs ?? legs[0].stopMs };
      const role = actingRole(viewer, 'outcome.write', { sessionId: session.id, stationCodes: [station] });
      if (role === null) throw forbiddenFor('outcome.write');
      const isOwn = viewer.grants.some((held) => held.role === 'operator' && held.stationCode === station);
      const find = async () =>
        wordOn(
          legs.map(({ scanId }) => scanId),
          await outcomesOf(tx, session.id, station),
        );
      const where = and(eq(scanOutcomes.sessionId, session.id), eq(scanOutcomes.actId, said.actId));
      const known = (await tx.$count(scanOutcomes, where)) > 0;
      if (!known) {
        if (isEnded(session.state)) {
          const message = `${session.code} is ${session.state}: what was said of its scans stays.`;
          throw new Refusal({ ok: false, code: 'conflict', message });
        }
        if (nowMs() < on.startMs) throw invalid(`The scan starts at ${clockText(on.startMs)}: say it then.`);
        if (said.outcome !== 'good' && said.reason === 'other' && said.text === '') {
          const message = 'Say in a few words what it was.';
          throw invalid(message, { text: [message] });
        }
        const lost = lostOf(said, on);
        await tx.insert(scanOutcomes).values(
          legs.map((leg, index) => {
            const hours = within([leg.startMs, leg.stopMs], lost);
            const outcome = outcomeOf(leg, hours);
            return {
              sessionId: session.id,
              scanId: leg.scanId,
              stationCode: station,
              outcome,
              lost: JSON.stringify(hours),
              reason: said.outcome === 'good' || outcome === 'good' ? null : said.reason,
              text: said.text,
              userId: viewer.userId,
              role: isOwn ? ('operator' as const) : role,
              isOnBehalf: !isOwn,
              atMs: nowMs(),
              actId: index === 0 ? said.actId : `${said.actId}.${index}`,
            };
          }),
        );
      }
      const outcome = await find();
      if (!outcome) throw new Error('The outcome went away while it was said.');
      return { ok: true, outcome };
    });
  });

type On = { startMs: number; stopMs: number };
type Leg = On & { scanId: string };

/** The hours of a scan of the newest snapshot at a station; of a leg, those of its whole nodding group. */
async function findLegs(
  tx: Tx,
  sessionId: string,
  station: string,
  scanId: string,
): Promise<[Leg, ...Leg[]]> {
  const snapshot = await newestSnapshot(tx, sessionId);
  const scans = snapshot ? unpackPlan(snapshot.plan).scans : [];
  const asked = scans.find(({ id }) => id === scanId);
  const together =
    asked && asked.groupId !== null
      ? scans.filter(({ groupId }) => groupId === asked.groupId)
      : asked
        ? [asked]
        : [];
  const [first, ...rest] = together.flatMap((scan) => {
    const member = scan.stations.find((one) => one.station === station);
    return member ? [{ scanId: scan.id, ...stationOnMs(scan, member) }] : [];
  });
  if (!first) throw notFound(`${station.slice(0, 8)} has no such scan in the plan it was given.`);
  return [first, ...rest];
}

function outcomeOf({ startMs, stopMs }: On, lost: readonly Hours[]): Outcome {
  const lostMs = lost.reduce((sum, [from, until]) => sum + until - from, 0);
  return lostMs === 0 ? 'good' : lostMs >= stopMs - startMs ? 'lost' : 'partly';
}

function lostOf(said: z.output<typeof input>, { startMs, stopMs }: On): Hours[] {
  if (said.outcome === 'good') return [];
  if (said.outcome === 'lost') return [[startMs, stopMs]];
  const [from, until] = said.lost;
  const refuse = (message: string) => invalid(message, { lost: [message] });
  if (until <= from) throw refuse('The time off source ends before it starts. Set an end after the start.');
  if (from < startMs || until > stopMs)
    throw refuse(`The scan runs from ${clockText(startMs)} to ${clockText(stopMs)}: give times within it.`);
  if (from === startMs && until === stopMs) throw refuse('That is all of it. Say lost instead.');
  return [[from, until]];
}
