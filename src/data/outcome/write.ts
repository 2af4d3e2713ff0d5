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
import type { Hours } from '../../schedule/slots';
import { clockText } from '../../schedule/words';
import { answer, forbiddenFor, invalid, notFound, Refusal, type Failure } from '../errors';
import { parsed } from '../input';
import { newestSnapshot } from '../offer/read';
import { fetchSession } from '../session/scope';
import { outcomesOf, REASONS, type OutcomeDto } from './read';

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

/** A station's word on how a scan went; said again it amends, sent twice it stands once. */
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
      const on = await findScan(tx, session.id, station, said.scanId);
      const role = actingRole(viewer, 'outcome.write', { sessionId: session.id, stationCodes: [station] });
      if (role === null) throw forbiddenFor('outcome.write');
      const isOwn = viewer.grants.some((held) => held.role === 'operator' && held.stationCode === station);
      const find = async () =>
        (await outcomesOf(tx, session.id, station)).find(({ scanId }) => scanId === said.scanId);
      const where = and(eq(scanOutcomes.sessionId, session.id), eq(scanOutcomes.actId, said.actId));
      const known = (await tx.$count(scanOutcomes, where)) > 0;
      if (!known) {
        if (session.state === 'closed' || session.state === 'cancelled') {
          const message = `${session.code} is ${session.state}: what was said of its scans stays.`;
          throw new Refusal({ ok: false, code: 'conflict', message });
        }
        if (nowMs() < on.startMs) throw invalid(`The scan starts at ${clockText(on.startMs)}: say it then.`);
        if (said.outcome !== 'good' && said.reason === 'other' && said.text === '') {
          const message = 'Say in a few words what it was.';
          throw invalid(message, { text: [message] });
        }
        await tx.insert(scanOutcomes).values({
          sessionId: session.id,
          scanId: said.scanId,
          stationCode: station,
          outcome: said.outcome,
          lost: JSON.stringify(lostOf(said, on)),
          reason: said.outcome === 'good' ? null : said.reason,
          text: said.text,
          userId: viewer.userId,
          role: isOwn ? 'operator' : role,
          isOnBehalf: !isOwn,
          atMs: nowMs(),
          actId: said.actId,
        });
      }
      const outcome = await find();
      if (!outcome) throw new Error('The outcome went away while it was said.');
      return { ok: true, outcome };
    });
  });

type On = { startMs: number; stopMs: number };

/** The hours of a scan of the newest snapshot at a station. */
async function findScan(tx: Tx, sessionId: string, station: string, scanId: string): Promise<On> {
  const snapshot = await newestSnapshot(tx, sessionId);
  const scan = snapshot && unpackPlan(snapshot.plan).scans.find(({ id }) => id === scanId);
  const member = scan?.stations.find((one) => one.station === station);
  if (!scan || !member) throw notFound(`${station.slice(0, 8)} has no such scan in the plan it was given.`);
  return stationOnMs(scan, member);
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
