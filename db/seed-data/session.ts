import type { sessions } from '../schema/sessions';

type State = (typeof sessions.$inferSelect)['state'];

/** Invented. The draft's start; the dates of all are shifted by whole sidereal days, so that the sky stays the same. */
export const BASE_START = '2027-02-12T20:00:00Z';

/** Invented: one draft ahead of now, one published and under way, one observed. */
export const SESSIONS: readonly {
  code: string;
  title: string;
  state: State;
  daysBefore: number;
  purpose: string;
}[] = [
  {
    code: 'ARC-031',
    title: 'North arc, 22 GHz',
    state: 'draft',
    daysBefore: 0,
    purpose: 'Third epoch of the north arc, with one nodding pair.',
  },
  {
    code: 'ARC-030',
    title: 'North arc, 22 GHz, second epoch',
    state: 'published',
    daysBefore: 3,
    purpose: 'Second epoch of the north arc.',
  },
  {
    code: 'ARC-029',
    title: 'North arc, 22 GHz, first epoch',
    state: 'published',
    daysBefore: 10,
    purpose: 'First epoch of the north arc.',
  },
];

/** The same for all of them. */
export const SETTINGS = {
  lengthSeconds: 86_400,
  minElevationDeg: 5,
  leastSpareSeconds: 10,
  snrDoubtful: 7,
  snrFair: 10,
  snrStrong: 20,
  instrumentSigmaSeconds: 3e-7,
} as const;

/** The nodding group that stands in the place of this scan. */
export const NODDING = {
  scan: 11,
  calibrator: 'J0811+0146',
  calibratorOnSeconds: 20,
  targetOnSeconds: 36,
  turnSeconds: 40,
  cycles: 8,
} as const;

