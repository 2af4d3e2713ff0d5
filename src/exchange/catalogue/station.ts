import type { Block } from './block';
import { before } from './checks';
import { areaField, neededField, refuse, textField, type Field } from './field';
import { allowances, bands, recording, wiring } from './station-signal';
import { horizon, mount, position, wrap } from './station-site';
import { timeField } from './time-field';

export type Absence = { startMs: number; endMs: number; why: string };

const away: Block<Record<never, never>, { away: Absence }> = {
  title: 'Cannot observe',
  keep: 'Keep times',
  fields: {},
  rows: {
    away: {
      kind: 'rows',
      label: 'Times',
      add: 'Add a time',
      most: 500,
      columns: {
        startMs: timeField({ label: 'From, UT' }),
        endMs: timeField({ label: 'To, UT' }),
        why: textField({ label: 'Why', isNeeded: true, longest: 200 }),
      },
    },
  },
  check: (value) =>
    value.away.flatMap(({ startMs, endMs }, index) =>
      before(`away.${index}.endMs`, startMs, endMs, 'It ends before it begins.'),
    ),
};

const contacts: Block<{ contacts: string }> = {
  title: 'Contacts',
  keep: 'Keep contacts',
  fields: {
    contacts: areaField({
      label: 'Contacts',
      help: 'On-call phones and mail, one on a line.',
      longest: 2000,
    }),
  },
  rows: {},
};

/** A station's blocks by name, in the order of its page. */
export const STATION_BLOCKS = {
  position,
  mount,
  wrap,
  bands,
  wiring,
  recording,
  allowances,
  horizon,
  away,
  contacts,
} as const;
export type StationBlockName = keyof typeof STATION_BLOCKS;

/** What an operator keeps of the own station; the rest is the schedulers'. */
export const OWN_BLOCKS: readonly StationBlockName[] = ['horizon', 'bands', 'away', 'contacts'];

/** What a new station is asked at first. */
export const NEW_STATION_BLOCKS = ['position', 'mount', 'recording'] as const;

/** The code, as it is typed once and never changes. */
export const stationCodeField: Field<string> = neededField(
  { label: 'Code', help: 'Two characters, a letter first. It never changes.' },
  (text) =>
    /^[A-Za-z][A-Za-z0-9]$/.test(text.trim())
      ? { ok: true, value: text.trim() }
      : refuse(`“${text.trim().slice(0, 20)}” is no code. A code has two characters, a letter first, as Af.`),
  (code) => code,
);
