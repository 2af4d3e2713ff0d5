'use client';

import { FringeMark } from '@/app/_ui/fringe-mark';
import type { PlanSource, PlanStation } from '@/src/schedule/context';
import { VERDICTS, type Filter, type Outlook } from './model';

type Props = {
  filter: Filter;
  onFilter: (filter: Filter) => void;
  outlook: Outlook | null;
  stations: readonly PlanStation[];
  sources: readonly PlanSource[];
};

/** Verdicts, stations and source to show. */
export function FilterPanel({ filter, onFilter, outlook, stations, sources }: Props) {
  return (
    <aside
      aria-label="Filter"
      className="flex min-h-0 flex-col gap-[16px] overflow-y-auto border-b border-rule px-3.5 py-[12px] desk:border-b-0 desk:border-r"
    >
      <fieldset>
        <legend className="mb-1 font-head">Verdict</legend>
        {VERDICTS.map(([verdict, word]) => (
          <label key={verdict} className="flex h-[26px] items-center gap-2">
            <input
              type="checkbox"
              checked={filter.verdicts.has(verdict)}
              onChange={() => onFilter({ ...filter, verdicts: toggled(filter.verdicts, verdict) })}
            />
            <FringeMark verdict={verdict} />
            <span>{word}</span>
            <span className="ml-auto text-ink2">{outlook?.counts[verdict]}</span>
          </label>
        ))}
      </fieldset>
      <fieldset>
        <legend className="mb-1 font-head">Station</legend>
        {stations.map(({ code, name }) => (
          <label key={code} className="flex h-[26px] items-center gap-2">
            <input
              type="checkbox"
              checked={filter.stations.has(code)}
              onChange={() => onFilter({ ...filter, stations: toggled(filter.stations, code) })}
            />
            <span className="code">{code}</span>
            <span className="truncate">{name}</span>
          </label>
        ))}
      </fieldset>
      <div>
        <label className="label" htmlFor="fringes-source">
          Source
        </label>
        <select
          id="fringes-source"
          className="field"
          value={filter.sourceId ?? ''}
          onChange={(event) =>
            onFilter({ ...filter, sourceId: event.target.value === '' ? null : event.target.value })
          }
        >
          <option value="">All {sources.length}</option>
          {sources.map(({ id, name }) => (
            <option key={id} value={id}>
              {name}
            </option>
          ))}
        </select>
      </div>
      <p className="help mt-auto hidden desk:block">
        Arrow keys move the cell. <span className="kbd">N</span> goes to the next that fails.
      </p>
    </aside>
  );
}

function toggled<T>(set: ReadonlySet<T>, item: T): Set<T> {
  const next = new Set(set);
  if (!next.delete(item)) next.add(item);
  return next;
}
