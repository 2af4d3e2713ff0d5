import { angleText } from '@/app/_ui/format';
import type { SkySheet, SkySource } from '@/src/data/sky/dto';
import type { StationCode } from '@/src/schedule/plan';
import { declinationText, rightAscensionText } from '@/src/units/sexagesimal';
import { sourceWords } from '../../../_plan/source-words';
import { Calibrators } from './calibrators';
import { highestOf, markText, togetherIn, windowsOf, type Mark } from './model';
import { hoursText, togetherSentence } from './words';
import { Spans } from './spans';

type Props = { sheet: SkySheet; source: SkySource; codes: readonly StationCode[]; mark: Mark };

/** The chosen source: where it is, when each station sees it, when they see it together. */
export function SourcePanel({ sheet, source, codes, mark }: Props) {
  const { table, band } = sheet;
  return (
    <aside
      aria-label="Chosen source"
      className="flex min-h-0 flex-col gap-[12px] overflow-y-auto border-rule px-[16px] py-[12px] desk:border-l"
    >
      <div>
        <h1 className="text-[22px] leading-[26px]">{source.name}</h1>
        <p className="text-ink2">
          {sourceWords(source)}
          {source.fluxJy !== null && band !== null && ` at ${band}`}
        </p>
        <p className="help">
          {rightAscensionText(source.position.raDeg)} {declinationText(source.position.decDeg)}, ICRS
        </p>
      </div>
      <section>
        <div className="mb-1 flex items-baseline justify-between">
          <h2 className="text-lead" id="sky-windows">
            Windows
          </h2>
          <span className="help">above mask and {angleText(sheet.minElevationDeg)}</span>
        </div>
        <table className="tt" aria-labelledby="sky-windows">
          <thead>
            <tr>
              <th scope="col">Station</th>
              <th scope="col">Up, UT</th>
              <th scope="col" className="num">
                Length
                <br />
                h:min
              </th>
              <th scope="col" className="num">
                Highest
              </th>
            </tr>
          </thead>
          <tbody>
            {sheet.stations.map(({ code }) => {
              const spans = windowsOf(table, source.id, code);
              const highest = highestOf(table, source.id, code);
              return (
                <tr key={code}>
                  <th scope="row" className="text-left">
                    <span className="code">{code}</span>
                  </th>
                  <td>
                    <Spans spans={spans} sheet={sheet} />
                  </td>
                  <td className="num">{hoursText(spans)}</td>
                  <td className="num">{highest ? angleText(highest.elevationDeg) : ''}</td>
                </tr>
              );
            })}
          </tbody>
        </table>
      </section>
      <Together sheet={sheet} source={source} codes={codes} mark={mark} />
      <section className="border-t-head border-ink pt-2">
        <h2 className="text-lead">Sun and Moon</h2>
        <dl className="mt-0.5">
          <Line term="Sun, at mid-session">
            <b>{angleText(source.sunDeg)}</b> away
          </Line>
          <Line term="Moon, at mid-session">
            <b>{angleText(source.moonDeg)}</b> away
          </Line>
        </dl>
      </section>
      <Calibrators key={source.id} sheet={sheet} source={source} />
    </aside>
  );
}

function Together({ sheet, source, codes, mark }: Props) {
  const leasts = [codes.length - 1, codes.length - 2].filter((least) => least >= 2);
  const marks: Mark[] = [
    { kind: 'all' },
    ...leasts.map((least) => ({ kind: 'least', least }) as const),
    ...(mark.kind === 'pair' || (mark.kind === 'least' && !leasts.includes(mark.least)) ? [mark] : []),
  ];
  const isSome = codes.length < sheet.stations.length;
  return (
    <section>
      <h3 className="mb-0.5">
        Together
        {isSome && codes.length > 0 && <span className="font-text text-ink2">, of {codes.join(', ')}</span>}
      </h3>
      {codes.length < 2 ? (
        <p className="help">Choose at least two stations above.</p>
      ) : (
        <>
          <dl>
            {marks.map((one) => (
              <Line key={markText(one, codes.length)} term={markText(one, codes.length)}>
                <Spans spans={togetherIn(sheet, source.id, codes, one)} sheet={sheet} />
              </Line>
            ))}
          </dl>
          <p className="help mt-1">
            {togetherSentence(whoText(mark, codes), source, togetherIn(sheet, source.id, codes, mark))}
          </p>
        </>
      )}
    </section>
  );
}

function whoText(mark: Mark, codes: readonly StationCode[]): string {
  if (mark.kind === 'pair') return `${mark.first} and ${mark.second}`;
  return mark.kind === 'all' ? `All ${codes.length} stations` : `At least ${mark.least} stations`;
}

function Line({ term, children }: { term: string; children: React.ReactNode }) {
  return (
    <div className="flex justify-between gap-2 border-b border-hair py-[3px] text-table last:border-b-0">
      <dt className="whitespace-nowrap text-ink2">{term}</dt>
      <dd className="text-right">{children}</dd>
    </div>
  );
}
