'use client';

import { Segments } from '@/app/_ui/segments';
import type { SkySheet } from '@/src/data/sky/dto';
import type { StationCode } from '@/src/schedule/plan';
import { pairsOf, pairText, type Mark } from './model';

type Props = {
  stations: SkySheet['stations'];
  codes: readonly StationCode[];
  onCodes: (codes: StationCode[]) => void;
  mark: Mark;
  onMark: (mark: Mark) => void;
  minElevationDeg: number;
};

/** Which stations are counted, and which times are marked. */
export function ToolBar({ stations, codes, onCodes, mark, onMark, minElevationDeg }: Props) {
  const toggle = (code: StationCode) =>
    onCodes(
      stations
        .map((station) => station.code)
        .filter((one) => (one === code ? !codes.includes(one) : codes.includes(one))),
    );
  return (
    <>
      <div className="flex items-center gap-2 px-3.5 py-1" role="group" aria-label="Stations counted">
        <span className="text-ink2">Stations</span>
        <span className="flex flex-wrap gap-1">
          {stations.map(({ code, name }) => (
            <button
              key={code}
              type="button"
              title={name}
              aria-label={`${code}, ${name}`}
              aria-pressed={codes.includes(code)}
              onClick={() => toggle(code)}
              className={`stn h-[24px] ${codes.includes(code) ? 'border-fill bg-fill text-on-ink' : 'border-dashed text-ink2'}`}
            >
              {code}
            </button>
          ))}
        </span>
      </div>
      <div className="flex flex-wrap items-center gap-2 border-rule px-3.5 py-1 desk:border-l">
        <span className="text-ink2">Mark times with</span>
        <MarkChoice stations={stations} count={codes.length} mark={mark} onMark={onMark} />
      </div>
      <p className="hidden border-rule px-3.5 py-1 text-ink2 wide:block wide:border-l">
        Lowest elevation {minElevationDeg}°, on top of masks
      </p>
    </>
  );
}

type ChoiceProps = {
  stations: SkySheet['stations'];
  count: number;
  mark: Mark;
  onMark: (mark: Mark) => void;
};

function MarkChoice({ stations, count, mark, onMark }: ChoiceProps) {
  const pairs = pairsOf(stations);
  const leasts = Array.from({ length: Math.max(0, count - 2) }, (_, index) => index + 2);
  const choose = (kind: Mark['kind']) => {
    const [pair] = pairs;
    if (kind === 'all') onMark({ kind });
    if (kind === 'least') onMark({ kind, least: Math.max(2, Math.ceil((count * 2) / 3)) });
    if (kind === 'pair' && pair) onMark({ kind, ...pair });
  };
  return (
    <>
      <Segments
        label="Mark times with"
        value={mark.kind}
        onChoose={choose}
        options={[
          { value: 'all', label: `All ${count}` },
          ...(leasts.length > 0 ? [{ value: 'least' as const, label: 'At least' }] : []),
          ...(pairs.length > 0 ? [{ value: 'pair' as const, label: 'One baseline' }] : []),
        ]}
      />
      {mark.kind === 'least' && (
        <select
          aria-label="At least so many stations"
          className="field w-[52px]"
          value={mark.least}
          onChange={(event) => onMark({ kind: 'least', least: Number(event.target.value) })}
        >
          {leasts.map((least) => (
            <option key={least}>{least}</option>
          ))}
        </select>
      )}
      {mark.kind === 'pair' && (
        <select
          aria-label="Baseline"
          className="field w-[92px]"
          value={pairText(mark)}
          onChange={(event) => {
            const pair = pairs.find((one) => pairText(one) === event.target.value);
            if (pair) onMark({ kind: 'pair', ...pair });
          }}
        >
          {pairs.map((pair) => (
            <option key={pairText(pair)}>{pairText(pair)}</option>
          ))}
        </select>
      )}
    </>
  );
}