/** Minutes after the session's start, length in minutes, source, stations. The first is at 8.4 GHz. */
export const SCANS: readonly (readonly [number, number, string, string])[] = [
  [4, 10, 'J0555+3948', 'Em Dp Fn Af Cf Bm'],
  [20, 12, 'J0530+1331', 'Dp Fn Af Cf Bm'],
  [38, 10, 'J0827+5217', 'Em Dp Fn Bm'],
  [54, 12, 'J0751+3313', 'Dp Fn Af Cf Bm'],
  [72, 12, 'J0738+1742', 'Dp Fn Af Cf Bm'],
  [90, 10, 'J0555+3948', 'Em Dp Fn Af Cf Bm'],
  [107, 11, 'J0854+2006', 'Dp Fn Af Cf Bm'],
  [124, 12, 'J0751+3313', 'Dp Fn Af Cf Bm'],
  [142, 14, 'J0827+5217', 'Em Dp Fn Af Bm'],
  [162, 12, 'J0738+1742', 'Dp Fn Af Cf Bm'],
  [180, 12, 'J0825+0309', 'Dp Fn Af Cf Bm'],
  [232, 12, 'J0751+3313', 'Em Dp Fn Af Cf Bm'],
  [250, 10, 'J0927+3902', 'Em Dp Fn Af Cf Bm'],
  [266, 14, 'J0854+2006', 'Dp Fn Af Cf Bm'],
  [286, 12, 'J0738+1742', 'Em Dp Fn Af Cf Bm'],
  [302, 10, 'J1058+0133', 'Dp Fn Af Cf Bm'],
  [318, 12, 'J0751+3313', 'Em Dp Fn Af Bm'],
  [336, 10, 'J0854+2006', 'Em Dp Fn Af Cf Bm'],
  [370, 12, 'J0827+5217', 'Em Dp Fn Af Bm'],
  [389, 11, 'J1058+0133', 'Dp Fn Af Cf Bm'],
  [406, 12, 'J0927+3902', 'Em Dp Fn Af Bm'],
  [423, 11, 'J1159+2914', 'Em Dp Fn Af Cf Bm'],
  [441, 9, 'J0751+3313', 'Em Dp Fn Af Bm'],
  [456, 10, 'J1058+0133', 'Dp Fn Af Cf Bm'],
  [472, 7, 'J0927+3902', 'Em Dp Fn Af Bm'],
  [488, 11, 'J1159+2914', 'Em Dp Fn Af Cf Bm'],
  [508, 13, 'J0827+5217', 'Em Dp Fn Af Bm'],
  [529, 12, 'J0751+3313', 'Em Dp Fn Af Bm'],
  [549, 10, 'J0927+3902', 'Em Dp Fn Af Bm'],
  [567, 10, 'J0555+3948', 'Em Dp Fn Bm'],
  [585, 13, 'J0827+5217', 'Em Dp Fn Af Bm'],
  [610, 11, 'J1159+2914', 'Em Dp Fn Af Bm'],
  [629, 10, 'J0927+3902', 'Em Dp Fn Af Bm'],
  [647, 13, 'J0827+5217', 'Em Dp Fn Af Bm'],
  [668, 11, 'J1159+2914', 'Em Dp Fn Af Bm'],
  [687, 13, 'J0827+5217', 'Em Dp Fn Af Bm'],
  [708, 11, 'J1159+2914', 'Em Dp Fn Af Bm'],
  [727, 13, 'J0827+5217', 'Em Dp Fn Af Bm'],
  [748, 10, 'J0927+3902', 'Em Dp Fn Bm'],
  [766, 13, 'J0827+5217', 'Em Dp Fn Af Bm'],
  [787, 10, 'J0927+3902', 'Em Dp Fn Bm'],
  [805, 13, 'J0827+5217', 'Em Dp Fn Af Bm'],
  [826, 11, 'J1159+2914', 'Em Dp Fn'],
  [845, 13, 'J0827+5217', 'Em Dp Fn Af Bm'],
  [866, 11, 'J1058+0133', 'Em Dp'],
  [885, 13, 'J0827+5217', 'Em Dp Fn Af Bm'],
  [908, 10, 'J0555+3948', 'Em Fn Af Bm'],
  [926, 13, 'J0827+5217', 'Em Dp Fn Af Bm'],
  [947, 10, 'J0927+3902', 'Em Dp Bm'],
  [965, 13, 'J0827+5217', 'Em Dp Fn Af Bm'],
  [986, 12, 'J0751+3313', 'Em Bm'],
  [1006, 13, 'J0827+5217', 'Em Dp Fn Af Bm'],
  [1027, 10, 'J0555+3948', 'Fn Af Bm'],
  [1045, 13, 'J0827+5217', 'Em Dp Fn Af Bm'],
  [1066, 11, 'J1159+2914', 'Em Dp'],
  [1085, 13, 'J0827+5217', 'Em Fn Af Bm'],
  [1106, 12, 'J0751+3313', 'Fn Af Bm'],
  [1126, 10, 'J0927+3902', 'Em Fn Bm'],
  [1144, 10, 'J0530+1331', 'Af Cf Bm'],
  [1162, 13, 'J0827+5217', 'Em Fn Af Bm'],
  [1183, 10, 'J0555+3948', 'Fn Af Bm'],
  [1201, 12, 'J0738+1742', 'Fn Af Bm'],
  [1221, 12, 'J0751+3313', 'Fn Af Bm'],
  [1241, 12, 'J0738+1742', 'Fn Af Cf Bm'],
  [1261, 13, 'J0827+5217', 'Dp Fn Af Bm'],
  [1282, 10, 'J0555+3948', 'Dp Af Cf Bm'],
  [1300, 10, 'J0530+1331', 'Fn Af Cf Bm'],
  [1318, 11, 'J0854+2006', 'Fn Af Cf Bm'],
  [1337, 10, 'J0811+0146', 'Fn Af Cf Bm'],
  [1355, 12, 'J0751+3313', 'Fn Af Cf Bm'],
  [1375, 12, 'J0738+1742', 'Fn Af Cf Bm'],
  [1395, 10, 'J0555+3948', 'Dp Fn Af Cf Bm'],
  [1413, 10, 'J0530+1331', 'Dp Fn Af Cf Bm'],
];
