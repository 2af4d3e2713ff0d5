import type { SourceRole } from '../../schedule/context';
import {
  declinationText,
  readDeclination,
  readRightAscension,
  rightAscensionText,
} from '../../units/sexagesimal';
import { bandField } from './band-field';
import type { Block } from './block';
import { doubles } from './checks';
import {
  choiceField,
  neededField,
  numberField,
  numberOut,
  optionalNumberField,
  readField,
  refuse,
  textField,
} from './field';

export type SourceValues = {
  name: string;
  aliases: readonly string[];
  role: SourceRole;
  raDeg: number;
  decDeg: number;
  properMotionEastMas: number | null;
  properMotionNorthMas: number | null;
  parallaxMas: number | null;
};

export type SourceBand = { band: string; fluxJy: number; sizeMas: number | null };

export type Component = {
  band: string;
  fluxJy: number;
  majorMas: number;
  minorMas: number;
  positionAngleDeg: number;
  eastMas: number;
  northMas: number;
};

export const ROLE_CHOICES: readonly { value: SourceRole; label: string }[] = [
  { value: 'target', label: 'Target' },
  { value: 'phase-ref', label: 'Phase ref' },
  { value: 'finder', label: 'Fringe finder' },
  { value: 'polarisation', label: 'Polarisation calibrator' },
];

const place: Block<SourceValues> = {
  title: 'Name and place',
  keep: 'Keep place',
  fields: {
    name: textField({ label: 'Name', isNeeded: true, longest: 40 }),
    aliases: readField(
      { label: 'Other names', help: 'With commas between.' },
      (text) => {
        const names = [...new Set(text.split(',').map((name) => name.trim()))].filter(Boolean);
        const long = names.find((name) => name.length > 40);
        if (long !== undefined)
          return refuse(`“${long.slice(0, 40)}…” is longer than 40 letters. Shorten it.`);
        if (names.length > 20) return refuse(`${names.length} other names are given. At most 20 are kept.`);
        return { ok: true, value: names };
      },
      (names) => names.join(', '),
    ),
    role: choiceField({ label: 'Role', choices: ROLE_CHOICES }),
    raDeg: neededField(
      { label: 'Right ascension, ICRS', help: 'Hours as 08 25 50.338, or degrees.' },
      readRightAscension,
      rightAscensionOut,
      (raDeg) => `${rightAscensionText(raDeg)} = ${raDeg.toFixed(6)}°`,
    ),
    decDeg: neededField(
      { label: 'Declination, ICRS', help: 'As +03 09 24.5, or degrees.' },
      readDeclination,
      declinationOut,
      (decDeg) => `${declinationText(decDeg)} = ${decDeg.toFixed(6).replace('-', '\u2212')}°`,
    ),
    properMotionEastMas: optionalNumberField({
      label: 'Motion to the east',
      unit: 'mas a year',
      min: -20_000,
      max: 20_000,
      help: 'Times the cosine of the declination.',
    }),
    properMotionNorthMas: optionalNumberField({
      label: 'Motion to the north',
      unit: 'mas a year',
      min: -20_000,
      max: 20_000,
    }),
    parallaxMas: optionalNumberField({ label: 'Parallax', unit: 'mas', min: 0, max: 1000 }),
  },
  rows: {},
  check: ({ properMotionEastMas: east, properMotionNorthMas: north }) => {
    if ((east === null) === (north === null)) return [];
    const field = east === null ? 'properMotionEastMas' : 'properMotionNorthMas';
    return [{ field, message: 'A motion has two parts. Type both, or neither.' }];
  },
};

const flux: Block<Record<never, never>, { bands: SourceBand; components: Component }> = {
  title: 'Flux and size by band',
  keep: 'Keep flux',
  fields: {},
  rows: {
    bands: {
      kind: 'rows',
      label: 'Bands',
      help: 'The size is the width at half maximum of a round Gaussian; empty is a point.',
      add: 'Add a band',
      most: 30,
      columns: {
        band: bandField,
        fluxJy: numberField({ label: 'Flux', unit: 'Jy', above: 0, max: 1e6 }),
        sizeMas: optionalNumberField({ label: 'Size', unit: 'mas', above: 0, max: 1e6 }),
      },
    },
    components: {
      kind: 'rows',
      label: 'Components',
      help: 'Where a band has components, they stand for its flux and size.',
      add: 'Add a component',
      most: 50,
      columns: {
        band: bandField,
        fluxJy: numberField({ label: 'Flux', unit: 'Jy', above: 0, max: 1e6 }),
        majorMas: numberField({ label: 'Major', unit: 'mas', min: 0, max: 1e6 }),
        minorMas: numberField({ label: 'Minor', unit: 'mas', min: 0, max: 1e6 }),
        positionAngleDeg: numberField({ label: 'Angle', unit: '°', min: -180, max: 180 }),
        eastMas: numberField({ label: 'East', unit: 'mas', min: -1e6, max: 1e6 }),
        northMas: numberField({ label: 'North', unit: 'mas', min: -1e6, max: 1e6 }),
      },
    },
  },
  check: ({ bands, components }) => [
    ...doubles(
      'bands',
      'band',
      bands.map(({ band }) => band),
    ),
    ...components.flatMap(({ band, majorMas, minorMas }, index) => [
      ...(bands.some((one) => one.band === band)
        ? []
        : [
            {
              field: `components.${index}.band`,
              message: `${band} is not among the bands above. Add it there, with its whole flux.`,
            },
          ]),
      ...(minorMas > majorMas
        ? [{ field: `components.${index}.minorMas`, message: 'The minor axis is longer than the major one.' }]
        : []),
    ]),
  ],
};

/** A source's blocks by name, in the order of its page; a new one is asked both. */
export const SOURCE_BLOCKS = { place, flux } as const;

/** As it is best read, where that gives back the same place to 0.1 µas; else in degrees. */
function rightAscensionOut(raDeg: number): string {
  const text = rightAscensionText(raDeg);
  return isSame(readRightAscension(text), raDeg) ? text : numberOut(raDeg);
}

function declinationOut(decDeg: number): string {
  const text = declinationText(decDeg).replace('\u2212', '-');
  return isSame(readDeclination(text), decDeg) ? text : numberOut(decDeg);
}

const isSame = (read: { ok: boolean; value?: number }, deg: number) =>
  read.ok && Math.abs((read.value ?? NaN) - deg) < 1e-7 / 3600;
