import { coverOf, dataRateOf } from '../../schedule/mode-channels';
import { bandField } from './band-field';
import type { Block, Wrong } from './block';
import { doubles } from './checks';
import { choiceField, numberField, optionalNumberField, neededField, refuse, textField } from './field';

export type ModeValues = {
  name: string;
  band: string;
  coherenceSeconds: number | null;
  toneSpacingHz: number | null;
};

type Bits = '1' | '2';
export type Channel = {
  edgeHz: number;
  sideband: 'upper' | 'lower';
  polarisation: 'R' | 'L' | 'X' | 'Y';
  bandwidthHz: number;
  bits: Bits;
};
export type CorrelatorValues = { integrationSeconds: number; spectralChannels: number };
export type ModeStation = { stationCode: string; isAble: 'yes' | 'no'; bits: '' | Bits; note: string };

const head: Block<ModeValues> = {
  title: 'Name, band and tones',
  keep: 'Keep mode',
  fields: {
    name: textField({ label: 'Name', isNeeded: true, longest: 80 }),
    band: bandField,
    coherenceSeconds: optionalNumberField({
      label: 'Coherence time',
      unit: 's',
      above: 0,
      max: 100_000,
      help: 'Of the atmosphere; empty takes no loss.',
    }),
    toneSpacingHz: optionalNumberField({
      label: 'Calibration tones each',
      unit: 'MHz',
      above: 0,
      max: 1000,
      scale: 1e6,
      help: 'Empty is none.',
    }),
  },
  rows: {},
};

const channels: Block<Record<never, never>, { channels: Channel }> = {
  title: 'Channels',
  keep: 'Keep channels',
  fields: {},
  rows: {
    channels: {
      kind: 'rows',
      label: 'Channels',
      help: 'The edge is the sky frequency that the sideband starts from. All have one bandwidth and as many bits, and each polarisation has as many.',
      add: 'Add a channel',
      again: ['bandwidthHz'],
      most: 256,
      columns: {
        edgeHz: numberField({ label: 'Edge', unit: 'MHz', above: 0, max: 1e6, scale: 1e6 }),
        sideband: choiceField({
          label: 'Sideband',
          choices: [
            { value: 'upper', label: 'upper' },
            { value: 'lower', label: 'lower' },
          ],
        }),
        polarisation: choiceField({
          label: 'Polarisation',
          choices: [
            { value: 'R', label: 'right circular' },
            { value: 'L', label: 'left circular' },
            { value: 'X', label: 'linear X' },
            { value: 'Y', label: 'linear Y' },
          ],
        }),
        bandwidthHz: numberField({ label: 'Bandwidth', unit: 'MHz', above: 0, max: 10_000, scale: 1e6 }),
        bits: choiceField({
          label: 'Bits',
          choices: [
            { value: '1', label: '1' },
            { value: '2', label: '2' },
          ],
        }),
      },
    },
  },
  check: (value) => channelProblems(value.channels),
  note: (value) => {
    const rate = dataRateOf(value.channels.map(plainChannel)) / 1e6;
    const samples = (2 * (value.channels[0]?.bandwidthHz ?? 0)) / 1e6;
    return `${value.channels.length} channels of ${samples} million samples a second each: ${rate} Mb/s.`;
  },
};

const correlator: Block<CorrelatorValues> = {
  title: 'At the correlator',
  keep: 'Keep settings',
  fields: {
    integrationSeconds: numberField({ label: 'Integration time', unit: 's', above: 0, max: 3600 }),
    spectralChannels: numberField({
      label: 'Spectral channels',
      unit: 'in a channel',
      min: 1,
      max: 1_048_576,
      isWhole: true,
    }),
  },
  rows: {},
};

