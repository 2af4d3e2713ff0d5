import type { Tick } from '@/src/clock/reading';

type Props = { code: string; tick: Tick | null; error: string | undefined; onChoose: (tick: Tick) => void };

/** Two drawings; neither is chosen at first. */
export function TickChoice({ code, tick, error, onChoose }: Props) {
  return (
    <fieldset aria-describedby={error ? 'tick-error' : undefined}>
      <legend className="label">Which tick comes first?</legend>
      <div className="clk-ticks">
        {(
          [
            ['early', 'Early', `${code} tick before UTC`],
            ['late', 'Late', `${code} tick after UTC`],
          ] as const
        ).map(([value, word, help]) => (
          <button
            key={value}
            type="button"
            aria-pressed={tick === value}
            className="clk-tick"
            onClick={() => onChoose(value)}
          >
            <b>{word}</b>
            <span>{help}</span>
            <svg viewBox="0 0 150 22" aria-hidden="true" className="block w-full">
              <path d="M0 21h150" stroke="currentColor" />
              <path d={value === 'early' ? 'M34 21V3' : 'M96 21V3'} stroke="currentColor" strokeWidth={4} />
              <path d={value === 'early' ? 'M96 21V3' : 'M34 21V3'} stroke="currentColor" strokeWidth={1.5} />
            </svg>
          </button>
        ))}
      </div>
      {error && (
        <p id="tick-error" className="mt-1 text-small font-strong text-verm">
          {error}
        </p>
      )}
    </fieldset>
  );
}
