import { eq } from 'drizzle-orm';
import { describe, expect, it } from 'vitest';
import { db } from '@/db/client';
import { sessionStations } from '@/db/schema/session-stations';
import { stations } from '@/db/schema/stations';
import type { Role } from '@/src/access/policy';
import { readStations } from '@/src/data/plan/context';
import { listStationRows, readStation } from '@/src/data/station/read';
import { addStation, keepStationBlock, retireStation } from '@/src/data/station/write';
import type { StationBlocks } from '@/src/data/station/dto';
import { writeBlock, type AnyBlock, type Typed } from '@/src/exchange/catalogue/block';
import { OWN_BLOCKS, STATION_BLOCKS, type StationBlockName } from '@/src/exchange/catalogue/station';
import { makeSession, makeViewer, NOW, openDatabase } from '@/tests/helpers/database';

openDatabase();

async function someone(role: Role) {
  if (role === 'operator') return makeViewer(role, { stationCode: 'Af' });
  return makeViewer(role, role === 'investigator' ? { sessionId: (await makeSession()).id } : {});
}

async function stationOf(code: string) {
  const answer = await readStation(await makeViewer('scheduler'), code);
  if (!answer.ok) throw new Error(answer.message);
  return answer.station;
}

const typedOf = (name: StationBlockName, blocks: StationBlocks): Typed =>
  writeBlock(STATION_BLOCKS[name] as unknown as AnyBlock, blocks[name] as never);

/** A change to a block of a station as it stands. */
async function actOn(code: string, block: StationBlockName, change: Typed) {
  const was = typedOf(block, (await stationOf(code)).blocks);
  return { block, was, typed: { ...was, ...change } };
}

const NEW = {
  code: 'Qx',
  position: {
    name: 'Quiet Corner',
    timeZone: 'Europe/Lisbon',
    positionKind: 'geodetic',
    latitudeDeg: '38.5',
    longitudeDeg: '-9.25',
    heightM: '120',
  },
  mount: {
    mountKind: 'az-el',
    dishM: '25',
    axisOffsetM: '0',
    axis1MinDeg: '-270',
    axis1MaxDeg: '270',
    axis1RateDegPerS: '1',
    axis1AccelDegPerS2: '0.5',
    axis2MinDeg: '5',
    axis2MaxDeg: '88',
    axis2RateDegPerS: '0.7',
    axis2AccelDegPerS2: '0.5',
    settleSeconds: '3',
    minElevationDeg: '8',
    maxElevationDeg: '87',
  },
  recording: { bits: '2', preScanSeconds: '0', calibrationSeconds: '0', recorderFreeBytes: '12.5' },
};

describe('the catalogue of stations', () => {
  it.each(['admin', 'scheduler', 'operator', 'correlator', 'investigator'] as const)(
    'is read by %s, whole',
    async (role) => {
      const answer = await listStationRows(await someone(role));
      expect(answer).toMatchObject({ ok: true, canAdd: role === 'admin' || role === 'scheduler' });
      if (!answer.ok) return;
      expect(answer.stations.map(({ code }) => code)).toEqual(
        expect.arrayContaining(['Af', 'Bm', 'Cf', 'Dp', 'Em', 'Fn']),
      );
      expect(answer.stations.find(({ code }) => code === 'Af')?.sefdJy).toEqual({
        '22 GHz': 480,
        '8.4 GHz': 460,
      });
    },
  );

  it('is closed to someone without a role', async () => {
    const nobody = { ...(await makeViewer('scheduler')), grants: [] };
    expect(await listStationRows(nobody)).toMatchObject({ ok: false, code: 'forbidden' });
    expect(await readStation(nobody, 'Af')).toMatchObject({ ok: false, code: 'forbidden' });
  });

  it('finds a station by its code in any case, and no other', async () => {
    expect((await stationOf('AF')).code).toBe('Af');
    const viewer = await makeViewer('scheduler');
    expect(await readStation(viewer, 'Zz')).toMatchObject({ ok: false, code: 'not_found' });
  });

  it('gives back each block as its form writes it, unchanged by being kept', async () => {
    const viewer = await makeViewer('scheduler');
    const before = await stationOf('Fn');
    for (const name of Object.keys(STATION_BLOCKS) as StationBlockName[]) {
      expect(await keepStationBlock(viewer, 'Fn', await actOn('Fn', name, {})), name).toEqual({ ok: true });
    }
    expect((await stationOf('Fn')).blocks).toEqual(before.blocks);
  });
});

