import { describe, expect, it } from 'vitest';
import { db } from '@/db/client';
import { clockReadings } from '@/db/schema/clock-readings';
import { clocksOf, listClocks, readStationClock } from '@/src/data/clock/read';
import { reportChange, reportReading, setReadingAside } from '@/src/data/clock/write';
import { makeViewer, newId, NOW, openDatabase } from '@/tests/helpers/database';

openDatabase();

const HOUR = 3_600_000;
const now = Date.parse(NOW);
const operatorOf = (stationCode: string) => makeViewer('operator', { stationCode });

let readings = 0;
const reading = (over: object = {}) => ({
  actId: newId(),
  pulse: 'formatter',
  atMs: now - 30 * 60_000 - 1000 * (readings += 1),
  tick: 'early',
  size: '3.207',
  unit: 'µs',
  secondCheck: 'yes',
  ...over,
});
const logOf = async (code: string) => {
  const read = await readStationClock(await makeViewer('admin'), code);
  if (!read.ok) throw new Error(read.message);
  return read.clock;
};

describe('the demo’s clock logs', () => {
  it('find the rate that was put in, to its own error, on both sides of the step', async () => {
    const { fit, changes, readings } = await logOf('Af');
    expect(readings.length).toBeGreaterThan(350);
    expect(changes).toHaveLength(1);
    expect(fit?.segments).toHaveLength(2);
    for (const segment of fit?.segments ?? [])
      expect(Math.abs(segment.rate - 0.667e-12)).toBeLessThan(4 * segment.sigmaRate);
    const [before, after] = fit?.segments ?? [];
    if (!before || !after) throw new Error('a stretch is missing');
    const change = changes[0]?.atMs ?? 0;
    const at = (segment: typeof before) =>
      segment.offsetSeconds + (segment.rate * (change - segment.epoch.getTime())) / 1000;
    expect(at(after) - at(before)).toBeCloseTo(0.62e-6, 8);
  });

  it('leave out what was read wrong, and show it', async () => {
    const { readings } = await logOf('Em');
    expect(readings.filter(({ isFar }) => isFar)).toHaveLength(2);
    const fallow = await logOf('Fn');
    expect(fallow.readings.filter(({ state }) => state === 'set-aside')).toMatchObject([
      { reason: 'typed with the wrong sign' },
    ]);
  });

  it('say the clock now: Af early, Cf late, Bm read 31 h ago', async () => {
    const listed = await listClocks(await makeViewer('scheduler'));
    if (!listed.ok) throw new Error(listed.message);
    const of = (code: string) => listed.clocks.find((clock) => clock.code === code);
    expect(listed.clocks.map(({ code }) => code)).toEqual(['Em', 'Dp', 'Fn', 'Af', 'Cf', 'Bm']);
    expect(of('Af')?.now?.offsetSeconds).toBeCloseTo(3.207e-6, 8);
    expect(of('Cf')?.now?.offsetSeconds).toBeLessThan(-6.8e-6);
    expect(Math.round((listed.nowMs - (of('Bm')?.readAtMs ?? 0)) / HOUR)).toBe(31);
  });

  it('go to the outlook with what the instrument adds', async () => {
    const clocks = await clocksOf(db(), ['Af', 'Bm'], now);
    expect(clocks['Af']?.instrument).toEqual({ seconds: 1.12e-6, sigmaSeconds: 2e-8 });
    expect(clocks['Bm']?.instrument).toBeNull();
    expect(clocks['Bm']?.fit?.segments).toHaveLength(1);
  });
});

describe('who reads a clock log', () => {
  it('is its own station’s operator, schedulers, correlator staff and investigators', async () => {
    const read = async (role: Parameters<typeof makeViewer>[0], where = {}) => {
      const answer = await readStationClock(await makeViewer(role, where), 'Af');
      return answer.ok ? [answer.clock.canWrite, answer.clock.canSetAside] : answer.code;
    };
    expect(await read('operator', { stationCode: 'Af' })).toEqual([true, true]);
    expect(await read('operator', { stationCode: 'Bm' })).toBe('not_found');
    expect(await read('scheduler')).toEqual([false, false]);
    expect(await read('correlator')).toEqual([false, true]);
  });

  it('lists an operator their own only', async () => {
    const listed = await listClocks(await operatorOf('Bm'));
    expect(listed.ok && listed.clocks.map(({ code }) => code)).toEqual(['Bm']);
  });

  it('finds no log of a station that does not exist', async () => {
    expect(await readStationClock(await makeViewer('admin'), 'Zz')).toMatchObject({ code: 'not_found' });
  });
});

