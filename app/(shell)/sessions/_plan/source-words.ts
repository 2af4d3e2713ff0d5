import type { SourceRole } from '@/src/schedule/context';

const WORDS: Readonly<Record<SourceRole, string>> = {
  target: 'target',
  'phase-ref': 'phase ref',
  finder: 'finder',
  polarisation: 'pol. calibrator',
};

/** "target, 1.40 Jy"; a flux that is not known is left out. */
export function sourceWords({ role, fluxJy }: { role: SourceRole; fluxJy: number | null }): string {
  return fluxJy === null ? WORDS[role] : `${WORDS[role]}, ${fluxJy.toFixed(2)} Jy`;
}
