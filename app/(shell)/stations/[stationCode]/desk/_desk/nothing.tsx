import type { DeskDto } from '@/src/data/desk/dto';
import { EmptySheet } from '@/app/_ui/empty-sheet';
import { Slots } from './slots';
import { Tabs } from './tabs';
import { localTime, siderealTime } from './times';

/** Nothing was offered to the station yet, or all of it is over. */
export function Nothing({ desk, now }: { desk: DeskDto; now: number }) {
  const { code, name, timeZone } = desk.station;
  return (
    <>
      <div className="desk">
        <section aria-label="Next" className="desk-next">
          <EmptySheet heading={`Nothing is planned at ${name}`} codes={[code]}>
            When a scheduler offers a plan with a slot for {code}, it stands here: what is next, the way
            there, and how each scan went.
          </EmptySheet>
          <p className="help">
            Local time <b>{localTime(now, timeZone)}</b> {timeZone} · GMST <b>{siderealTime(now, desk)}</b>
          </p>
        </section>
        <aside aria-label="Station" className="desk-side">
          <Slots desk={desk} now={now} />
        </aside>
      </div>
      <Tabs code={code} />
    </>
  );
}
