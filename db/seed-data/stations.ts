import type { stations } from '../schema/stations';

type Axis = readonly [minDeg: number, maxDeg: number, rateDegPerS: number, accelDegPerS2: number];
type Row = typeof stations.$inferInsert;

const station = (
  head: Pick<
    Row,
    'code' | 'name' | 'latitudeDeg' | 'longitudeDeg' | 'heightM' | 'dishM' | 'timeZone' | 'bits'
  > &
    Pick<Row, 'minElevationDeg' | 'maxElevationDeg' | 'settleSeconds'>,
  axis1: Axis,
  axis2: Axis,
): Row => ({
  ...head,
  mountKind: 'az-el',
  axis1MinDeg: axis1[0],
  axis1MaxDeg: axis1[1],
  axis1RateDegPerS: axis1[2],
  axis1AccelDegPerS2: axis1[3],
  axis2MinDeg: axis2[0],
  axis2MaxDeg: axis2[1],
  axis2RateDegPerS: axis2[2],
  axis2AccelDegPerS2: axis2[3],
});

/** Invented; Af and Bm are entered as az–el until other mounts can be. */
export const STATIONS: readonly Row[] = [
  station(
    {
      code: 'Em',
      name: 'Egret Mesa',
      latitudeDeg: 45.612,
      longitudeDeg: -109.874,
      heightM: 1420,
      dishM: 23,
      timeZone: 'America/Denver',
      bits: 2,
      minElevationDeg: 7,
      maxElevationDeg: 88,
      settleSeconds: 4,
    },
    [-85, 445, 0.8, 0.25],
    [5, 88, 0.6, 0.25],
  ),
  station(
    {
      code: 'Dp',
      name: 'Drum Point',
      latitudeDeg: 47.538,
      longitudeDeg: -67.921,
      heightM: 310,
      dishM: 31,
      timeZone: 'America/New_York',
      bits: 2,
      minElevationDeg: 6,
      maxElevationDeg: 87,
      settleSeconds: 4,
    },
    [-180, 360, 0.32, 0.08],
    [4, 88, 0.3, 0.08],
  ),
  station(
    {
      code: 'Fn',
      name: 'Fallow Ness',
      latitudeDeg: 58.417,
      longitudeDeg: -3.362,
      heightM: 45,
      dishM: 44,
      timeZone: 'Europe/London',
      bits: 2,
      minElevationDeg: 7,
      maxElevationDeg: 88,
      settleSeconds: 4,
    },
    [-90, 450, 0.33, 0.05],
    [4, 89, 0.3, 0.06],
  ),
  station(
    {
      code: 'Af',
      name: 'Arrow Fell',
      latitudeDeg: 54.183,
      longitudeDeg: 12.126,
      heightM: 62,
      dishM: 38,
      timeZone: 'Europe/Berlin',
      bits: 2,
      minElevationDeg: 9,
      maxElevationDeg: 89,
      settleSeconds: 2,
    },
    [-80, 440, 0.2262, 0.05],
    [5, 89.5, 0.2, 0.05],
  ),
  station(
    {
      code: 'Cf',
      name: 'Cinder Flat',
      latitudeDeg: -24.127,
      longitudeDeg: 21.643,
      heightM: 1130,
      dishM: 17,
      timeZone: 'Africa/Gaborone',
      bits: 1,
      minElevationDeg: 10,
      maxElevationDeg: 89,
      settleSeconds: 2,
    },
    [-270, 270, 2, 1],
    [6, 90, 1.2, 0.8],
  ),
  station(
    {
      code: 'Bm',
      name: 'Bright Moor',
      latitudeDeg: 64.094,
      longitudeDeg: 27.588,
      heightM: 205,
      dishM: 20,
      timeZone: 'Europe/Helsinki',
      bits: 2,
      minElevationDeg: 6,
      maxElevationDeg: 89,
      settleSeconds: 3,
    },
    [-200, 380, 1, 0.4],
    [3, 89, 0.8, 0.4],
  ),
];

/** Zenith SEFD per polarisation, Jy: [station, at 22 GHz, at 8.4 GHz]; null is not known. */
export const SEFDS: readonly (readonly [string, number, number | null])[] = [
  ['Em', 1150, 660],
  ['Dp', 1020, 640],
  ['Fn', 620, 430],
  ['Af', 480, 460],
  ['Cf', 1900, null],
  ['Bm', 1500, 1500],
];

/**
 * Invented: hills as [azimuth, elevation], what is recorded with, what is free (TB), the zenith opacity at 22 GHz, who
 * is on call.
 */
export const EQUIPMENT: readonly {
  code: string;
  horizon: readonly (readonly [number, number])[];
  formatter: string;
  recorder: string;
  recorderGbits: number;
  freeTB: number;
  channels: number;
  opacity: number;
  preScanSeconds: number;
  contacts: string;
}[] = [
  {
    code: 'Em',
    horizon: [],
    formatter: 'digital, 16 channels',
    recorder: 'disk pack',
    recorderGbits: 2.048,
    freeTB: 12.4,
    channels: 16,
    opacity: 0.05,
    preScanSeconds: 3,
    contacts: 'Control room: extension 11 (invented)',
  },
  {
    code: 'Dp',
    horizon: [
      [224, 6],
      [238, 8],
      [262, 9],
      [292, 7],
      [316, 6],
    ],
    formatter: 'digital, 8 channels',
    recorder: 'disk pack',
    recorderGbits: 1.024,
    freeTB: 8.1,
    channels: 8,
    opacity: 0.09,
    preScanSeconds: 5,
    contacts: 'Control room: extension 12 (invented)',
  },
  {
    code: 'Fn',
    horizon: [],
    formatter: 'digital, 16 channels',
    recorder: 'network store',
    recorderGbits: 4.096,
    freeTB: 63.5,
    channels: 16,
    opacity: 0.1,
    preScanSeconds: 3,
    contacts: 'Night desk: extension 13 (invented)',
  },
  {
    code: 'Af',
    horizon: [],
    formatter: 'digital, 16 channels',
    recorder: 'network store',
    recorderGbits: 4.096,
    freeTB: 41.8,
    channels: 16,
    opacity: 0.1,
    preScanSeconds: 3,
    contacts: 'Night desk: extension 14 (invented)',
  },
  {
    code: 'Cf',
    horizon: [],
    formatter: 'analogue, 1 bit',
    recorder: 'disk pack',
    recorderGbits: 0.256,
    freeTB: 3.1,
    channels: 8,
    opacity: 0.06,
    preScanSeconds: 8,
    contacts: 'Site keeper: extension 15 (invented)',
  },
  {
    code: 'Bm',
    horizon: [
      [20, 6],
      [40, 7],
      [70, 6],
    ],
    formatter: 'digital, 8 channels',
    recorder: 'disk pack',
    recorderGbits: 2.048,
    freeTB: 5.4,
    channels: 8,
    opacity: 0.08,
    preScanSeconds: 3,
    contacts: 'Duty phone: extension 16 (invented)',
  },
];