describe('a reading', () => {
  it.each([
    ['early', 3.207e-6],
    ['late', -3.207e-6],
  ])('with the tick %s is stored as %d s', async (tick, offset) => {
    const answer = await reportReading(await operatorOf('Af'), 'Af', reading({ tick, isSure: true }));
    expect(answer).toMatchObject({ ok: true, offsetSeconds: offset });
    const stored = (await logOf('Af')).readings.find(({ atMs }) => atMs > now - HOUR && atMs <= now);
    expect(stored?.state).toBe('used');
  });

  it('comes with what the fit expected', async () => {
    const answer = await reportReading(await operatorOf('Fn'), 'Fn', reading({ size: '0.441' }));
    if (!answer.ok) throw new Error(answer.message);
    expect(answer.expected?.offsetSeconds).toBeCloseTo(0.441e-6, 8);
  });

  it('that looks like the other tick is questioned before it is stored, and taken when it is right', async () => {
    const operator = await operatorOf('Dp');
    const count = () => db().$count(clockReadings);
    const before = await count();
    const body = reading({ tick: 'late', size: '4.862' });
    const asked = await reportReading(operator, 'Dp', body);
    expect(asked).toMatchObject({ ok: false, code: 'conflict', slip: { kind: 'sign' } });
    expect(asked.ok ? '' : asked.message).toContain('Is it the other tick?');
    expect(await count()).toBe(before);
    expect(await reportReading(operator, 'Dp', { ...body, isSure: true })).toMatchObject({ ok: true });
    expect(await count()).toBe(before + 1);
  });

  it('sent twice stands once', async () => {
    const operator = await operatorOf('Em');
    const body = reading({ tick: 'late', size: '1.207' });
    await reportReading(operator, 'Em', body);
    const before = await db().$count(clockReadings);
    expect(await reportReading(operator, 'Em', body)).toMatchObject({ ok: true });
    expect(await db().$count(clockReadings)).toBe(before);
  });

  it('at a time that has one already is refused, and says which', async () => {
    const operator = await operatorOf('Cf');
    const body = reading({ tick: 'late', size: '6.930' });
    await reportReading(operator, 'Cf', body);
    const twice = await reportReading(operator, 'Cf', { ...body, actId: newId() });
    expect(twice).toMatchObject({ ok: false, code: 'invalid' });
    expect(twice.ok ? '' : twice.fields?.atMs?.join()).toContain('LATE by 6.930 µs');
  });

  it.each([
    [{ tick: undefined }, 'tick', 'Which tick came first?'],
    [{ size: '-3.2' }, 'size', 'Type the size without a sign'],
    [{ size: 'much' }, 'size', 'is no size'],
    [{ atMs: now + HOUR }, 'atMs', 'lies ahead'],
    [{ atMs: 0 }, 'atMs', 'ten years ago'],
    [{ secondCheck: 'off' }, 'secondOff', 'not 0'],
    [{ secondCheck: 'off', secondOff: 90_000 }, 'secondOff', '86 400'],
    [{ secondCheck: 'yes', secondOff: 1 }, 'secondOff', 'only where'],
    [{ secondCheck: undefined }, 'secondCheck', 'checked against UTC'],
    [{ note: 'x'.repeat(501) }, 'note', 'Shorten it'],
  ])('with %j is refused beside its field', async (over, field, words) => {
    const answer = await reportReading(await operatorOf('Bm'), 'Bm', reading(over));
    expect(answer).toMatchObject({ ok: false, code: 'invalid' });
    expect(answer.ok ? '' : answer.fields?.[field]?.join()).toContain(words);
  });

  it.each([
    ['scheduler', {}, 'forbidden'],
    ['correlator', {}, 'forbidden'],
    ['operator', { stationCode: 'Bm' }, 'not_found'],
  ] as const)('by a %s is refused', async (role, where, code) => {
    expect(await reportReading(await makeViewer(role, where), 'Af', reading())).toMatchObject({ code });
  });
});

describe('a change at the station', () => {
  const change = (over: object = {}) => ({ id: newId(), kind: 'cable', atMs: now - HOUR, note: '', ...over });

  it('starts the fit anew, once however often it is sent', async () => {
    const operator = await operatorOf('Bm');
    const body = change({ atMs: now - 40 * 24 * HOUR });
    expect(await reportChange(operator, 'Bm', body)).toEqual({ ok: true });
    expect(await reportChange(operator, 'Bm', body)).toEqual({ ok: true });
    const { changes, fit, isBehindChange } = await logOf('Bm');
    expect(changes).toHaveLength(1);
    expect(fit?.segments).toHaveLength(2);
    expect(isBehindChange).toBe(false);
  });

  it('without a reading since says so', async () => {
    await reportChange(await operatorOf('Bm'), 'Bm', change());
    expect((await logOf('Bm')).isBehindChange).toBe(true);
  });

  it('is refused without a kind, ahead of now, and by others', async () => {
    const operator = await operatorOf('Bm');
    expect(await reportChange(operator, 'Bm', change({ kind: 'magic' }))).toMatchObject({ code: 'invalid' });
    expect(await reportChange(operator, 'Bm', change({ atMs: now + HOUR }))).toMatchObject({
      fields: { atMs: [expect.stringContaining('lies ahead') as string] },
    });
    expect(await reportChange(await makeViewer('correlator'), 'Bm', change())).toMatchObject({
      code: 'forbidden',
    });
  });
});

describe('a reading that is set aside', () => {
  it('stays in the log with the reason, and comes back', async () => {
    const correlator = await makeViewer('correlator');
    const [newest] = (await logOf('Fn')).readings;
    const id = newest?.id ?? '';
    const aside = { state: 'set-aside', reason: 'counter gate' };
    expect(await setReadingAside(correlator, 'Fn', id, aside)).toEqual({ ok: true });
    expect((await logOf('Fn')).readings[0]).toMatchObject({ state: 'set-aside', reason: 'counter gate' });
    expect(await setReadingAside(correlator, 'Fn', id, { state: 'used' })).toEqual({ ok: true });
    expect((await logOf('Fn')).readings[0]).toMatchObject({ state: 'used', reason: '' });
  });

  it('needs a reason, a reading that exists, and the right', async () => {
    const correlator = await makeViewer('correlator');
    const aside = { state: 'set-aside', reason: ' ' };
    expect(await setReadingAside(correlator, 'Fn', 'x', aside)).toMatchObject({ code: 'invalid' });
    expect(await setReadingAside(correlator, 'Fn', 'x', { state: 'used' })).toMatchObject({
      code: 'not_found',
    });
    expect(await setReadingAside(await makeViewer('scheduler'), 'Fn', 'x', { state: 'used' })).toMatchObject({
      code: 'forbidden',
    });
  });
});
