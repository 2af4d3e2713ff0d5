import type { Pulse, WiringValues } from '@/src/exchange/catalogue/station-signal';

const NAMES: Readonly<Record<Pulse, readonly [name: string, what: string]>> = {
  formatter: ['Formatter', 'recorder’s second'],
  maser: ['Maser', 'the clock’s own second'],
  gps: ['GPS receiver', 'UTC, via GPS'],
};

/** Two pulses to a counter; the one that starts it stands on top. */
export function WiringDrawing({ wiring }: { wiring: WiringValues }) {
  const cableOf = (pulse: Pulse) => (pulse === 'gps' ? wiring.gpsCableSeconds : wiring.stationCableSeconds);
  return (
    <svg viewBox="0 0 500 118" className="wiring" aria-hidden="true">
      {(
        [
          [wiring.counterStart, 4, 'starts the count', 'var(--teal)', 34],
          [wiring.counterStop, 74, 'stops the count', 'var(--ink)', 82],
        ] as const
      ).map(([pulse, top, word, colour, into]) => {
        const y = top + 20;
        const [name, what] = NAMES[pulse];
        return (
          <g key={word}>
            <rect
              x="1"
              y={top}
              width="112"
              height="40"
              fill="var(--sheet)"
              stroke="var(--ink)"
              strokeWidth={1.5}
            />
            <text x="57" y={top + 17} fontSize={12.5} fontWeight={600} textAnchor="middle">
              {name}
            </text>
            <text x="57" y={top + 32} fontSize={11} textAnchor="middle" style={{ fill: 'var(--ink2)' }}>
              {what}
            </text>
            <path
              d={`M113 ${y}H224V${into}H334`}
              fill="none"
              stroke={colour}
              strokeWidth={top === 4 ? 2 : 1.5}
            />
            <path d={`M342 ${into}l-9 -4.5v9z`} fill={colour} />
            <text x="122" y={top === 4 ? y - 6 : y + 14} fontSize={11}>
              cable {(cableOf(pulse) * 1e9).toFixed(1)} ns
            </text>
            <text x="232" y={into - 6} fontSize={12} fontWeight={600} style={{ fill: colour }}>
              {word}
            </text>
          </g>
        );
      })}
      <rect
        x="342"
        y="16"
        width="112"
        height="86"
        fill="var(--sheet)"
        stroke="var(--ink)"
        strokeWidth={1.5}
      />
      <text x="398" y="52" fontSize={12.5} fontWeight={600} textAnchor="middle">
        Counter
      </text>
      <text x="398" y="68" fontSize={11} textAnchor="middle" style={{ fill: 'var(--ink2)' }}>
        counts forward
      </text>
      <text x="398" y="82" fontSize={11} textAnchor="middle" style={{ fill: 'var(--ink2)' }}>
        0 to 1 s
      </text>
      <path d="M454 59H490" stroke="var(--ink)" strokeWidth={1.5} />
      <path d="M498 59l-9 -4.5v9z" fill="var(--ink)" />
      <text x="466" y="50" fontSize={11}>
        log
      </text>
    </svg>
  );
}
