'use client';

import type { Route } from 'next';

import { formatInTimeZone } from 'date-fns-tz';
import Link from 'next/link';
import { useState } from 'react';
import { numberText } from '@/app/_ui/format';
import type { StationDto } from '@/src/data/station/dto';
import { STATION_BLOCKS } from '@/src/exchange/catalogue/station';
import { MOUNT_WORDS } from '@/src/exchange/catalogue/station-site';
import { ObjectBlock, type Editing } from '../../../_catalogue/object-block';
import { ObjectHead } from '../../../_catalogue/object-head';
import { latitudeText, longitudeText } from '../../_place/place-text';
import { keepBlock, retire } from '../actions';
import { MountView, PositionView, WrapView } from './site-views';
import { AllowancesView, BandsView, RecordingView, WiringView } from './signal-views';
import { AwayView, ContactsView } from './duty-views';
import { HorizonAid } from './horizon-aid';
import { HorizonView } from './horizon-view';
import '../../../_catalogue/object.css';
import './station.css';

export function StationPage({ station, nowMs }: { station: StationDto; nowMs: number }) {
  const { code, blocks, site, canEdit } = station;
  const [open, setOpen] = useState<string | null>(null);
  const editing: Editing = {
    open,
    setOpen,
    can: (name) => canEdit.some((one) => one === name),
    keep: (act) => keepBlock(code, act),
  };
  const zone = blocks.position.timeZone;

  return (
    <>
      <ObjectHead
        list={{ href: '/stations' as Route, label: 'Stations' }}
        name={blocks.position.name}
        mark={<span className="stn station-head-code">{code}</span>}
        sub={`${numberText(blocks.mount.dishM)} m ${MOUNT_WORDS[blocks.mount.mountKind].short} · ${latitudeText(site.latitudeDeg)} ${longitudeText(site.longitudeDeg)} · ${zone}, now ${formatInTimeZone(nowMs, zone, 'HH:mm')}`}
        noun="station"
        retiredAtMs={station.retiredAtMs}
        sessionsAhead={station.sessionsAhead}
        retire={station.canRetire ? (isRetired) => retire(code, isRetired) : null}
      >
        {station.canReadClock && (
          <Link href={`/stations/${code}/clock` as Route} className="btn">
            Clock log
          </Link>
        )}
        {station.canReadDesk && (
          <Link href={`/stations/${code}/desk` as Route} className="btn">
            Desk of {code}
          </Link>
        )}
      </ObjectHead>
      <div className="object-columns object-columns-3">
        <div className="object-column">
          <ObjectBlock
            name="position"
            block={STATION_BLOCKS.position}
            value={blocks.position}
            editing={editing}
          >
            <PositionView station={station} />
          </ObjectBlock>
          <ObjectBlock name="mount" block={STATION_BLOCKS.mount} value={blocks.mount} editing={editing}>
            <MountView mount={blocks.mount} />
          </ObjectBlock>
          <ObjectBlock name="wrap" block={STATION_BLOCKS.wrap} value={blocks.wrap} editing={editing}>
            <WrapView mount={blocks.mount} sectors={blocks.wrap.wrapSectors} />
          </ObjectBlock>
        </div>
        <div className="object-column">
          <ObjectBlock name="bands" block={STATION_BLOCKS.bands} value={blocks.bands} editing={editing}>
            <BandsView bands={blocks.bands.bands} />
          </ObjectBlock>
          <ObjectBlock name="wiring" block={STATION_BLOCKS.wiring} value={blocks.wiring} editing={editing}>
            <WiringView wiring={blocks.wiring} code={code} />
          </ObjectBlock>
          <ObjectBlock
            name="recording"
            block={STATION_BLOCKS.recording}
            value={blocks.recording}
            editing={editing}
          >
            <RecordingView recording={blocks.recording} freeAtMs={station.recorderFreeAtMs} />
          </ObjectBlock>
          <ObjectBlock
            name="allowances"
            block={STATION_BLOCKS.allowances}
            value={blocks.allowances}
            editing={editing}
          >
            <AllowancesView allowances={blocks.allowances} />
          </ObjectBlock>
        </div>
        <div className="object-column">
          <ObjectBlock
            name="horizon"
            block={STATION_BLOCKS.horizon}
            value={blocks.horizon}
            editing={editing}
            aid={(typed, onType) => (
              <HorizonAid
                station={station}
                rows={typeof typed.horizon === 'object' ? typed.horizon : []}
                onRows={(rows) => onType('horizon', rows)}
              />
            )}
          >
            <HorizonView station={station} />
          </ObjectBlock>
          <ObjectBlock name="away" block={STATION_BLOCKS.away} value={blocks.away} editing={editing}>
            <AwayView away={blocks.away.away} timeZone={zone} nowMs={nowMs} />
          </ObjectBlock>
          <ObjectBlock
            name="contacts"
            block={STATION_BLOCKS.contacts}
            value={blocks.contacts}
            editing={editing}
          >
            <ContactsView contacts={blocks.contacts.contacts} />
          </ObjectBlock>
        </div>
      </div>
    </>
  );
}
