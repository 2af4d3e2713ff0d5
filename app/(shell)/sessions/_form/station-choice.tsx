import { staveOrder } from '@/app/_ui/stave-order';
import type { SessionChoices } from '@/src/data/session/choices';

type Props = {
  choices: SessionChoices['stations'];
  chosen: readonly string[];
  error: string | undefined;
  onChoose: (codes: string[]) => void;
};

/** Stations to tick, in the order of the staves. */
export function StationChoice({ choices, chosen, error, onChoose }: Props) {
  const ordered = staveOrder(choices);
  if (choices.length === 0)
    return <p className="help">There is no station yet: add them under Stations first.</p>;
  return (
    <fieldset aria-describedby={error ? 'stations-error' : undefined}>
      <legend className="sr-only">Stations that take part</legend>
      <div className="flex flex-wrap gap-1.5">
        {ordered.map(({ code, name, isRetired }) => (
          <label key={code} className="sform-station">
            <input
              type="checkbox"
              checked={chosen.includes(code)}
              aria-invalid={error !== undefined || undefined}
              onChange={({ target }) =>
                onChoose(target.checked ? [...chosen, code] : chosen.filter((one) => one !== code))
              }
            />
            <b className="font-serif">{code}</b> {name}
            {isRetired && <span className="text-ink3"> (retired)</span>}
          </label>
        ))}
      </div>
      {error && (
        <p id="stations-error" className="mt-1 text-small font-strong text-verm">
          {error}
        </p>
      )}
    </fieldset>
  );
}
