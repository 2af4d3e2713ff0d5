import type { Block } from './block';
import { bandField } from './band-field';
import { doubles } from './checks';
import {
  choiceField,
  numberField,
  numberIn,
  numberOut,
  optionalNumberField,
  readField,
  refuse,
  textField,
  type Read,
} from './field';
import { optionalTimeField } from './time-field';

type Feeds = 'circular' | 'linear';
export type GainPoint = readonly [elevationDeg: number, gain: number];
export type StationBand = {
  band: string;
  sefdJy: number;
  feeds: Feeds;
  zenithOpacity: number | null;
  gainCurve: readonly GainPoint[];
};
export type Pulse = 'formatter' | 'maser' | 'gps';
export type WiringValues = {
  counterStart: Pulse;
  counterStop: Pulse;
  stationCableSeconds: number;
  gpsCableSeconds: number;
};
export type RecordingValues = {
  bits: '1' | '2';
  maxChannels: number | null;
  maxBitsPerS: number | null;
  formatter: string;
  recorder: string;
  recorderBitsPerS: number | null;
  recorderFreeBytes: number | null;
  preScanSeconds: number;
  calibrationSeconds: number;
};
export type AllowanceValues = {
  instrumentDelaySeconds: number | null;
  instrumentDelaySigmaSeconds: number | null;
  instrumentDelayFromMs: number | null;
  stabilityFloor: number;
  driftPerDay: number;
};
export const bands: Block<Record<never, never>, { bands: StationBand }> = {
  title: 'Sensitivity by band',
  keep: 'Keep sensitivity',
  fields: {},
  rows: {
    bands: {
      kind: 'rows',
      label: 'Bands',
      help: 'The SEFD is at the zenith, for one polarisation. A gain curve is pairs of elevation and relative gain: 20 0.91, 50 1, 80 0.97.',
      add: 'Add a band',
      most: 30,
      columns: {
        band: bandField,
        sefdJy: numberField({ label: 'SEFD', unit: 'Jy', above: 0, max: 10_000_000 }),
        feeds: choiceField({
          label: 'Feeds',
          choices: [
            { value: 'circular', label: 'circular' },
            { value: 'linear', label: 'linear' },
          ],
        }),
        zenithOpacity: optionalNumberField({ label: 'Opacity', unit: 'neper', min: 0, max: 10 }),
        gainCurve: readField({ label: 'Gain curve' }, readGain, gainText),
      },
    },
  },
  check: (value) =>
    doubles(
      'bands',
      'band',
      value.bands.map(({ band }) => band),
    ),
};

const PULSES = [
  { value: 'formatter', label: 'Formatter' },
  { value: 'maser', label: 'Maser' },
  { value: 'gps', label: 'GPS receiver' },
] as const;

export const wiring: Block<WiringValues> = {
  title: 'Counter wiring',
  keep: 'Keep wiring',
  fields: {
    counterStart: choiceField<Pulse>({ label: 'Starts the count', choices: PULSES }),
    counterStop: choiceField<Pulse>({ label: 'Stops the count', choices: PULSES }),
    stationCableSeconds: numberField({
      label: 'Station pulse, cable',
      unit: 'ns',
      min: 0,
      max: 1e6,
      scale: 1e-9,
    }),
    gpsCableSeconds: numberField({ label: 'GPS pulse, cable', unit: 'ns', min: 0, max: 1e6, scale: 1e-9 }),
  },
  rows: {},
  check: ({ counterStart, counterStop }) =>
    (counterStart === 'gps') === (counterStop === 'gps')
      ? [
          {
            field: 'counterStop',
            message:
              'One of the two pulses comes from the GPS receiver, the other from the station. Change one of them.',
          },
        ]
      : [],
  note: wiringSentence,
};

