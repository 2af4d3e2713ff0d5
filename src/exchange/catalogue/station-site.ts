import { geodeticToItrf, itrfToGeodetic } from '../../sky/site';
import type { MountKind } from '../../sky/types';
import type { Block, FieldsOf, Wrong } from './block';
import { before } from './checks';
import {
  choiceField,
  numberField,
  optionalNumberField,
  neededField,
  refuse,
  textField,
  type Read,
} from './field';

export type PositionValues = {
  name: string;
  positionKind: 'geodetic' | 'itrf';
  latitudeDeg: number | null;
  longitudeDeg: number | null;
  heightM: number | null;
  itrfX: number | null;
  itrfY: number | null;
  itrfZ: number | null;
  positionSigmaM: number | null;
  positionEpoch: number | null;
  timeZone: string;
};

export type MountValues = {
  mountKind: MountKind;
  dishM: number;
  axisOffsetM: number;
  axis1MinDeg: number;
  axis1MaxDeg: number;
  axis1RateDegPerS: number;
  axis1AccelDegPerS2: number;
  axis2MinDeg: number;
  axis2MaxDeg: number;
  axis2RateDegPerS: number;
  axis2AccelDegPerS2: number;
  settleSeconds: number;
  minElevationDeg: number;
  maxElevationDeg: number;
  sunLimitDeg: number | null;
};

export type Sector = { name: string; minDeg: number; maxDeg: number };
export type Corner = { azimuthDeg: number; elevationDeg: number };
const LATITUDE = { label: 'Latitude', unit: '°', min: -90, max: 90 };
const LONGITUDE = { label: 'Longitude', unit: '°', min: -180, max: 180 };
const GEODETIC = ['latitudeDeg', 'longitudeDeg', 'heightM'] as const;
const ITRF = ['itrfX', 'itrfY', 'itrfZ'] as const;
/** Half of the Earth's radius: nothing nearer to its centre, nor farther out than this from its surface, is a station. */
const LEAST_RADIUS_M = 6_300_000;
const MOST_RADIUS_M = 6_420_000;

/** On the screen a minus is a minus. */
const shown = (text: string) => text.replaceAll('-', '\u2212');

export const position: Block<PositionValues> = {
  title: 'Identity and position',
  keep: 'Keep position',
  fields: {
    name: textField({ label: 'Name', isNeeded: true, longest: 80 }),
    timeZone: neededField(
      { label: 'Time zone', help: 'As Europe/Berlin; the second line of each time.' },
      readZone,
      (zone) => zone,
    ),
    positionKind: choiceField({
      label: 'Typed as',
      choices: [
        { value: 'geodetic', label: 'Latitude and longitude' },
        { value: 'itrf', label: 'ITRF X, Y, Z' },
      ],
    }),
    latitudeDeg: optionalNumberField({ ...LATITUDE, help: 'North is positive.' }),
    longitudeDeg: optionalNumberField({ ...LONGITUDE, help: 'East is positive.' }),
    heightM: optionalNumberField({ label: 'Height above the ellipsoid', unit: 'm', min: -500, max: 9000 }),
    itrfX: optionalNumberField({ label: 'X', unit: 'm', min: -MOST_RADIUS_M, max: MOST_RADIUS_M }),
    itrfY: optionalNumberField({ label: 'Y', unit: 'm', min: -MOST_RADIUS_M, max: MOST_RADIUS_M }),
    itrfZ: optionalNumberField({ label: 'Z', unit: 'm', min: -MOST_RADIUS_M, max: MOST_RADIUS_M }),
    positionSigmaM: optionalNumberField({ label: 'Uncertainty', unit: 'm', min: 0, max: 100_000 }),
    positionEpoch: optionalNumberField({ label: 'Epoch', unit: 'year', min: 1970, max: 2100 }),
  },
  rows: {},
  hides: ({ positionKind }) => (positionKind === 'itrf' ? GEODETIC : ITRF),
  check: (value) => {
    const names = value.positionKind === 'itrf' ? ITRF : GEODETIC;
    const missing = names.filter((name) => value[name] === null);
    if (missing.length > 0) {
      return missing.map((name) => ({ field: name, message: `“${labelOf(name)}” is empty. Type it.` }));
    }
    return value.positionKind === 'itrf' ? itrfProblem(value) : [];
  },
  note: (value) => {
    const place = placeOf(value);
    if (value.positionKind === 'itrf') {
      return shown(
        `Latitude ${place.latitudeDeg.toFixed(6)}°, longitude ${place.longitudeDeg.toFixed(6)}°, height ${place.heightM.toFixed(2)} m follow.`,
      );
    }
    const { x, y, z } = geodeticToItrf(place);
    return shown(`ITRF X ${x.toFixed(2)}, Y ${y.toFixed(2)}, Z ${z.toFixed(2)} m follow.`);
  },
};

