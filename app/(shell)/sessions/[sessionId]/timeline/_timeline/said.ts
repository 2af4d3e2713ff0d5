import type { Verb } from '@/src/schedule/commands';
import type { SnapMode } from './state';

export const SNAP_WORDS: readonly (readonly [SnapMode, string])[] = [
  ['slew', 'Slew end'],
  ['grid', '10 s'],
  ['off', 'Off'],
];

const VERB_WORDS: Readonly<Record<Verb, string>> = {
  'add-scan': 'adding a scan',
  'move-scan': 'moving a scan',
  'change-length': 'changing a length',
  'take-station-out': 'taking a station out',
  'put-station-in': 'putting a station in',
  'change-station-times': 'changing a station’s times',
  'remove-scan': 'removing a scan',
  'edit-scan': 'editing a scan',
  'add-group': 'adding a nodding group',
  'remove-group': 'removing a nodding group',
  'edit-group': 'editing a nodding group',
  'change-span': 'changing the session’s time',
};

export const verbWords = (verb: Verb) => VERB_WORDS[verb];

export const ROLE_WORDS = {
  target: 'target',
  'phase-ref': 'phase ref',
  finder: 'finder',
  polarisation: 'pol. calibrator',
} as const;
