import 'server-only';
import { asc, eq, sql } from 'drizzle-orm';
import { db, type Database } from '../../../db/client';
import { offers } from '../../../db/schema/offers';
import { sessions } from '../../../db/schema/sessions';
import { slots } from '../../../db/schema/slots';
import { stations } from '../../../db/schema/stations';
import { can, canSome, type Viewer } from '../../access/policy';
import { nowMs } from '../../env';
import { blocksOf, type Block } from '../../schedule/blocks';
import type { PlanContext } from '../../schedule/context';
import { stationPaths, type PathLeg } from '../../schedule/paths';
import { unpackPlan } from '../../schedule/plan-rows';
import { scanNumbers } from '../../schedule/scan-numbers';
import { AXIS_WORDS } from '../../sky/axes';
import { gmstHours } from '../../sky/position';
import type { MountKind } from '../../sky/types';
import { fitOf } from '../clock/read';
import { answer, forbiddenFor, notFound, type Failure } from '../errors';
import { newestSnapshot, type Snapshot } from '../offer/read';
import { outcomesOf, wordOn } from '../outcome/read';
import { derivedState } from '../session/dto';
import { answersOf, type StationAnswer } from '../slot/answers';
import type { DeskDto, DeskScan } from './dto';

const HOUR_MS = 3_600_000;
/** A run stays on the desk this long after its slot, for the last words on its scans. */
const AFTER_MS = 12 * HOUR_MS;

/** What a station's operator does now and next, from what the station was given last: never from the draft. */
export const readDesk = (viewer: Viewer, code: string): Promise<{ ok: true; desk: DeskDto } | Failure> =>
  answer(async () => {
    if (!canSome(viewer, 'desk.read')) throw forbiddenFor('desk.read');
    const [station] = await db().select().from(stations).where(eq(stations.code, code));
    if (!station || !can(viewer, 'desk.read', { stationCode: station.code }))
      throw notFound(`There is no desk of ${code.slice(0, 8)}.`);
    const now = nowMs();
    const asked = await slotsOfStation(db(), station.code, now);
    const current = asked.find(({ endMs }) => endMs >= now) ?? asked.at(-1);
    const { used } = await fitOf(db(), station, 'formatter', now);
    const [newest] = used;
    const { name, timeZone, longitudeDeg, minElevationDeg } = station;
    const subject = { sessionId: current?.sessionId ?? '', stationCodes: [station.code] };
    return {
      ok: true,
      desk: {
        station: { code: station.code, name, timeZone, longitudeDeg, minElevationDeg },
        run: current ? await runOf(db(), current, now) : null,
        slots: asked
          .filter(({ endMs }) => endMs >= now)
          .map(({ session, startMs, endMs, answer: word }) => ({
            sessionCode: session.code,
            title: session.title,
            startMs,
            endMs,
            answer: word,
          })),
        clock: newest ? { readAtMs: newest.atMs, offsetSeconds: newest.offsetSeconds } : null,
        canSay: can(viewer, 'outcome.write', subject),
        canRead: can(viewer, 'clock.write', { stationCode: station.code }),
        gmstHours: gmstHours(new Date(now)),
        nowMs: now,
      },
    };
  });

type Asked = StationAnswer & { session: typeof sessions.$inferSelect };

/** The newest slots of a station that are ahead, under way or not long over, by start. */
async function slotsOfStation(from: Database, code: string, now: number): Promise<Asked[]> {
  const rows = await from
    .select()
    .from(sessions)
    .where(
      sql`${sessions.state} <> 'cancelled' AND ${sessions.startMs} + ${sessions.lengthSeconds} * 1000 >= ${now - AFTER_MS}
        AND EXISTS (SELECT 1 FROM ${offers} o JOIN ${slots} s ON s.offer_id = o.id
          WHERE o.session_id = ${sessions}.id AND s.station_code = ${code})`,
    )
    .orderBy(asc(sessions.startMs));
  const answers = await answersOf(
    from,
    rows.map(({ id }) => id),
  );
  return answers
    .filter(({ station, endMs }) => station === code && endMs >= now - AFTER_MS)
    .flatMap((one) => {
      const session = rows.find(({ id }) => id === one.sessionId);
      return session ? [{ ...one, session }] : [];
    })
    .sort((a, b) => a.startMs - b.startMs);
}

