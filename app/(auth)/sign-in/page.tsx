import type { Metadata, Route } from 'next';
import { redirect } from 'next/navigation';
import { ACCOUNTS, DEMO_PASSWORD } from '@/db/seed-data/accounts';
import { SCANS, SETTINGS } from '@/db/seed-data/session';
import { SOURCES } from '@/db/seed-data/sources';
import { STATIONS } from '@/db/seed-data/stations';
import { demoStartMs } from '@/db/seed-sessions';
import { staveOrder } from '@/app/_ui/stave-order';
import { roleLabel } from '@/src/access/policy';
import { env, nowMs } from '@/src/env';
import { currentViewer } from '@/src/viewer/current-viewer';
import { safeReturnPath } from '@/src/viewer/return-path';
import { Art } from './_art/art';
import type { Scene } from './_art/scene';
import { SignInForm, type DemoAccounts } from './sign-in-form';
import './sign-in.css';

export const metadata: Metadata = { title: 'Sign in' };

type SearchParams = Promise<Record<string, string | string[] | undefined>>;

const HOUR_MS = 3_600_000;
const SHOWN_SOURCE = 'J0738+1742';

export default async function SignInPage({ searchParams }: { searchParams: SearchParams }) {
  const next = safeReturnPath((await searchParams).next);
  if (await currentViewer()) redirect(next as Route);
  const { isDemo } = env();
  return (
    <div className="sign-in">
      <Art scene={isDemo ? demoScene(nowMs()) : null} />
      <main id="main" className="sign-in-side">
        <SignInForm next={next} demo={isDemo ? demoAccounts() : null} />
      </main>
    </div>
  );
}

function demoAccounts(): DemoAccounts {
  const accounts = ACCOUNTS.filter(({ isUnlisted }) => !isUnlisted).map(({ email, role, stationCode }) => ({
    email,
    label: roleLabel({ role, stationCode: stationCode ?? null }),
  }));
  return { password: DEMO_PASSWORD, accounts };
}

/** The demo's own stations, source and scans: a network's true ones are shown to nobody unknown. */
function demoScene(now: number): Scene | null {
  const source = SOURCES.find(([name]) => name === SHOWN_SOURCE);
  if (!source) return null;
  const [name, raDeg, decDeg] = source;
  const sessionStartMs = demoStartMs(now);
  const startMs = Math.floor(sessionStartMs / HOUR_MS) * HOUR_MS - 2 * HOUR_MS;
  const placed = STATIONS.map(({ code, latitudeDeg, longitudeDeg, heightM, minElevationDeg }) => ({
    code,
    site: { latitudeDeg, longitudeDeg, heightM },
    minElevationDeg: Math.max(minElevationDeg, SETTINGS.minElevationDeg),
  }));
  const scans = SCANS.filter(([, , observed]) => observed === name).map(
    ([afterMinutes, minutes, , codes]) => ({
      startMs: sessionStartMs + afterMinutes * 60_000,
      lengthSeconds: minutes * 60,
      codes: codes.split(' '),
    }),
  );
  return {
    source: { name, position: { raDeg, decDeg } },
    stations: staveOrder(placed),
    span: { startMs, endMs: startMs + 12 * HOUR_MS },
    scans,
  };
}
