import type { ReactNode } from 'react';

const TONES = {
  neutral: 'chip',
  ok: 'chip border-teal text-teal',
  warn: 'chip border-ochre text-ochre',
  bad: 'chip border-verm text-verm',
  solid: 'chip border-fill bg-fill text-on-ink',
} as const;

/** Always a word, never colour alone. */
export function Chip({ tone = 'neutral', children }: { tone?: keyof typeof TONES; children: ReactNode }) {
  return <span className={TONES[tone]}>{children}</span>;
}
