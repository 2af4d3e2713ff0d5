import 'server-only';
import { db } from '../../../db/client';
import { can, type Viewer } from '../../access/policy';
import { nowMs } from '../../env';
import { coverageOf, observedIn } from '../../outlook/coverage';
import { sourceSky } from '../../outlook/source-sky';
import type { PlanContext } from '../../schedule/context';
import type { Plan } from '../../schedule/plan';
import { unpackPlan } from '../../schedule/plan-rows';
import { scanNumbers } from '../../schedule/scan-numbers';
import { answer, forbiddenFor, type Failure } from '../errors';
import { newestSnapshot, type Snapshot, type StoredSnapshot } from '../offer/read';
import { awayOf } from '../plan/away';
import { readModes, readSources, readStations } from '../plan/context';
import type { AwayDto } from '../plan/dto';
import { fluxOf } from '../plan/flux';
import { readPlanRows } from '../plan/rows';
import { settingsOf } from '../plan/settings';
import { headOf } from '../session/head';
import { fetchSession, subjectOf, type SessionRow } from '../session/scope';
import { answersOf } from '../slot/answers';
import type { CoverageSheet, CoverageVersion, Observed } from './dto';

/** Between points of a track the Earth turns by half a degree. */
const STEP_SECONDS = 120;
/** Between points of a line of elevation: 2.5° of the Earth’s turning. */
const SKY_STEP_SECONDS = 600;

/** What is asked of an address: all of it may be absent, none of it is trusted. */
export type CoverageWanted = { source?: string; band?: string; plan?: string };

/** uv tracks and numbers of one source in one band, of the draft or of the newest offer. */
export const readCoverage = (
  viewer: Viewer,
  key: string,
  wanted: CoverageWanted,
): Promise<{ ok: true; sheet: CoverageSheet } | Failure> =>
  answer(async () => {
    const session = await fetchSession(db(), viewer, key);
    const subject = subjectOf(session);
    if (!can(viewer, 'plan.read-draft', subject)) throw forbiddenFor('plan.read-draft');
    const snapshot = can(viewer, 'plan.read-offered', subject)
      ? await newestSnapshot(db(), session.id)
      : null;
    const isOffered = wanted.plan === 'offered' && snapshot !== null;
    const { plan: rows, stations, sources, modes, settings } = isOffered ? snapshot : await draftOf(session);
    const plan = unpackPlan(rows);
    const now = nowMs();
    const away = await awayOf(db(), session, await answersOf(db(), [session.id]));
    const context = contextOf({ stations, sources, modes, settings }, away, now);
    const observed = observedOf(plan, context);
    const chosen = chosenOf(observed, wanted);
    const coverage = chosen && coverageOf(plan, context, { ...chosen, stepSeconds: STEP_SECONDS });
    return {
      ok: true,
      sheet: {
        session: headOf(session, now),
        stations: stations.map(({ code, name, site }) => ({ code, name, site })),
        versions: [{ kind: 'draft' }, ...(snapshot ? [offered(snapshot)] : [])],
        version: isOffered ? offered(snapshot) : { kind: 'draft' },
        observed,
        shown: chosen &&
          coverage && {
            ...chosen,
            coverage,
            skies: sourceSky(plan, context, { ...chosen, stepSeconds: SKY_STEP_SECONDS }),
            modes: modeNames(plan, context, chosen),
          },
        span: { startMs: plan.span.startMs, endMs: plan.span.startMs + plan.span.lengthSeconds * 1000 },
        scanNumbers: Object.fromEntries(
          [...scanNumbers(plan)].filter(([scanId]) => coverage?.scans.includes(scanId)),
        ),
        refused: refusalOf(wanted, chosen, snapshot),
        nowMs: now,
      },
    };
  });

async function draftOf(session: SessionRow): Promise<StoredSnapshot> {
  const { plan } = await readPlanRows(db(), session);
  return {
    plan,
    stations: await readStations(db(), session.stations),
    sources: await readSources(db(), session.id),
    modes: await readModes(db()),
    settings: settingsOf(session),
  };
}

const offered = ({ number, kind, madeAtMs }: Snapshot): CoverageVersion => ({
  kind: 'offered',
  number,
  isPublished: kind === 'publish',
  madeAtMs,
});

function contextOf(
  { stations, sources, modes, settings }: Omit<StoredSnapshot, 'plan'>,
  away: Readonly<Record<string, readonly AwayDto[]>>,
  now: number,
): PlanContext {
  return {
    stations: Object.fromEntries(stations.map((station) => [station.code, station])),
    sources: Object.fromEntries(sources.map((source) => [source.id, source])),
    modes: Object.fromEntries(modes.map((mode) => [mode.id, mode])),
    away: Object.fromEntries(
      Object.entries(away).map(([code, hours]) => [
        code,
        hours.map(({ startMs, endMs, why }) => ({ start: new Date(startMs), end: new Date(endMs), why })),
      ]),
    ),
    clockReadAtMs: {},
    nowMs: now,
    settings,
  };
}

/** By right ascension as the session's sources are, whatever the plan begins with. */
function observedOf(plan: Plan, context: PlanContext): Observed[] {
  const pairs = observedIn(plan, context);
  return Object.values(context.sources).flatMap((source) =>
    pairs
      .filter(({ sourceId }) => sourceId === source.id)
      .map(({ sourceId, band }) => ({
        sourceId,
        band,
        name: source.name,
        role: source.role,
        fluxJy: fluxOf(source, band),
      })),
  );
}

/** The source and band asked for; without, the first target. */
function chosenOf(observed: readonly Observed[], { source, band }: CoverageWanted): Observed | null {
  const named = observed.filter((one) => one.name === source);
  return (
    named.find((one) => one.band === band) ??
    named[0] ??
    observed.find(({ role }) => role === 'target') ??
    observed[0] ??
    null
  );
}

function refusalOf(
  { source, band, plan }: CoverageWanted,
  chosen: Observed | null,
  snapshot: Snapshot | null,
): string | null {
  const shown = (text: string) => `“${text.slice(0, 40)}”`;
  if (plan === 'offered' && snapshot === null)
    return 'No plan of this session was offered yet. Shown is the draft.';
  if (source !== undefined && chosen !== null && source !== chosen.name)
    return `No scan of this plan observes ${shown(source)}. Shown is ${chosen.name}.`;
  if (band !== undefined && chosen !== null && band !== chosen.band)
    return `No scan of this plan observes ${chosen.name} at ${shown(band)}. Shown is ${chosen.band}.`;
  return null;
}

const modeNames = (plan: Plan, { modes }: PlanContext, { sourceId, band }: Observed): string[] => [
  ...new Set(
    plan.scans.flatMap((scan) => {
      const mode = modes[scan.modeId];
      return scan.sourceId === sourceId && mode?.band === band ? [mode.name] : [];
    }),
  ),
];
