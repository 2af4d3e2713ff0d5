import type { Role } from '../../src/access/policy';

/** Invented; they exist only while the demo is on. */
export const DEMO_PASSWORD = 'antiphon-demo';

export const ACCOUNTS: readonly {
  email: string;
  role: Role;
  stationCode?: string;
  sessionCodes?: readonly string[];
  /** not offered on the sign-in page, so that it stays short */
  isUnlisted?: boolean;
}[] = [
  { email: 'admin@antiphon.example', role: 'admin' },
  { email: 'scheduler@antiphon.example', role: 'scheduler' },
  { email: 'operator@arrowfell.example', role: 'operator', stationCode: 'Af' },
  { email: 'operator@brightmoor.example', role: 'operator', stationCode: 'Bm' },
  { email: 'operator@egretmesa.example', role: 'operator', stationCode: 'Em', isUnlisted: true },
  { email: 'operator@drumpoint.example', role: 'operator', stationCode: 'Dp', isUnlisted: true },
  { email: 'operator@fallowness.example', role: 'operator', stationCode: 'Fn', isUnlisted: true },
  { email: 'operator@cinderflat.example', role: 'operator', stationCode: 'Cf', isUnlisted: true },
  { email: 'correlator@antiphon.example', role: 'correlator' },
  {
    email: 'investigator@antiphon.example',
    role: 'investigator',
    sessionCodes: ['ARC-031', 'ARC-030', 'ARC-029'],
  },
];
