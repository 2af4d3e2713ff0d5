'use client';

import { useState } from 'react';
import { AnswerLegend } from '@/app/_ui/answer-legend';
import { EmptySheet } from '@/app/_ui/empty-sheet';
import { spanText } from '@/app/_ui/format';
import { liveKeys } from '@/app/_ui/live-keys';
import RefreshOn from '@/app/_ui/refresh-on';
import { staveOrder } from '@/app/_ui/stave-order';
import type { SlotBoard, SlotDto } from '@/src/data/slot/dto';
import { fullTimeText } from '@/src/schedule/words';
import type { Preview } from './answer-form';
import { AnswerPanel } from './answer-panel';
import { Hatch } from './bar';
import { Board } from './board';
import { OfferDialog } from './offer-dialog';
import { Unsent } from './unsent';

/** In the order of the staves. */
const eastward = (slots: readonly SlotDto[]): SlotDto[] =>
  staveOrder(
    slots.map((slot) => ({ slot, code: slot.stationCode, site: { longitudeDeg: slot.longitudeDeg } })),
  ).map(({ slot }) => slot);

const answerByText = (ms: number, nowMs: number): string => {
  const hours = Math.round(Math.abs(ms - nowMs) / 3_600_000);
  const span = hours < 48 ? `${hours} h` : `${Math.round(hours / 24)} days`;
  return `answer by ${fullTimeText(ms)}, ${ms < nowMs ? `${span} ago` : `in ${span}`}`;
};

const KINDS = { offer: 'Offer', publish: 'Version' } as const;

type Props = {
  board: SlotBoard;
  /** the session's stations in the order of the staves */
  codes: readonly string[];
  /** of what the board shows */
  stamp: string | undefined;
  /** open problems of the draft */
  toFix: number;
  /** chosen by the address */
  station: string | null;
};

/** What each station is asked for, and what it said. */
export function Slots({ board, codes, stamp, toFix, station }: Props) {
  const { session, offer, draft } = board;
  const slots = eastward(board.slots);
  const named = slots.find(({ stationCode }) => stationCode === station);
  const first = (named ?? slots.find(({ isOwn }) => isOwn) ?? slots[0])?.stationCode ?? null;
  const [picked, setChosen] = useState<string | null>(null);
  const chosen = picked ?? first;
  const [asked, setAsked] = useState<'offer' | 'publish' | null>(null);
  const [made, setMade] = useState<{ of: string; preview: Preview | null }>({ of: '', preview: null });
  const panelKey = `${chosen} ${offer?.id}`;
  const preview = made.of === panelKey ? made.preview : null;
  const slot = slots.find(({ stationCode }) => stationCode === chosen);
  const drawnOf = (one: SlotDto) => (one.stationCode === chosen && preview ? { ...one, ...preview } : one);
  const dialog = (
    <OfferDialog key={asked} board={board} kind={asked} toFix={toFix} onClose={() => setAsked(null)} />
  );
  const live = <RefreshOn address={liveKeys.stamp(session.id)} known={stamp} />;
  if (!offer) {
    return (
      <>
        {live}
        <EmptySheet
          heading="Nothing is offered yet"
          codes={codes}
          actions={
            board.canOffer && (
              <button
                type="button"
                className="btn btn-primary"
                aria-disabled={draft?.scans === 0}
                title={draft?.scans === 0 ? 'The plan has no scan yet.' : undefined}
                onClick={() => draft?.scans !== 0 && setAsked('offer')}
              >
                Offer {session.code} to its stations
              </button>
            )
          }
        >
          {draft?.scans === 0
            ? 'The plan has no scan yet: lay it out on the timeline first. Each station then gets the hours it is needed for.'
            : 'An offer asks each station for its hours, by mail and on its desk. Until then nobody at a station sees this plan.'}
        </EmptySheet>
        {dialog}
      </>
    );
  }
  const answered = slots.filter(({ answer }) => answer !== 'open').length;
  const hours = (list: readonly { startMs: number; endMs: number }[]) =>
    list.reduce((sum, { startMs, endMs }) => sum + (endMs - startMs) / 1000, 0);
  const given = slots.reduce(
    (sum, { answer, hours: said }) =>
      answer === 'confirmed' || answer === 'partly'
        ? sum + said.reduce((own, [from, until]) => own + (until - from) / 1000, 0)
        : sum,
    0,
  );
  const toAsk = slots.filter(({ answer }) => answer === 'stale');
  const declined = slots.reduce(
    (sum, { without }) => sum + without.reduce((own, [from, until]) => own + (until - from) / 1000, 0),
    0,
  );
  return (
    <>
      {live}
      <div className="slots-bar">
        <h1 className="text-h2">
          {KINDS[offer.kind]} {offer.number}, {fullTimeText(offer.madeAtMs)}
        </h1>
        <p className="help">
          {offer.answerByMs === null ? 'no time to answer by' : answerByText(offer.answerByMs, board.nowMs)}
          {offer.isBehind && draft && <b> · the draft has moved on since</b>}
        </p>
        {board.canOffer && (
          <div className="ml-auto flex gap-2">
            <button type="button" className="btn" onClick={() => setAsked('publish')}>
              Publish
            </button>
            <button type="button" className="btn btn-primary" onClick={() => setAsked('offer')}>
              Offer the plan anew
            </button>
          </div>
        )}
      </div>
      {board.unsent.length > 0 && <Unsent sessionId={session.id} unsent={board.unsent} />}
      {offer.note !== '' && <p className="slots-note">{offer.note}</p>}
      <Hatch />
      <div className="slots">
        <section aria-label="Slots" className="slots-main">
          <Board board={board} slots={slots} drawnOf={drawnOf} chosen={chosen} onChoose={setChosen} />
          {board.unasked.length > 0 && (
            <p className="help px-3.5 py-2">
              Without a scan in this offer, so not asked: {board.unasked.join(', ')}.
            </p>
          )}
          <AnswerLegend code={slots[0]?.stationCode ?? ''} />
          <p className="help px-3.5 pb-2">Thick line under the hours: 22 to 06 in the station’s time.</p>
          <p className="slots-sums">
            <span>
              <b>
                {answered} of {slots.length}
              </b>{' '}
              {slots.length === 1 ? 'station has' : 'stations have'} answered
            </span>
            <span>
              <b>{spanText(given)}</b> given of {spanText(hours(slots))}
            </span>
            {toAsk.length > 0 && (
              <span>
                <b>{spanText(hours(toAsk))}</b> to ask again
              </span>
            )}
            {declined > 0 && (
              <span>
                <b>{spanText(declined)}</b> declined
              </span>
            )}
          </p>
        </section>
        {slot && (
          <aside aria-label="Chosen station" className="slots-side">
            <AnswerPanel
              key={panelKey}
              sessionId={session.id}
              offerId={offer.id}
              span={board.span}
              slot={slot}
              drawn={drawnOf(slot)}
              onPreview={(preview) => setMade({ of: panelKey, preview })}
            />
          </aside>
        )}
      </div>
      {dialog}
    </>
  );
}
