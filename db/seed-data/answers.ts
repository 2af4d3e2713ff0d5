/** Invented: what the stations said to the offer of each session, and how their scans went. */
export const REPLIES: readonly {
  session: string;
  station: string;
  reply: 'confirmed' | 'partly' | 'declined';
  /** minutes after the session's start that the station cannot */
  without?: readonly [number, number];
  reason?: string;
  isOnBehalf?: boolean;
}[] = [
  { session: 'ARC-029', station: 'Em', reply: 'confirmed' },
  { session: 'ARC-029', station: 'Dp', reply: 'confirmed' },
  { session: 'ARC-029', station: 'Fn', reply: 'confirmed' },
  { session: 'ARC-029', station: 'Af', reply: 'confirmed' },
  { session: 'ARC-029', station: 'Cf', reply: 'partly', without: [170, 220], reason: 'generator service' },
  { session: 'ARC-029', station: 'Bm', reply: 'confirmed' },
  { session: 'ARC-030', station: 'Em', reply: 'confirmed' },
  { session: 'ARC-030', station: 'Dp', reply: 'confirmed' },
  { session: 'ARC-030', station: 'Fn', reply: 'confirmed', isOnBehalf: true },
  { session: 'ARC-030', station: 'Af', reply: 'confirmed' },
  { session: 'ARC-030', station: 'Cf', reply: 'partly', without: [170, 220], reason: 'generator service' },
];

/** Scans that did not go well; the others of the stations that speak were good. */
export const MISHAPS: readonly {
  session: string;
  station: string;
  scan: number;
  outcome: 'partly' | 'lost';
  /** the share of the scan that was lost, from its start */
  share: number;
  reason: 'wind' | 'recorder' | 'antenna' | 'interference';
  text: string;
}[] = [
  { session: 'ARC-029', station: 'Fn', scan: 33, outcome: 'partly', share: 0.4, reason: 'wind', text: '' },
  {
    session: 'ARC-029',
    station: 'Fn',
    scan: 34,
    outcome: 'lost',
    share: 1,
    reason: 'wind',
    text: 'Stowed at 62 km/h.',
  },
  { session: 'ARC-029', station: 'Fn', scan: 35, outcome: 'lost', share: 1, reason: 'wind', text: '' },
  {
    session: 'ARC-029',
    station: 'Cf',
    scan: 24,
    outcome: 'lost',
    share: 1,
    reason: 'recorder',
    text: 'Module full.',
  },
  {
    session: 'ARC-029',
    station: 'Bm',
    scan: 12,
    outcome: 'partly',
    share: 0.25,
    reason: 'antenna',
    text: '',
  },
  {
    session: 'ARC-030',
    station: 'Af',
    scan: 27,
    outcome: 'partly',
    share: 0.3,
    reason: 'interference',
    text: '',
  },
];

/** Stations that said nothing about the session's last scans: how many. */
export const UNSAID: readonly (readonly [session: string, station: string, scans: number])[] = [
  ['ARC-029', 'Bm', 2],
  ['ARC-030', 'Af', 1],
  ['ARC-030', 'Cf', 3],
];

/** Invented: what was said of the sessions, in hours from their start. */
export const COMMENTS: readonly {
  session: string;
  account: string;
  hours: number;
  text: string;
}[] = [
  {
    session: 'ARC-029',
    account: 'operator@cinderflat.example',
    hours: -150,
    text: 'The generator is serviced from 22:50 to 23:40. The rest of the night is staffed.',
  },
  {
    session: 'ARC-029',
    account: 'investigator@antiphon.example',
    hours: -96,
    text: 'Scan 24 gives the only long north–south baselines to J0827+5217. If Cf has to leave something out, let it be another.',
  },
  {
    session: 'ARC-029',
    account: 'operator@fallowness.example',
    hours: 12,
    text: 'Wind above 60 km/h since 07:30, dish stowed until it drops.',
  },
  {
    session: 'ARC-029',
    account: 'correlator@antiphon.example',
    hours: 74,
    text: 'Disks of five stations are here. Cf follows by courier.',
  },
  {
    session: 'ARC-030',
    account: 'scheduler@antiphon.example',
    hours: -70,
    text: 'Version 2 is the same plan as the first epoch, three sidereal days later.',
  },
];
