import { describe, expect, it } from 'vitest';
import { bandField } from '@/src/exchange/catalogue/band-field';
import { readBlock, writeBlock } from '@/src/exchange/catalogue/block';
import {
  choiceField,
  numberField,
  numberIn,
  optionalNumberField,
  textField,
} from '@/src/exchange/catalogue/field';
import { MODE_BLOCKS } from '@/src/exchange/catalogue/mode';
import { STATION_BLOCKS, type StationBlockName } from '@/src/exchange/catalogue/station';
import { placeOf, type PositionValues } from '@/src/exchange/catalogue/station-site';
import { wiringSentence } from '@/src/exchange/catalogue/station-signal';
import { timeField } from '@/src/exchange/catalogue/time-field';
import { foldCounter, offsetFromCounter } from '@/src/clock/reading';

const latitude = numberField({ label: 'Latitude', unit: '°', min: -90, max: 90 });

describe('a number', () => {
  it.each([
    ['54.2', 54.2],
    [' \u221254,2 ', -54.2],
    ['1 023.5', 1023.5],
    ['2e-14', 2e-14],
    ['.5', 0.5],
  ])('%s is read', (text, value) => expect(numberIn(text)).toBe(value));

  it.each(['', '12 m', '1.2.3', 'NaN', '0x10', '--1', '1e999'])('“%s” is none', (text) =>
    expect(numberIn(text)).toBeNull(),
  );

  it('out of its limits is refused with them, and with the point moved where that fits', () => {
    expect(latitude.read('542.03')).toEqual({
      ok: false,
      message:
        '542.03 is out of range. “Latitude” lies between \u221290 and 90°. Is the point in the wrong place?',
      mend: '54.203',
    });
    const dish = numberField({ label: 'Dish', unit: 'm', above: 0 });
    expect(dish.read('-3')).toEqual({ ok: false, message: '-3 is out of range. “Dish” is more than 0 m.' });
  });

  it('is stored in its unit and written back as it was typed', () => {
    const cable = numberField({ label: 'Cable', unit: 'ns', scale: 1e-9 });
    for (const text of ['61.4', '148', '0.1', '-3.000001']) {
      const read = cable.read(text);
      if (!read.ok) throw new Error(read.message);
      expect(cable.write(read.value)).toBe(text);
    }
    expect(cable.read('61.4')).toEqual({ ok: true, value: 61.4e-9 });
  });

  it('may be left out only where it is optional', () => {
    expect(optionalNumberField({ label: 'Epoch' }).read(' ')).toEqual({ ok: true, value: null });
    expect(latitude.read(' ')).toMatchObject({ ok: false });
  });
});

describe('other fields', () => {
  it.each([
    ['2027-02-18 07:00', '2027-02-18T07:00:00Z'],
    ['2027-049 07:00:30', '2027-02-18T07:00:30Z'],
    ['2027-02-18 (049) 07:00 UT', '2027-02-18T07:00:00Z'],
    ['2028-366', '2028-12-31T00:00:00Z'],
  ])('a time %s is read and written back', (text, iso) => {
    const field = timeField({ label: 'From' });
    const read = field.read(text);
    expect(read).toEqual({ ok: true, value: Date.parse(iso) });
    expect(field.read(field.write(Date.parse(iso)))).toEqual(read);
  });

  it.each(['', '07:00', '2027-02-30 07:00', '2027-366 07:00', '2027-02-18 24:00', '18.2.2027'])(
    'a time “%s” is refused',
    (text) => expect(timeField({ label: 'From' }).read(text)).toMatchObject({ ok: false }),
  );

  it('a band is written one way', () => {
    expect(bandField.read('22ghz')).toEqual({ ok: true, value: '22 GHz' });
    expect(bandField.read('8,40 GHz')).toEqual({ ok: true, value: '8.4 GHz' });
    expect(bandField.read('K')).toMatchObject({ ok: false });
    expect(bandField.read('')).toEqual({ ok: false, message: '“Band” is empty. Type it.' });
  });

  it('text keeps to its length, a choice to its words', () => {
    expect(textField({ label: 'Name', longest: 3 }).read('four')).toMatchObject({ ok: false });
    const role = choiceField({ label: 'Role', choices: [{ value: 'a', label: 'A' }] });
    expect(role.read('b')).toEqual({ ok: false, message: 'Choose one for “Role”: A.' });
  });
});