describe('a new station', () => {
  it('is added by a scheduler, its code as it was typed', async () => {
    const viewer = await makeViewer('scheduler');
    expect(await addStation(viewer, NEW)).toEqual({ ok: true, code: 'Qx' });
    const station = await stationOf('qx');
    expect(station).toMatchObject({
      code: 'Qx',
      site: { latitudeDeg: 38.5, longitudeDeg: -9.25, heightM: 120 },
      recorderFreeAtMs: expect.any(Number) as number,
      retiredAtMs: null,
    });
    expect(station.blocks.recording.recorderFreeBytes).toBe(12.5e12);
  });

  it('is refused to an operator', async () => {
    const viewer = await makeViewer('operator', { stationCode: 'Af' });
    expect(await addStation(viewer, { ...NEW, code: 'Qy' })).toMatchObject({ ok: false, code: 'forbidden' });
  });

  it.each([
    ['a code that is taken in another case', { code: 'aF' }, 'code'],
    ['a code of three letters', { code: 'Qxy' }, 'code'],
    [
      'a latitude beyond the pole',
      { position: { ...NEW.position, latitudeDeg: '542.03' } },
      'position.latitudeDeg',
    ],
    ['no name', { position: { ...NEW.position, name: ' ' } }, 'position.name'],
    ['a zone that is none', { position: { ...NEW.position, timeZone: 'Mars/Base' } }, 'position.timeZone'],
    [
      'a declination beyond the pole',
      {
        mount: {
          ...NEW.mount,
          mountKind: 'ha-dec',
          axis1MinDeg: '-90',
          axis1MaxDeg: '90',
          axis2MaxDeg: '95',
        },
      },
      'mount.axis2MaxDeg',
    ],
    ['a mount of no kind', { mount: { ...NEW.mount, mountKind: 'alt-alt' } }, 'mount.mountKind'],
    ['a range the wrong way round', { mount: { ...NEW.mount, axis1MaxDeg: '-300' } }, 'mount.axis1MaxDeg'],
    ['no text at all', { position: 7 as unknown as typeof NEW.position }, undefined],
  ])('says beside the field what is wrong with %s', async (_, change, field) => {
    const viewer = await makeViewer('scheduler');
    const answer = await addStation(viewer, { ...NEW, code: 'Qz', ...change });
    expect(answer).toMatchObject({ ok: false, code: 'invalid' });
    if (answer.ok || field === undefined) return;
    expect(answer.fields).toHaveProperty([field]);
    expect(await readStation(viewer, 'Qz')).toMatchObject({ ok: false, code: 'not_found' });
  });
});