/** How a mount's kind and its axes are called; axis 1 turns about a fixed line, axis 2 rides on it. */
export const MOUNT_WORDS: Readonly<
  Record<MountKind, { kind: string; short: string; 1: string; 2: string; note: string | null }>
> = {
  'az-el': { kind: 'Az–el', short: 'az–el', 1: 'Azimuth', 2: 'Elevation axis', note: null },
  'ha-dec': {
    kind: 'HA–Dec',
    short: 'equatorial',
    1: 'Hour angle',
    2: 'Declination',
    note: 'Hour angle in degrees, 15° to the hour, positive west of the meridian.',
  },
  'xy-ns': {
    kind: 'X–Y, north–south',
    short: 'X–Y',
    1: 'X',
    2: 'Y',
    note: 'The lower axis lies north–south. Both angles are 0° at the zenith; X is positive toward east, Y toward north.',
  },
  'xy-ew': {
    kind: 'X–Y, east–west',
    short: 'X–Y',
    1: 'X',
    2: 'Y',
    note: 'The lower axis lies east–west. Both angles are 0° at the zenith; X is positive toward north, Y toward east.',
  },
};

const kindIn = (typed: unknown): MountKind =>
  typed === 'ha-dec' || typed === 'xy-ns' || typed === 'xy-ew' ? typed : 'az-el';

/** An equatorial or X–Y mount has no more than half a turn of axis 2, and one turn of axis 1. */
function reachProblems(value: MountValues): Wrong[] {
  const { mountKind } = value;
  if (mountKind === 'az-el') {
    const message = 'The elevation axis goes from −10° to 180°.';
    return value.axis2MinDeg < -10 ? [{ field: 'axis2MinDeg', message }] : [];
  }
  const words = MOUNT_WORDS[mountKind];
  const beyond = (field: keyof MountValues, deg: number, most: number, name: string) =>
    Math.abs(deg) > most ? [{ field, message: `${name} goes from −${most}° to ${most}°.` }] : [];
  return [
    ...beyond('axis1MinDeg', value.axis1MinDeg, 180, words[1]),
    ...beyond('axis1MaxDeg', value.axis1MaxDeg, 180, words[1]),
    ...beyond('axis2MinDeg', value.axis2MinDeg, 90, words[2]),
    ...beyond('axis2MaxDeg', value.axis2MaxDeg, 90, words[2]),
  ];
}

const axisFields = <A extends 1 | 2>(axis: A, limits: { min: number; max: number }) =>
  ({
    [`axis${axis}MinDeg`]: numberField({ label: `Axis ${axis} from`, unit: '°', ...limits }),
    [`axis${axis}MaxDeg`]: numberField({ label: `Axis ${axis} to`, unit: '°', ...limits }),
    [`axis${axis}RateDegPerS`]: numberField({ label: `Axis ${axis} rate`, unit: '°/s', above: 0, max: 20 }),
    [`axis${axis}AccelDegPerS2`]: numberField({
      label: `Axis ${axis} start`,
      unit: '°/s²',
      above: 0,
      max: 20,
    }),
  }) as FieldsOf<Pick<MountValues, `axis${A}${'MinDeg' | 'MaxDeg' | 'RateDegPerS' | 'AccelDegPerS2'}`>>;

export const mount: Block<MountValues> = {
  title: 'Mount, limits and rates',
  keep: 'Keep mount',
  fields: {
    mountKind: choiceField({
      label: 'Kind of mount',
      choices: [
        { value: 'az-el', label: MOUNT_WORDS['az-el'].kind },
        { value: 'ha-dec', label: MOUNT_WORDS['ha-dec'].kind },
        { value: 'xy-ns', label: MOUNT_WORDS['xy-ns'].kind },
        { value: 'xy-ew', label: MOUNT_WORDS['xy-ew'].kind },
      ],
    }),
    dishM: numberField({ label: 'Dish', unit: 'm', above: 0, max: 500 }),
    axisOffsetM: numberField({ label: 'Axis offset', unit: 'm', min: -50, max: 50 }),
    ...axisFields(1, { min: -720, max: 720 }),
    ...axisFields(2, { min: -90, max: 180 }),
    settleSeconds: numberField({ label: 'Settling', unit: 's', min: 0, max: 600 }),
    minElevationDeg: numberField({ label: 'Lowest elevation', unit: '°', min: 0, max: 90 }),
    maxElevationDeg: numberField({ label: 'Highest elevation', unit: '°', min: 0, max: 90 }),
    sunLimitDeg: optionalNumberField({ label: 'Nearest to the Sun', unit: '°', min: 0, max: 180 }),
  },
  rows: {},
  labels: (typed) => {
    const words = MOUNT_WORDS[kindIn(typed.mountKind)];
    return Object.fromEntries(
      ([1, 2] as const).flatMap((axis) => [
        [`axis${axis}MinDeg`, `${words[axis]} from`],
        [`axis${axis}MaxDeg`, `${words[axis]} to`],
        [`axis${axis}RateDegPerS`, `${words[axis]} rate`],
        [`axis${axis}AccelDegPerS2`, `${words[axis]} start`],
      ]),
    );
  },
  note: ({ mountKind }) => MOUNT_WORDS[mountKind].note,
  check: (value) => [
    ...reachProblems(value),
    ...before(
      'axis1MaxDeg',
      value.axis1MinDeg,
      value.axis1MaxDeg,
      `${MOUNT_WORDS[value.mountKind][1]} ends before it begins.`,
    ),
    ...before(
      'axis2MaxDeg',
      value.axis2MinDeg,
      value.axis2MaxDeg,
      `${MOUNT_WORDS[value.mountKind][2]} ends before it begins.`,
    ),
    ...before(
      'maxElevationDeg',
      value.minElevationDeg,
      value.maxElevationDeg,
      'The highest elevation is not above the lowest.',
    ),
  ],
};