describe('a block', () => {
  it.each([null, 7, 'text', [], { bands: 'x' }, { bands: [7, null] }])(
    'is read of %j without a fault',
    (typed) => {
      for (const name of Object.keys(STATION_BLOCKS) as StationBlockName[]) {
        expect(typeof readBlock(STATION_BLOCKS[name] as typeof STATION_BLOCKS.contacts, typed).ok).toBe(
          'boolean',
        );
      }
    },
  );

  it('names a wrong cell by table, row and column', () => {
    const typed = {
      horizon: [
        { azimuthDeg: '10', elevationDeg: '5' },
        { azimuthDeg: 'x', elevationDeg: '5' },
      ],
    };
    const read = readBlock(STATION_BLOCKS.horizon, typed);
    expect(read).toMatchObject({ ok: false, wrong: [{ field: 'horizon.1.azimuthDeg' }] });
  });

  it('gives its values back through its text', () => {
    const value = {
      channels: [
        { edgeHz: 22.203e9, sideband: 'upper', polarisation: 'R', bandwidthHz: 32e6, bits: '2' },
        { edgeHz: 22.203e9, sideband: 'upper', polarisation: 'L', bandwidthHz: 32e6, bits: '2' },
      ],
    } as const;
    expect(readBlock(MODE_BLOCKS.channels, writeBlock(MODE_BLOCKS.channels, value))).toEqual({
      ok: true,
      value,
    });
  });
});

describe('a position', () => {
  it('typed as X, Y, Z is the place whose X, Y, Z they are', () => {
    // Em of the demo, by geodeticToItrf of its latitude, longitude and height
    const geodetic: PositionValues = {
      name: 'Em',
      timeZone: 'America/Denver',
      positionKind: 'geodetic',
      latitudeDeg: 45.612,
      longitudeDeg: -109.874,
      heightM: 1420,
      itrfX: null,
      itrfY: null,
      itrfZ: null,
      positionSigmaM: null,
      positionEpoch: null,
    };
    expect(placeOf(geodetic)).toEqual({ latitudeDeg: 45.612, longitudeDeg: -109.874, heightM: 1420 });
    expect(STATION_BLOCKS.position.note?.(geodetic)).toMatch(
      /^ITRF X \u2212\d+\.\d\d, Y \u2212\d+\.\d\d, Z \d+/,
    );
    expect(() => placeOf({ ...geodetic, heightM: null })).toThrow(RangeError);
  });
});

describe('the wiring’s sentence', () => {
  const cables = { stationCableSeconds: 61.4e-9, gpsCableSeconds: 148e-9 };
  // planted: intervals on either side of a second, both ways of wiring
  it.each([
    ['formatter', 'gps', 'interval + 61.4 ns \u2212 148.0 ns', 1],
    ['gps', 'formatter', '\u2212interval + 61.4 ns \u2212 148.0 ns', -1],
  ] as const)('started by %s says what is computed', (counterStart, counterStop, words, sign) => {
    expect(wiringSentence({ counterStart, counterStop, ...cables })).toContain(`offset = ${words}.`);
    for (const counter of [3.301e-6, 0.999_996_7]) {
      const offset = offsetFromCounter(counter, { start: counterStart, stop: counterStop, ...cables });
      expect(offset).toBeCloseTo(sign * foldCounter(counter) + 61.4e-9 - 148e-9, 15);
    }
  });
});