export const recording: Block<RecordingValues> = {
  title: 'Recording',
  keep: 'Keep recording',
  fields: {
    bits: choiceField({
      label: 'Bits of a sample',
      choices: [
        { value: '1', label: '1 bit' },
        { value: '2', label: '2 bit' },
      ],
    }),
    formatter: textField({ label: 'Formatter', longest: 60 }),
    maxChannels: optionalNumberField({ label: 'Most channels', min: 1, max: 1024, isWhole: true }),
    maxBitsPerS: optionalNumberField({ label: 'Highest rate', unit: 'Mb/s', above: 0, max: 1e6, scale: 1e6 }),
    recorder: textField({ label: 'Recorder', longest: 60 }),
    recorderBitsPerS: optionalNumberField({
      label: 'Recorder rate',
      unit: 'Mb/s',
      above: 0,
      max: 1e6,
      scale: 1e6,
    }),
    recorderFreeBytes: optionalNumberField({ label: 'Free', unit: 'TB', min: 0, max: 1e5, scale: 1e12 }),
    preScanSeconds: numberField({ label: 'Before a scan', unit: 's', min: 0, max: 3600 }),
    calibrationSeconds: numberField({ label: 'Calibration', unit: 's', min: 0, max: 3600 }),
  },
  rows: {},
};

export const allowances: Block<AllowanceValues> = {
  title: 'Instrument delay and clock allowances',
  keep: 'Keep allowances',
  fields: {
    instrumentDelaySeconds: optionalNumberField({
      label: 'Instrument delay',
      unit: 'µs',
      min: -1000,
      max: 1000,
      scale: 1e-6,
      help: 'From the pulse to the recorded signal, learned from fringes.',
    }),
    instrumentDelaySigmaSeconds: optionalNumberField({
      label: 'Its uncertainty',
      unit: 'µs',
      min: 0,
      max: 1000,
      scale: 1e-6,
    }),
    instrumentDelayFromMs: optionalTimeField({ label: 'It holds from, UT' }),
    stabilityFloor: numberField({ label: 'Stability floor', above: 0, max: 1e-6 }),
    driftPerDay: numberField({ label: 'Possible drift', unit: 'a day', min: 0, max: 1e-6 }),
  },
  rows: {},
  check: ({ instrumentDelaySeconds: delay, instrumentDelaySigmaSeconds: sigma }) => {
    if ((delay === null) === (sigma === null)) return [];
    return delay === null
      ? [{ field: 'instrumentDelaySeconds', message: 'The uncertainty has no delay. Type both, or neither.' }]
      : [
          {
            field: 'instrumentDelaySigmaSeconds',
            message: 'The delay has no uncertainty. Type both, or neither.',
          },
        ];
  },
};

/** How the counter's wiring turns what it shows into an offset, and what its sign means. */
export function wiringSentence(wiring: WiringValues): string {
  const isGpsFirst = wiring.counterStart === 'gps';
  const cable = (seconds: number) => `${(seconds * 1e9).toFixed(1)} ns`;
  return `Started by ${isGpsFirst ? 'GPS' : 'the station'}: offset = ${isGpsFirst ? '\u2212interval' : 'interval'} + ${cable(wiring.stationCableSeconds)} \u2212 ${cable(wiring.gpsCableSeconds)}. A positive offset means that the station is EARLY.`;
}

function readGain(text: string): Read<GainPoint[]> {
  const pairs = text
    .split(/[;,\n]/)
    .map((pair) => pair.trim())
    .filter(Boolean);
  const points: GainPoint[] = [];
  for (const pair of pairs) {
    const [elevationDeg, gain, ...more] = pair.split(/[\s:]+/).map(numberIn);
    if (
      elevationDeg === undefined ||
      elevationDeg === null ||
      gain === undefined ||
      gain === null ||
      more.length > 0
    )
      return refuse(`“${pair.slice(0, 30)}” is no pair. Type elevation and gain as 20 0.91, 50 1.`);
    if (elevationDeg < 0 || elevationDeg > 90 || gain <= 0 || gain > 2)
      return refuse(`“${pair}” is out of range. Elevations lie between 0 and 90°, gains between 0 and 2.`);
    points.push([elevationDeg, gain]);
  }
  points.sort(([a], [b]) => a - b);
  return { ok: true, value: points };
}

function gainText(curve: readonly GainPoint[]): string {
  return curve.map(([elevationDeg, gain]) => `${numberOut(elevationDeg)} ${numberOut(gain)}`).join(', ');
}
