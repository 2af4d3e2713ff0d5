import type { Outcome, Reason } from '@/src/data/outcome/read';

export const OUTCOMES: readonly (readonly [Outcome, string])[] = [
  ['good', 'Good'],
  ['partly', 'Partly'],
  ['lost', 'Lost'],
];

export const REASON_WORDS: readonly (readonly [Reason, string])[] = [
  ['wind', 'Wind or stow'],
  ['antenna', 'Antenna'],
  ['receiver', 'Receiver'],
  ['formatter', 'Formatter'],
  ['recorder', 'Recorder'],
  ['clock', 'Clock'],
  ['interference', 'Interference'],
  ['other', 'Late or other'],
];

/** Filled, half, open. */
export function OutcomeMark({ outcome }: { outcome: Outcome }) {
  return (
    <svg width={13} height={13} viewBox="0 0 13 13" aria-hidden="true" className="flex-none">
      <rect
        x={0.75}
        y={0.75}
        width={11.5}
        height={11.5}
        fill="none"
        stroke="currentColor"
        strokeWidth={1.5}
      />
      {outcome !== 'lost' && (
        <rect
          x={1}
          y={outcome === 'good' ? 1 : 6.5}
          width={11}
          height={outcome === 'good' ? 11 : 5.5}
          fill="currentColor"
        />
      )}
    </svg>
  );
}
