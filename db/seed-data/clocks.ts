/**
 * Invented. Station clock minus UTC, via GPS, positive = early: the offset as it is at the moment of filling, its rate,
 * the age of the newest reading, the scatter, the delay of the instrument (null is not known) and what was read wrong.
 */
export const CLOCKS: readonly {
  code: string;
  offsetSeconds: number;
  rate: number;
  newestHours: number;
  scatterSeconds: number;
  instrument: readonly [seconds: number, sigmaSeconds: number] | null;
  counter: readonly [start: 'formatter' | 'gps', stop: 'formatter' | 'gps'];
  cables: readonly [stationSeconds: number, gpsSeconds: number];
  /** [which reading back from the newest, how far off, why it was set aside or null where no one did] */
  wrong: readonly (readonly [number, number, string | null])[];
}[] = [
  {
    code: 'Em',
    offsetSeconds: -1.207e-6,
    rate: -0.8e-12,
    newestHours: 5,
    scatterSeconds: 8e-9,
    instrument: [1.84e-6, 2e-8],
    counter: ['gps', 'formatter'],
    cables: [18e-9, 212e-9],
    wrong: [
      [51, 0.31e-6, null],
      [180, -0.27e-6, null],
    ],
  },
  {
    code: 'Dp',
    offsetSeconds: 4.862e-6,
    rate: 1.6e-12,
    newestHours: 3,
    scatterSeconds: 11e-9,
    instrument: [0.92e-6, 2e-8],
    counter: ['formatter', 'gps'],
    cables: [24e-9, 180e-9],
    wrong: [[77, 0.19e-6, 'GPS receiver restarted']],
  },
  {
    code: 'Fn',
    offsetSeconds: 0.441e-6,
    rate: 0.2e-12,
    newestHours: 2,
    scatterSeconds: 7e-9,
    instrument: [2.31e-6, 2e-8],
    counter: ['formatter', 'gps'],
    cables: [31e-9, 145e-9],
    wrong: [[140, -0.882e-6, 'typed with the wrong sign']],
  },
  {
    code: 'Af',
    offsetSeconds: 3.207e-6,
    rate: 0.667e-12,
    newestHours: 1,
    scatterSeconds: 9e-9,
    instrument: [1.12e-6, 2e-8],
    counter: ['formatter', 'gps'],
    cables: [22e-9, 198e-9],
    wrong: [[26, 0.229e-6, null]],
  },
  {
    code: 'Cf',
    offsetSeconds: -6.93e-6,
    rate: -3.1e-12,
    newestHours: 4,
    scatterSeconds: 18e-9,
    instrument: [-0.44e-6, 2e-7],
    counter: ['gps', 'formatter'],
    cables: [15e-9, 96e-9],
    wrong: [
      [12, 0.4e-6, null],
      [230, 0.36e-6, 'counter cable loose'],
    ],
  },
  {
    code: 'Bm',
    offsetSeconds: 2.075e-6,
    rate: 5.7e-12,
    newestHours: 31,
    scatterSeconds: 14e-9,
    instrument: null,
    counter: ['formatter', 'gps'],
    cables: [40e-9, 160e-9],
    wrong: [],
  },
];

export const CLOCK_DAYS = 60;
export const HOURS_BETWEEN = 4;

/** Invented: one clock was set anew, and says so. */
export const CLOCK_CHANGE = {
  code: 'Af',
  daysAgo: 8,
  stepSeconds: 0.62e-6,
  note: 'Formatter re-synchronised after a power cut.',
} as const;
