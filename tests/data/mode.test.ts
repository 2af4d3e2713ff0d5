import { describe, expect, it } from 'vitest';
import { listModes, readMode } from '@/src/data/mode/read';
import { addMode, keepModeBlock, retireMode } from '@/src/data/mode/write';
import { writeBlock, type AnyBlock, type Typed } from '@/src/exchange/catalogue/block';
import { MODE_BLOCKS, plainChannel, type ModeBlockName } from '@/src/exchange/catalogue/mode';
import { dataRateOf } from '@/src/schedule/mode-channels';
import { makeViewer, MODE_ID, newId, openDatabase } from '@/tests/helpers/database';

openDatabase();

async function modeOf(id: string) {
  const answer = await readMode(await makeViewer('scheduler'), id);
  if (!answer.ok) throw new Error(answer.message);
  return answer.mode;
}

async function actOn(id: string, block: ModeBlockName, change: Typed) {
  const { blocks } = await modeOf(id);
  const was = writeBlock(MODE_BLOCKS[block] as unknown as AnyBlock, blocks[block] as never);
  return { block, was, typed: { ...was, ...change } };
}

const channel = (edgeHz: string, polarisation: string, over: Record<string, string> = {}) => ({
  edgeHz,
  polarisation,
  sideband: 'upper',
  bandwidthHz: '16',
  bits: '2',
  ...over,
});

const NEW = {
  head: { name: 'A test', band: '8.4 GHz', coherenceSeconds: '', toneSpacingHz: '1' },
  channels: { channels: [channel('8400', 'R'), channel('8400', 'L')] },
  correlator: { integrationSeconds: '1', spectralChannels: '128' },
};

describe('the catalogue of modes', () => {
  it('is read by every role and changed by schedulers', async () => {
    const answer = await listModes(await makeViewer('operator', { stationCode: 'Af' }));
    expect(answer).toMatchObject({ ok: true, canAdd: false });
    expect(await listModes(await makeViewer('admin'))).toMatchObject({ ok: true, canAdd: true });
    if (answer.ok) expect(answer.modes.map(({ band }) => band)).toContain('22 GHz');
  });

  it('is closed to someone without a role, and has no other modes', async () => {
    const viewer = await makeViewer('scheduler');
    expect(await listModes({ ...viewer, grants: [] })).toMatchObject({ ok: false, code: 'forbidden' });
    expect(await readMode({ ...viewer, grants: [] }, MODE_ID)).toMatchObject({ code: 'forbidden' });
    expect(await readMode(viewer, newId())).toMatchObject({ ok: false, code: 'not_found' });
  });

  it('says of each station what it can record', async () => {
    const { stations } = await modeOf(MODE_ID);
    expect(stations.find(({ code }) => code === 'Cf')).toMatchObject({
      bits: 1,
      feeds: expect.any(String) as string,
    });
  });
});

describe('a new mode', () => {
  it('is added by a scheduler; its rate follows from its channels', async () => {
    const answer = await addMode(await makeViewer('scheduler'), NEW);
    if (!answer.ok) throw new Error(answer.message);
    const { blocks } = await modeOf(answer.id);
    expect(blocks.head).toEqual({
      name: 'A test',
      band: '8.4 GHz',
      coherenceSeconds: null,
      toneSpacingHz: 1e6,
    });
    expect(blocks.channels.channels[0]).toMatchObject({ edgeHz: 8.4e9, bandwidthHz: 16e6, bits: '2' });
    // 2 channels × 2 × 16 MHz × 2 bit
    expect(dataRateOf(blocks.channels.channels.map(plainChannel))).toBe(128e6);
  });

  it('is refused to who only reads', async () => {
    expect(await addMode(await makeViewer('correlator'), NEW)).toMatchObject({
      ok: false,
      code: 'forbidden',
    });
  });

  it.each([
    ['no channel', [], 'channels.channels', /at least one/],
    [
      'two bandwidths',
      [channel('8400', 'R'), channel('8400', 'L', { bandwidthHz: '8' })],
      'channels.channels.1.bandwidthHz',
      /one bandwidth/,
    ],
    [
      'two numbers of bits',
      [channel('8400', 'R'), channel('8400', 'L', { bits: '1' })],
      'channels.channels.1.bits',
      /as many bits/,
    ],
    [
      'circular and linear',
      [channel('8400', 'R'), channel('8400', 'X')],
      'channels.channels.1.polarisation',
      /R and L, or X and Y/,
    ],
    [
      'more in one polarisation',
      [channel('8400', 'R'), channel('8400', 'L'), channel('8416', 'R')],
      'channels.channels',
      /2 in R, 1 in L/,
    ],
    [
      'a frequency twice',
      [channel('8400', 'R'), channel('8410', 'R')],
      'channels.channels.1.edgeHz',
      /channel 1/,
    ],
    [
      'an edge below zero',
      [channel('8', 'R', { sideband: 'lower' })],
      'channels.channels.0.edgeHz',
      /below 0 Hz/,
    ],
  ])('with %s is refused in a sentence', async (_, channels, field, words) => {
    const viewer = await makeViewer('scheduler');
    const head = { ...NEW.head, name: 'Another' };
    const answer = await addMode(viewer, { ...NEW, head, channels: { channels } });
    expect(answer).toMatchObject({ ok: false, code: 'invalid' });
    if (!answer.ok) expect(answer.fields?.[field]?.[0]).toMatch(words);
  });

  it('has a name of its own', async () => {
    const viewer = await makeViewer('scheduler');
    const answer = await addMode(viewer, { ...NEW, head: { ...NEW.head, name: 'a TEST' } });
    expect(answer).toMatchObject({
      ok: false,
      code: 'invalid',
      fields: { 'head.name': [expect.any(String)] },
    });
  });
});