const stations: Block<Record<never, never>, { stations: ModeStation }> = {
  title: 'Which stations can do it',
  keep: 'Keep stations',
  fields: {},
  rows: {
    stations: {
      kind: 'rows',
      label: 'Stations with a word of their own',
      help: 'A station that is not listed does the mode as its own bits allow.',
      add: 'Add a station',
      most: 100,
      columns: {
        stationCode: neededField(
          { label: 'Station' },
          (text) =>
            /^[A-Za-z][A-Za-z0-9]$/.test(text.trim())
              ? { ok: true, value: text.trim() }
              : refuse(`“${text.trim().slice(0, 20)}” is no station code. Type two characters, as Af.`),
          (code) => code,
        ),
        isAble: choiceField({
          label: 'Can it',
          choices: [
            { value: 'yes', label: 'can' },
            { value: 'no', label: 'cannot' },
          ],
        }),
        bits: choiceField<'' | Bits>({
          label: 'Bits',
          choices: [
            { value: '', label: 'as the mode' },
            { value: '1', label: '1 bit' },
            { value: '2', label: '2 bit' },
          ],
        }),
        note: textField({ label: 'Note', longest: 200 }),
      },
    },
  },
  check: (value) =>
    doubles(
      'stations',
      'stationCode',
      value.stations.map(({ stationCode }) => stationCode),
    ),
};

/** A mode's blocks by name, in the order of its page. */
export const MODE_BLOCKS = { head, channels, correlator, stations } as const;
export type ModeBlockName = keyof typeof MODE_BLOCKS;
export const NEW_MODE_BLOCKS = ['head', 'channels', 'correlator'] as const;

/** A channel as the schedule reads it. */
export const plainChannel = (channel: Channel) => ({
  ...channel,
  bits: channel.bits === '1' ? (1 as const) : (2 as const),
});

function channelProblems(rows: readonly Channel[]): Wrong[] {
  const [first] = rows;
  if (!first) return [{ field: 'channels', message: 'A mode has at least one channel. Add one.' }];
  const wrong: Wrong[] = [];
  const at = (index: number, column: keyof Channel, message: string) =>
    wrong.push({ field: `channels.${index}.${column}`, message });
  rows.forEach((row, index) => {
    if (row.bandwidthHz !== first.bandwidthHz)
      at(
        index,
        'bandwidthHz',
        `Channel ${index + 1} has another bandwidth than channel 1. All channels of a mode have one bandwidth.`,
      );
    if (row.bits !== first.bits)
      at(
        index,
        'bits',
        `Channel ${index + 1} has other bits than channel 1. All channels have as many bits.`,
      );
    if (isLinear(row) !== isLinear(first))
      at(
        index,
        'polarisation',
        'Circular and linear are mixed. Use R and L, or X and Y, in all channels of a mode.',
      );
    if (coverOf(row).lowHz <= 0)
      at(index, 'edgeHz', `Channel ${index + 1} reaches below 0 Hz. Set a higher edge.`);
    const twin = rows.findIndex(
      (other, before) =>
        before < index && other.polarisation === row.polarisation && isOverlapping(other, row),
    );
    if (twin >= 0)
      at(
        index,
        'edgeHz',
        `Channel ${index + 1} covers the same frequencies as channel ${twin + 1} in one polarisation. Move its edge.`,
      );
  });
  if (wrong.length > 0) return wrong;
  const counts = new Map<string, number>();
  for (const { polarisation } of rows) counts.set(polarisation, (counts.get(polarisation) ?? 0) + 1);
  if (new Set(counts.values()).size > 1) {
    const said = [...counts].map(([name, count]) => `${count} in ${name}`).join(', ');
    wrong.push({
      field: 'channels',
      message: `The polarisations have ${said}. Each has as many channels: add or take away some.`,
    });
  }
  return wrong;
}

const isLinear = ({ polarisation }: Channel) => polarisation === 'X' || polarisation === 'Y';

function isOverlapping(a: Channel, b: Channel): boolean {
  const [one, other] = [coverOf(a), coverOf(b)];
  return one.lowHz < other.highHz && other.lowHz < one.highHz;
}
