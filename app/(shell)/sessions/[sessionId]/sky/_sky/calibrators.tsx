'use client';

import { useId, useState } from 'react';
import useSWR from 'swr';
import { angleText, numberText } from '@/app/_ui/format';
import { liveKeys } from '@/app/_ui/live-keys';
import { showToast } from '@/app/_ui/toast';
import { Trouble } from '@/app/_ui/trouble';
import { useSending } from '@/app/_ui/use-sending';
import type { Failure } from '@/src/data/errors';
import { numberIn } from '@/src/exchange/catalogue/field';
import type { Nearby, NearbySource, SkySheet, SkySource } from '@/src/data/sky/dto';
import { addSource } from '../actions';

const FIRST_DEG = 20;

type Props = { sheet: SkySheet; source: SkySource };

/** Catalogue sources around the chosen one that could calibrate it, and the way to take one in. */
export function Calibrators({ sheet, source }: Props) {
  const id = useId();
  const [typed, setTyped] = useState(String(FIRST_DEG));
  const [chosenId, setChosenId] = useState<string | null>(null);
  const withinDeg = readDegrees(typed);
  const address = withinDeg === null ? null : liveKeys.nearby(sheet.session.id, source.id, withinDeg);
  const { data, error, isLoading, mutate } = useSWR<Nearby, Error>(address, readNearby, {
    keepPreviousData: true,
    revalidateOnFocus: false,
  });
  const chosen = data?.sources.find((one) => one.id === chosenId) ?? data?.sources[0];
  return (
    <section className="border-t-head border-ink pt-2" aria-labelledby={`${id}-head`} aria-busy={isLoading}>
      <div className="mb-1 flex items-baseline justify-between gap-2">
        <h2 className="text-lead" id={`${id}-head`}>
          Nearby calibrators
        </h2>
        <label className="help flex items-center gap-1 whitespace-nowrap">
          within
          <input
            className="field h-[24px] w-[44px] px-1 text-right"
            inputMode="decimal"
            value={typed}
            aria-label="Calibrators within so many degrees"
            aria-invalid={withinDeg === null}
            aria-describedby={withinDeg === null ? `${id}-wrong` : undefined}
            onChange={(event) => setTyped(event.target.value)}
          />
          °
        </label>
      </div>
      {withinDeg === null ? (
        <p id={`${id}-wrong`} role="alert" className="text-small font-strong text-verm">
          Type degrees above 0, up to 180.
        </p>
      ) : error ? (
        <p role="alert" className="error-box">
          {error instanceof TypeError ? 'There is no line.' : error.message}{' '}
          <button type="button" className="link" onClick={() => void mutate()}>
            Look again
          </button>
        </p>
      ) : !data ? (
        <p className="help">Looking through the catalogue</p>
      ) : data.sources.length === 0 ? (
        <p className="help">
          The catalogue has no calibrator within {angleText(data.withinDeg)} of {source.name}.
        </p>
      ) : (
        <>
          <NearbyTable labelId={`${id}-head`} sources={data.sources} chosen={chosen} onChoose={setChosenId} />
          <p className="help mt-1">
            Angle from north through east. “Up too” is the part of {source.name}’s station-hours in which the
            other is up as well.
            {data.more > 0 && ` ${data.more} more are farther away.`}
          </p>
          {data.canAdd && chosen && <Add sheet={sheet} chosen={chosen} onAdded={() => void mutate()} />}
        </>
      )}
    </section>
  );
}

type TableProps = {
  labelId: string;
  sources: readonly NearbySource[];
  chosen: NearbySource | undefined;
  onChoose: (id: string) => void;
};

function NearbyTable({ labelId, sources, chosen, onChoose }: TableProps) {
  return (
    <table className="tt" aria-labelledby={labelId}>
      <thead>
        <tr>
          <th scope="col">Source</th>
          <th scope="col" className="num">
            Away
          </th>
          <th scope="col" className="num">
            Angle
          </th>
          <th scope="col" className="num">
            Flux
            <br />
            Jy
          </th>
          <th scope="col" className="num">
            Up
            <br />
            too
          </th>
        </tr>
      </thead>
      <tbody>
        {sources.map((one) => (
          <tr key={one.id} className={one === chosen ? 'bg-wash' : undefined}>
            <th scope="row" className="text-left">
              <button
                type="button"
                aria-pressed={one === chosen}
                onClick={() => onChoose(one.id)}
                className="font-head"
                title={one.isInSession ? 'On the session’s list' : undefined}
              >
                {one.name}
              </button>
            </th>
            <td className="num">{angleText(one.separationDeg, 1)}</td>
            <td className="num">{angleText(one.positionAngleDeg)}</td>
            <td className="num">{one.fluxJy === null ? '' : numberText(one.fluxJy, 2)}</td>
            <td className="num">{one.upToo === null ? '' : `${numberText(100 * one.upToo)}%`}</td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}

function Add({ sheet, chosen, onAdded }: { sheet: SkySheet; chosen: NearbySource; onAdded: () => void }) {
  const { trouble, isSending, send } = useSending();
  if (chosen.isInSession)
    return (
      <p className="help mt-1.5">
        {chosen.name} is one of {sheet.session.code}’s sources.
      </p>
    );
  const add = async () => {
    const answer = await send(() => addSource(sheet.session.id, { sourceId: chosen.id }));
    if (!answer?.ok) return;
    showToast({ message: `${answer.name} is one of ${sheet.session.code}’s sources now.` });
    onAdded();
  };
  return (
    <div className="mt-2 flex flex-col items-start gap-1.5">
      <button type="button" className="btn" aria-disabled={isSending} onClick={() => void add()}>
        Add {chosen.name} to the session
      </button>
      <Trouble says={trouble} />
    </div>
  );
}

function readDegrees(typed: string): number | null {
  const degrees = numberIn(typed);
  return degrees !== null && degrees > 0 && degrees <= 180 ? degrees : null;
}

async function readNearby(address: string): Promise<Nearby> {
  const response = await fetch(address, { cache: 'no-store' });
  const answer = (await response.json()) as { ok: true; nearby: Nearby } | Failure;
  if (!answer.ok) throw new Error(answer.message);
  return answer.nearby;
}
