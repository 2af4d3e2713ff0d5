import { numberText } from '@/app/_ui/format';
import type { CoverageSheet } from '@/src/data/coverage/dto';
import type { Extreme } from '@/src/outlook/coverage';
import { listText } from '@/src/schedule/words';
import { sourceWords } from '../../../_plan/source-words';
import { baselineHours, endsText, MAS_PER_RAD, MEGA } from './model';

type Shown = NonNullable<CoverageSheet['shown']>;

/** What the scans of a source give an image. */
export function NumbersPanel({ shown }: { shown: Shown }) {
  const { coverage, band, modes } = shown;
  const { longest, shortest, resolutionRad, largestScaleRad, imageNoiseJy, withoutSefd } = coverage;
  return (
    <aside
      aria-label="Numbers"
      className="flex min-h-0 flex-col gap-3.5 overflow-y-auto border-rule px-4.5 py-3.5 desk:border-l"
    >
      <div>
        <h1 className="text-[22px] leading-[26px]">{shown.name}</h1>
        <p className="help">
          {sourceWords(shown)} · {band}
        </p>
        <p className="help">{modes.join(', ')}</p>
      </div>
      <table className="tt">
        <caption className="sr-only">
          Coverage of {shown.name} at {band}
        </caption>
        <tbody>
          <Line name="Scans" value={String(coverage.scans.length)} />
          <Line name="On source" value={numberText(coverage.onSourceSeconds / 60)} unit="min" />
          <Line name="Baseline hours" value={numberText(baselineHours(coverage), 1)} unit="h" />
          <ExtremeLine name="Longest" extreme={longest} />
          <ExtremeLine name="Shortest" extreme={shortest} />
          <Line name="Resolution" value={masText(resolutionRad)} unit="mas" />
          <Line name="Largest scale" value={masText(largestScaleRad)} unit="mas" />
          <Line
            name="Image noise"
            value={imageNoiseJy === null ? 'not known' : numberText(imageNoiseJy * 1e6)}
            unit={imageNoiseJy === null ? '' : 'µJy/beam'}
          />
        </tbody>
      </table>
      {withoutSefd.length > 0 && (
        <p className="help">
          The SEFD of {listText(withoutSefd)} at {band} is not known:{' '}
          {withoutSefd.length === 1 ? 'its' : 'their'} baselines are not in the noise.
        </p>
      )}
      <p className="help">
        Resolution and largest scale are λ over the longest and the shortest projected baseline. Noise is for
        natural weights, with SEFDs at zenith and no loss of coherence.
      </p>
    </aside>
  );
}

function ExtremeLine({ name, extreme }: { name: string; extreme: Extreme | null }) {
  if (!extreme) return <Line name={name} value="none" />;
  return (
    <Line
      name={name}
      value={numberText(extreme.wavelengths / MEGA, extreme.wavelengths < 10 * MEGA ? 1 : 0)}
      unit="Mλ"
      more={`${endsText(extreme)}, ${numberText(extreme.metres / 1000)} km`}
    />
  );
}

function Line({
  name,
  value,
  unit = '',
  more,
}: {
  name: string;
  value: string;
  unit?: string;
  more?: string;
}) {
  return (
    <tr>
      <th scope="row" className="text-left">
        {name}
        {more !== undefined && <div className="text-small text-ink2">{more}</div>}
      </th>
      <td className="num whitespace-nowrap">
        <b>{value}</b>
      </td>
      <td className="w-[64px] whitespace-nowrap !pl-1.5 text-ink2">{unit}</td>
    </tr>
  );
}

function masText(rad: number | null): string {
  if (rad === null) return 'none';
  const mas = rad * MAS_PER_RAD;
  return numberText(mas, mas < 1 ? 3 : mas < 10 ? 2 : 1);
}