export const wrap: Block<Record<never, never>, { wrapSectors: Sector }> = {
  title: 'Axis range and cable wrap',
  keep: 'Keep sectors',
  fields: {},
  rows: {
    wrapSectors: {
      kind: 'rows',
      label: 'Named sectors of the motor’s azimuth',
      add: 'Add a sector',
      most: 12,
      columns: {
        name: textField({ label: 'Sector', isNeeded: true, longest: 24 }),
        minDeg: numberField({ label: 'From', unit: '°', min: -720, max: 720 }),
        maxDeg: numberField({ label: 'To', unit: '°', min: -720, max: 720 }),
      },
    },
  },
  check: ({ wrapSectors }) =>
    wrapSectors.flatMap(({ minDeg, maxDeg }, index) =>
      before(`wrapSectors.${index}.maxDeg`, minDeg, maxDeg, 'The sector ends before it begins.'),
    ),
};

export const horizon: Block<Record<never, never>, { horizon: Corner }> = {
  title: 'Horizon mask',
  keep: 'Keep mask',
  fields: {},
  rows: {
    horizon: {
      kind: 'rows',
      label: 'Corners',
      help: 'Straight lines between corners, closed at 360°. Two corners at one azimuth make an upright step. Two columns from a sheet can be pasted.',
      add: 'Add a corner',
      most: 720,
      columns: {
        azimuthDeg: numberField({ label: 'Azimuth', unit: '°', min: 0, below: 360 }),
        elevationDeg: numberField({ label: 'Elevation', unit: '°', min: 0, max: 90 }),
      },
    },
  },
  check: (value) =>
    value.horizon.flatMap(({ azimuthDeg }, index) =>
      value.horizon.filter((other, at) => at < index && other.azimuthDeg === azimuthDeg).length >= 2
        ? [
            {
              field: `horizon.${index}.azimuthDeg`,
              message: `Azimuth ${azimuthDeg}° stands three times. An upright step has two corners.`,
            },
          ]
        : [],
    ),
};

/**
 * The geodetic place of a position that passed its check.
 *
 * @throws RangeError where a coordinate of its kind is missing (programmer error)
 */
export function placeOf(value: PositionValues): {
  latitudeDeg: number;
  longitudeDeg: number;
  heightM: number;
} {
  const { itrfX: x, itrfY: y, itrfZ: z, latitudeDeg, longitudeDeg, heightM } = value;
  if (value.positionKind === 'itrf' && x !== null && y !== null && z !== null) {
    return itrfToGeodetic({ x, y, z });
  }
  if (latitudeDeg === null || longitudeDeg === null || heightM === null) {
    throw new RangeError('A position without its coordinates');
  }
  return { latitudeDeg, longitudeDeg, heightM };
}

function itrfProblem({ itrfX, itrfY, itrfZ }: PositionValues): Wrong[] {
  const radiusM = Math.hypot(itrfX ?? 0, itrfY ?? 0, itrfZ ?? 0);
  if (radiusM >= LEAST_RADIUS_M && radiusM <= MOST_RADIUS_M) return [];
  const km = Math.round(radiusM / 1000);
  return [
    {
      field: 'itrfX',
      message: `X, Y, Z lie ${km} km from the Earth’s centre. The ground lies 6357 to 6385 km from it. Are they in metres?`,
    },
  ];
}

const labelOf = (name: (typeof GEODETIC)[number] | (typeof ITRF)[number]) => position.fields[name].label;

function readZone(text: string): Read<string> {
  const zone = text.trim();
  try {
    return { ok: true, value: new Intl.DateTimeFormat('en', { timeZone: zone }).resolvedOptions().timeZone };
  } catch {
    return refuse(`“${zone.slice(0, 40)}” is no time zone. Type a region and a city, as Europe/Berlin.`);
  }
}
