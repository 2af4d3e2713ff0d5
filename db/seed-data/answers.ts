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