async function runOf(from: Database, asked: Asked, now: number): Promise<DeskDto['run']> {
  const { session, station, startMs, endMs, answer: word } = asked;
  const snapshot = await newestSnapshot(from, session.id);
  if (!snapshot) return null;
  const { number, kind } = snapshot;
  const scans = scansOf(snapshot, station, now);
  const said = await outcomesOf(from, session.id, station);
  return {
    sessionId: session.id,
    code: session.code,
    title: session.title,
    state: derivedState(session, now),
    number,
    kind,
    startMs,
    endMs,
    answer: word,
    scans,
    outcomes: scans.flatMap(({ legIds }) => wordOn(legIds, said) ?? []),
  };
}

function scansOf(snapshot: Snapshot, station: string, now: number): DeskScan[] {
  const plan = unpackPlan(snapshot.plan);
  const context: PlanContext = {
    stations: Object.fromEntries(snapshot.stations.map((one) => [one.code, one])),
    sources: Object.fromEntries(snapshot.sources.map((one) => [one.id, one])),
    modes: Object.fromEntries(snapshot.modes.map((one) => [one.id, one])),
    away: {},
    clockReadAtMs: {},
    nowMs: now,
    settings: snapshot.settings,
  };
  const numbers = scanNumbers(plan);
  const paths = stationPaths(plan, context).get(station) ?? [];
  const kind = context.stations[station]?.mount.kind ?? 'az-el';
  return blocksOf(plan).flatMap((block) => {
    const legs = block.legs.flatMap((scan) => paths.find(({ scanId }) => scanId === scan.id) ?? []);
    const [first] = legs;
    const last = legs.at(-1);
    if (!first || !last) return [];
    const { stopMs, stopAzDeg, stopElDeg } = rowOf(last, kind);
    const number = numbers.get(first.scanId) ?? '';
    return [
      {
        ...rowOf(first, kind),
        stopMs,
        stopAzDeg,
        stopElDeg,
        number: block.groupId === null ? number : number.replace(/\.\d+$/, ''),
        source: sourceWords(block, context),
        mode: context.modes[block.legs[0].modeId]?.name ?? '',
        legIds: legs.map(({ scanId }) => scanId),
      },
    ];
  });
}

/** "J0825+0309 with J0811+0146" of a nodding group. */
function sourceWords({ legs, groupId }: Block, { sources }: PlanContext): string {
  const nameOf = (leg: 'target' | 'calibrator' | null) =>
    sources[legs.find((one) => one.leg === leg)?.sourceId ?? '']?.name ?? '';
  return groupId === null ? nameOf(null) : `${nameOf('target')} with ${nameOf('calibrator')}`;
}

const rowOf = (leg: PathLeg, kind: MountKind) => ({
  scanId: leg.scanId,
  startMs: leg.startMs,
  stopMs: leg.stopMs,
  startAzDeg: leg.startAzEl.azimuthDeg,
  startElDeg: leg.startAzEl.elevationDeg,
  stopAzDeg: leg.stopAzEl.azimuthDeg,
  stopElDeg: leg.stopAzEl.elevationDeg,
  motorAxis: AXIS_WORDS[kind].first,
  motorStartDeg: leg.motorStartDeg,
  turn: kind === 'az-el' ? Math.floor(leg.motorStartDeg / 360) : null,
  fromAzDeg: leg.fromAzEl?.azimuthDeg ?? null,
  fromElDeg: leg.fromAzEl?.elevationDeg ?? null,
  fromStopMs: leg.fromStopMs,
  slewSeconds: leg.slewSeconds,
  spareSeconds: leg.spareSeconds,
  arriveElDeg: leg.arriveElevationDeg,
  impossible: leg.impossible,
});