describe('who keeps a block of a station', () => {
  const CHANGES: Readonly<Record<StationBlockName, Typed>> = {
    position: { heightM: '63' },
    mount: { sunLimitDeg: '12' },
    wrap: { wrapSectors: [{ name: 'neutral', minDeg: '90', maxDeg: '270' }] },
    bands: {
      bands: [
        { band: '22ghz', sefdJy: '505', feeds: 'linear', zenithOpacity: '0.09', gainCurve: '20 0.9, 50 1' },
      ],
    },
    wiring: { counterStart: 'gps', counterStop: 'maser', stationCableSeconds: '61.4' },
    recording: { maxChannels: '16', recorderFreeBytes: '41.8' },
    allowances: { instrumentDelaySeconds: '1.482', instrumentDelaySigmaSeconds: '0.006' },
    horizon: {
      horizon: [
        { azimuthDeg: '226', elevationDeg: '18.5' },
        { azimuthDeg: '47', elevationDeg: '14,5' },
      ],
    },
    away: { away: [{ startMs: '2027-02-18 07:00', endMs: '2027-049 15:00', why: 'Grease' }] },
    contacts: { contacts: 'Night: +00 555 010 114' },
  };
  const NAMES = Object.keys(CHANGES) as StationBlockName[];

  it.each(NAMES)('a scheduler keeps %s', async (name) => {
    const viewer = await makeViewer('scheduler');
    expect(await keepStationBlock(viewer, 'Dp', await actOn('Dp', name, CHANGES[name]))).toEqual({
      ok: true,
    });
    const { blocks } = await stationOf('Dp');
    expect(await keepStationBlock(viewer, 'Dp', await actOn('Dp', name, {}))).toEqual({ ok: true });
    expect((await stationOf('Dp')).blocks[name]).toEqual(blocks[name]);
  });

  it('and it is stored in the units of the plan', async () => {
    const { blocks } = await stationOf('Dp');
    expect(blocks.bands.bands).toEqual([
      {
        band: '22 GHz',
        sefdJy: 505,
        feeds: 'linear',
        zenithOpacity: 0.09,
        gainCurve: [
          [20, 0.9],
          [50, 1],
        ],
      },
    ]);
    expect(blocks.wiring).toMatchObject({
      counterStart: 'gps',
      counterStop: 'maser',
      stationCableSeconds: 61.4e-9,
    });
    expect(blocks.horizon.horizon.map(({ azimuthDeg }) => azimuthDeg)).toEqual([47, 226]);
    const start = Date.parse('2027-02-18T07:00:00Z');
    expect(blocks.away.away).toEqual([{ startMs: start, endMs: start + 8 * 3_600_000, why: 'Grease' }]);
    expect((await stationOf('Dp')).recorderFreeAtMs).toBeGreaterThanOrEqual(Date.parse(NOW));
  });

  it.each(NAMES)('an operator keeps %s of the own station only where it is theirs', async (name) => {
    const own = await makeViewer('operator', { stationCode: 'Bm' });
    const answer = await keepStationBlock(own, 'Bm', await actOn('Bm', name, CHANGES[name]));
    expect(answer).toMatchObject(OWN_BLOCKS.includes(name) ? { ok: true } : { ok: false, code: 'forbidden' });
    const other = await keepStationBlock(own, 'Em', await actOn('Em', name, CHANGES[name]));
    expect(other).toMatchObject({ ok: false, code: 'forbidden' });
  });

  it.each(['correlator', 'investigator'] as const)('%s keeps nothing', async (role) => {
    const viewer = await someone(role);
    const answer = await keepStationBlock(viewer, 'Em', await actOn('Em', 'contacts', CHANGES.contacts));
    expect(answer).toMatchObject({ ok: false, code: 'forbidden' });
  });

  it('a station that is not there is not found', async () => {
    const viewer = await makeViewer('scheduler');
    const act = await actOn('Em', 'contacts', CHANGES.contacts);
    expect(await keepStationBlock(viewer, 'Zz', act)).toMatchObject({ ok: false, code: 'not_found' });
  });
});

