import type { Role } from '../../src/access/policy';

/** Invented; they exist only while the demo is on. */
export const DEMO_PASSWORD = 'antiphon-demo';

export const ACCOUNTS: readonly {
  email: string;
  role: Role;
  stationCode?: string;
  sessionCode?: string;
}[] = [
  { email: 'admin@antiphon.example', role: 'admin' },
  { email: 'scheduler@antiphon.example', role: 'scheduler' },
  { email: 'operator@arrowfell.example', role: 'operator', stationCode: 'Af' },
  { email: 'operator@brightmoor.example', role: 'operator', stationCode: 'Bm' },
  { email: 'correlator@antiphon.example', role: 'correlator' },
  { email: 'investigator@antiphon.example', role: 'investigator', sessionCode: 'ARC-031' },
];
