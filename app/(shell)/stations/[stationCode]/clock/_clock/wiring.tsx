import type { StationClockDto } from '@/src/data/clock/dto';
import type { Pulse } from '@/src/clock/reading';

const PULSES: Readonly<Record<Pulse, string>> = {
  formatter: 'Formatter PPS',
  maser: 'Maser PPS',
  gps: 'GPS PPS',
};

/** How the counter is wired: the starting pulse on top and teal; then the sign in words. */
export function Wiring({ station }: { station: StationClockDto['station'] }) {
  const { counterStart, counterStop } = station;
  const sign =
    counterStart === 'gps'
      ? 'What it shows is the station’s delay after GPS: early is nearly a full second.'
      : 'What it shows is how long the station comes before GPS: late is nearly a full second.';
  return (
    <figure>
      <svg
        viewBox="0 0 360 52"
        className="block w-full max-w-[360px]"
        role="img"
        aria-label={`${PULSES[counterStart]} starts the counter, ${PULSES[counterStop]} stops it. ${sign}`}
      >
        {(
          [
            [counterStart, 'start', 2, 'var(--teal)'],
            [counterStop, 'stop', 30, 'var(--ink)'],
          ] as const
        ).map(([pulse, word, y, colour]) => (
          <g key={word}>
            <rect x={0.75} y={y} width={100} height={19} fill="none" stroke={colour} strokeWidth={1.25} />
            <text x={7} y={y + 14} fontSize={12} style={{ fontStretch: '80%' }}>
              {PULSES[pulse]}
            </text>
            <path d={`M101 ${y + 9.5}h158`} stroke={colour} strokeWidth={1.25} />
            <path d={`M259 ${y + 5.5}l8 4-8 4z`} fill={colour} />
            <text x={274} y={y + 14} fontSize={12} fontWeight={600}>
              {word}
            </text>
          </g>
        ))}
        <rect x={267} y={1} width={92} height={49} fill="none" stroke="var(--ink)" strokeWidth={1.25} />
        <text x={308} y={30} fontSize={12}>
          counter
        </text>
      </svg>
      <figcaption className="help">{sign}</figcaption>
    </figure>
  );
}