describe('a block of a mode', () => {
  it('kept as it stands changes nothing', async () => {
    const viewer = await makeViewer('scheduler');
    const before = await modeOf(MODE_ID);
    for (const name of Object.keys(MODE_BLOCKS) as ModeBlockName[]) {
      expect(await keepModeBlock(viewer, MODE_ID, await actOn(MODE_ID, name, {})), name).toEqual({
        ok: true,
      });
    }
    expect(await modeOf(MODE_ID)).toEqual(before);
  });

  it.each([
    ['head', { coherenceSeconds: '90' }],
    ['correlator', { spectralChannels: '256' }],
    ['stations', { stations: [{ stationCode: 'Cf', isAble: 'yes', bits: '1', note: 'one bit' }] }],
    ['channels', { channels: [channel('22203', 'X'), channel('22203', 'Y')] }],
  ] as const)('a scheduler keeps %s', async (name, change) => {
    const viewer = await makeViewer('scheduler');
    const act = await actOn(MODE_ID, name, change);
    expect(await keepModeBlock(viewer, MODE_ID, act)).toEqual({ ok: true });
    expect((await actOn(MODE_ID, name, {})).was).toEqual(act.typed);
    expect(await keepModeBlock(viewer, MODE_ID, act)).toMatchObject({ ok: false, code: 'conflict' });
  });

  it('is refused to who only reads, and where there is no mode', async () => {
    const act = await actOn(MODE_ID, 'correlator', { spectralChannels: '32' });
    const operator = await makeViewer('operator', { stationCode: 'Af' });
    expect(await keepModeBlock(operator, MODE_ID, act)).toMatchObject({ ok: false, code: 'forbidden' });
    const viewer = await makeViewer('scheduler');
    expect(await keepModeBlock(viewer, newId(), act)).toMatchObject({ ok: false, code: 'not_found' });
  });

  it('with a station that is not there, a part channel or an unknown name is refused', async () => {
    const viewer = await makeViewer('scheduler');
    const stations = [{ stationCode: 'Zz', isAble: 'no', bits: '', note: '' }];
    expect(
      await keepModeBlock(viewer, MODE_ID, await actOn(MODE_ID, 'stations', { stations })),
    ).toMatchObject({
      code: 'invalid',
      fields: { 'stations.0.stationCode': [expect.stringContaining('Zz')] },
    });
    const part = await actOn(MODE_ID, 'correlator', { spectralChannels: '64.5' });
    expect(await keepModeBlock(viewer, MODE_ID, part)).toMatchObject({
      code: 'invalid',
      fields: { spectralChannels: [expect.stringContaining('whole number')] },
    });
    expect(await keepModeBlock(viewer, MODE_ID, { ...part, block: 'x' })).toMatchObject({ code: 'invalid' });
  });
});

describe('retiring a mode', () => {
  it('marks it and can be taken back, by schedulers only', async () => {
    const viewer = await makeViewer('scheduler');
    expect(await retireMode(viewer, MODE_ID, true)).toEqual({ ok: true });
    expect((await modeOf(MODE_ID)).retiredAtMs).not.toBeNull();
    expect(await retireMode(viewer, MODE_ID, false)).toEqual({ ok: true });
    expect((await modeOf(MODE_ID)).retiredAtMs).toBeNull();
    const reader = await makeViewer('correlator');
    expect(await retireMode(reader, MODE_ID, true)).toMatchObject({ ok: false, code: 'forbidden' });
    expect(await retireMode(viewer, newId(), true)).toMatchObject({ ok: false, code: 'not_found' });
  });
});