describe('a block', () => {
  it('typed as ITRF has its latitude, longitude and height worked out', async () => {
    const viewer = await makeViewer('scheduler');
    const { itrf, site } = await stationOf('Em');
    const typed = {
      positionKind: 'itrf',
      itrfX: String(itrf.x),
      itrfY: String(itrf.y),
      itrfZ: String(itrf.z),
      latitudeDeg: 'left over',
    };
    expect(await keepStationBlock(viewer, 'Em', await actOn('Em', 'position', typed))).toEqual({ ok: true });
    const after = await stationOf('Em');
    expect(after.blocks.position).toMatchObject({ positionKind: 'itrf', latitudeDeg: null });
    expect(after.site.latitudeDeg).toBeCloseTo(site.latitudeDeg, 8);
    expect(after.site.longitudeDeg).toBeCloseTo(site.longitudeDeg, 8);
    expect(after.site.heightM).toBeCloseTo(site.heightM, 3);
  });

  it.each([
    ['az-el', 'azimuth', 'elevation'],
    ['ha-dec', 'hourAngle', 'declination'],
    ['xy-ns', 'x', 'y'],
    ['xy-ew', 'x', 'y'],
  ])('of an %s mount is what plans slew by: its %s and %s', async (mountKind, first, second) => {
    const viewer = await makeViewer('scheduler');
    const typed = {
      ...{ mountKind, axis1MinDeg: '-80', axis1MaxDeg: '85', axis1RateDegPerS: '0.4' },
      ...{ axis1AccelDegPerS2: '0.2', axis2MinDeg: '-5', axis2MaxDeg: '75', axis2RateDegPerS: '0.3' },
      ...{ axis2AccelDegPerS2: '0.1', settleSeconds: '7' },
    };
    expect(await keepStationBlock(viewer, 'Em', await actOn('Em', 'mount', typed))).toEqual({ ok: true });
    const [station] = await readStations(db(), ['Em']);
    expect(station?.mount).toEqual({
      kind: mountKind,
      [first]: { minDeg: -80, maxDeg: 85, rateDegPerS: 0.4, accelDegPerS2: 0.2 },
      [second]: { minDeg: -5, maxDeg: 75, rateDegPerS: 0.3, accelDegPerS2: 0.1 },
      settleSeconds: 7,
    });
  });

  it('that someone else changed meanwhile is not overwritten', async () => {
    const viewer = await makeViewer('scheduler');
    const late = await actOn('Cf', 'contacts', { contacts: 'mine' });
    const first = await actOn('Cf', 'contacts', { contacts: 'theirs' });
    expect(await keepStationBlock(viewer, 'Cf', first)).toEqual({ ok: true });
    expect(await keepStationBlock(viewer, 'Cf', late)).toMatchObject({ ok: false, code: 'conflict' });
    expect((await stationOf('Cf')).blocks.contacts).toEqual({ contacts: 'theirs' });
  });

  it.each([
    ['wiring', { counterStop: 'maser' }, 'counterStop'],
    ['allowances', { instrumentDelaySigmaSeconds: '' }, 'instrumentDelaySigmaSeconds'],
    ['bands', { bands: [{ band: 'wide', sefdJy: '-3', feeds: 'circular' }] }, 'bands.0.sefdJy'],
    ['horizon', { horizon: [{ azimuthDeg: '360', elevationDeg: '4' }] }, 'horizon.0.azimuthDeg'],
    [
      'away',
      { away: [{ startMs: '2027-02-18 07:00', endMs: '2027-02-18 06:00', why: 'x' }] },
      'away.0.endMs',
    ],
    ['position', { positionKind: 'itrf', itrfX: '1', itrfY: '2', itrfZ: '3' }, 'itrfX'],
  ] as const)(
    '%s with a slip is refused beside its field and nothing is stored',
    async (name, change, field) => {
      const viewer = await makeViewer('scheduler');
      const before = await stationOf('Fn');
      const answer = await keepStationBlock(viewer, 'Fn', await actOn('Fn', name, change));
      expect(answer).toMatchObject({ ok: false, code: 'invalid' });
      if (!answer.ok) expect(Object.keys(answer.fields ?? {})).toContain(field);
      expect((await stationOf('Fn')).blocks).toEqual(before.blocks);
    },
  );

  it('of an unknown name or shape is refused', async () => {
    const viewer = await makeViewer('scheduler');
    const act = await actOn('Fn', 'contacts', {});
    expect(await keepStationBlock(viewer, 'Fn', { ...act, block: 'code' })).toMatchObject({
      code: 'invalid',
    });
    expect(await keepStationBlock(viewer, 'Fn', { ...act, typed: 'x' })).toMatchObject({ code: 'invalid' });
  });
});

describe('retiring', () => {
  it('keeps the station readable and in its sessions, and can be taken back', async () => {
    const viewer = await makeViewer('scheduler');
    const session = await makeSession();
    expect(await retireStation(viewer, 'Fn', true)).toEqual({ ok: true });
    expect((await stationOf('Fn')).retiredAtMs).toBeGreaterThanOrEqual(Date.parse(NOW));
    const taking = await db().select().from(sessionStations).where(eq(sessionStations.sessionId, session.id));
    expect(taking.map(({ stationCode }) => stationCode)).toContain('Fn');
    expect(await retireStation(viewer, 'Fn', false)).toEqual({ ok: true });
    const [row] = await db().select().from(stations).where(eq(stations.code, 'Fn'));
    expect(row?.retiredAtMs).toBeNull();
  });

  it('is the schedulers’, and of a station that is there', async () => {
    const operator = await makeViewer('operator', { stationCode: 'Fn' });
    expect(await retireStation(operator, 'Fn', true)).toMatchObject({ ok: false, code: 'forbidden' });
    const viewer = await makeViewer('scheduler');
    expect(await retireStation(viewer, 'Zz', true)).toMatchObject({ ok: false, code: 'not_found' });
  });
});
