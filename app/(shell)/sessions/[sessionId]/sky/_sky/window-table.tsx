import { numberText } from '@/app/_ui/format';
import type { SkySheet } from '@/src/data/sky/dto';
import { sourceWords } from '../../../_plan/source-words';
import { markText, type Mark, type Row } from './model';
import { hoursText } from './words';
import { Spans } from './spans';

type Props = { sheet: SkySheet; rows: readonly Row[]; mark: Mark; count: number };

/** The same as the rows of bars, in words. */
export function WindowTable({ sheet, rows, mark, count }: Props) {
  const codes = rows[0]?.bars.map(({ code }) => code) ?? [];
  return (
    <div
      className="min-w-0 overflow-x-auto p-3.5 outline-offset-[-2px]"
      role="region"
      aria-label="Windows of every source"
      tabIndex={0}
    >
      <table className="tt min-w-[760px]">
        <caption className="help mb-1 text-left">
          When the chosen stations see each source, UT, to the whole minutes inside. Lengths in h:min.
        </caption>
        <thead>
          <tr>
            <th scope="col">Source</th>
            {codes.map((code) => (
              <th key={code} scope="col">
                {code}
              </th>
            ))}
            <th scope="col">All {count}</th>
            {mark.kind !== 'all' && <th scope="col">{markText(mark, count)}</th>}
            <th scope="col" className="num">
              Sun °
            </th>
            <th scope="col" className="num">
              Moon °
            </th>
          </tr>
        </thead>
        <tbody>
          {rows.map(({ source, bars, all, marked }) => (
            <tr key={source.id}>
              <th scope="row" className="text-left">
                <b>{source.name}</b>
                <div className="whitespace-nowrap text-tick text-ink2">{sourceWords(source)}</div>
              </th>
              {bars.map(({ code, spans }) => (
                <td key={code}>
                  <Spans spans={spans} sheet={sheet} />
                </td>
              ))}
              <td>
                <Spans spans={all} sheet={sheet} />
                <div className="text-ink2">{all.length > 0 && hoursText(all)}</div>
              </td>
              {mark.kind !== 'all' && (
                <td>
                  <Spans spans={marked} sheet={sheet} />
                  <div className="text-ink2">{marked.length > 0 && hoursText(marked)}</div>
                </td>
              )}
              <td className="num">{numberText(source.sunDeg)}</td>
              <td className="num">{numberText(source.moonDeg)}</td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}
