import { angleText, numberText } from '@/app/_ui/format';
import type { StationDto } from '@/src/data/station/dto';
import { MOUNT_WORDS, type MountValues, type Sector } from '@/src/exchange/catalogue/station-site';
import { Pairs } from '../../../_catalogue/pairs';
import { latitudeText, longitudeText } from '../../_place/place-text';
import { WrapSpiral } from './wrap-spiral';
import { Scroll } from '../../../_catalogue/scroll';

export function PositionView({ station }: { station: StationDto }) {
  const { code, site, itrf, blocks } = station;
  const { name, positionKind, positionSigmaM: sigma, positionEpoch, timeZone } = blocks.position;
  const within = sigma === null ? '' : ` ± ${numberText(sigma, 3)}`;
  return (
    <>
      <Pairs
        pairs={[
          ['Code, name', `${code}, ${name}`],
          ['Latitude, WGS84', latitudeText(site.latitudeDeg, 6)],
          ['Longitude', longitudeText(site.longitudeDeg, 6)],
          ['Height, ellipsoid', `${numberText(site.heightM, 2)} m`],
          ['ITRF X', `${numberText(itrf.x, 3)}${within} m`],
          ['Y', `${numberText(itrf.y, 3)}${within} m`],
          ['Z', `${numberText(itrf.z, 3)}${within} m`],
          ['Epoch', positionEpoch === null ? 'not said' : String(positionEpoch)],
          ['Time zone', timeZone],
        ]}
      />
      <p className="help mt-1">
        {positionKind === 'itrf'
          ? 'ITRF was typed in; latitude, longitude and height are worked out from it.'
          : 'Latitude, longitude and height were typed in; ITRF is worked out from them.'}
      </p>
    </>
  );
}

export function MountView({ mount }: { mount: MountValues }) {
  const words = MOUNT_WORDS[mount.mountKind];
  return (
    <>
      <Scroll label="Axes">
        <table className="tt">
          <thead>
            <tr>
              <th scope="col">
                {words.short}, offset {numberText(mount.axisOffsetM, 2)} m
              </th>
              <th scope="col" className="num">
                From
              </th>
              <th scope="col" className="num">
                To
              </th>
              <th scope="col" className="num">
                Rate
                <br />
                °/min
              </th>
              <th scope="col" className="num">
                Start
                <br />
                °/s²
              </th>
            </tr>
          </thead>
          <tbody>
            <AxisRow
              name={words[1]}
              fromDeg={mount.axis1MinDeg}
              toDeg={mount.axis1MaxDeg}
              rate={mount.axis1RateDegPerS}
              start={mount.axis1AccelDegPerS2}
            />
            <AxisRow
              name={words[2]}
              fromDeg={mount.axis2MinDeg}
              toDeg={mount.axis2MaxDeg}
              rate={mount.axis2RateDegPerS}
              start={mount.axis2AccelDegPerS2}
            />
          </tbody>
        </table>
      </Scroll>
      <Pairs
        pairs={[
          ['Dish', `${numberText(mount.dishM)} m`],
          [
            'Observes between',
            `${angleText(mount.minElevationDeg, 1)} and ${angleText(mount.maxElevationDeg, 1)}`,
          ],
          ['Settling', `${numberText(mount.settleSeconds, 1)} s`],
          [
            'Nearest to the Sun',
            mount.sunLimitDeg === null ? 'no rule given' : angleText(mount.sunLimitDeg, 1),
          ],
        ]}
      />
      {words.note !== null && <p className="help mt-1">{words.note}</p>}
    </>
  );
}

type AxisRowProps = { name: string; fromDeg: number; toDeg: number; rate: number; start: number };

function AxisRow({ name, fromDeg, toDeg, rate, start }: AxisRowProps) {
  return (
    <tr>
      <th scope="row">{name}</th>
      <td className="num">{angleText(fromDeg, 1)}</td>
      <td className="num">{angleText(toDeg, 1)}</td>
      <td className="num">{numberText(rate * 60, 1)}</td>
      <td className="num">{numberText(start, 3)}</td>
    </tr>
  );
}

export function WrapView({ mount, sectors }: { mount: MountValues; sectors: readonly Sector[] }) {
  const { axis1MinDeg: minDeg, axis1MaxDeg: maxDeg } = mount;
  if (mount.mountKind !== 'az-el')
    return (
      <p className="help">
        {MOUNT_WORDS[mount.mountKind][1]} {angleText(minDeg)} to {angleText(maxDeg)}. The cable follows the
        axis and never turns over: each direction is reached in one way.
      </p>
    );
  const overlapDeg = maxDeg - minDeg - 360;
  return (
    <>
      <p className="help">
        Motor azimuth {angleText(minDeg)} to {angleText(maxDeg)}. From inside outward the motor turns
        clockwise.
      </p>
      <WrapSpiral minDeg={minDeg} maxDeg={maxDeg} sectors={sectors} />
      {sectors.length > 0 ? (
        <table className="tt">
          <thead>
            <tr>
              <th scope="col">Sector</th>
              <th scope="col" className="num">
                From
              </th>
              <th scope="col" className="num">
                To
              </th>
            </tr>
          </thead>
          <tbody>
            {sectors.map((sector) => (
              <tr key={`${sector.name} ${sector.minDeg}`}>
                <th scope="row">{sector.name}</th>
                <td className="num">{angleText(sector.minDeg, 1)}</td>
                <td className="num">{angleText(sector.maxDeg, 1)}</td>
              </tr>
            ))}
          </tbody>
        </table>
      ) : (
        <p className="help">No sectors are named.</p>
      )}
      <p className="help mt-1">
        {overlapDeg > 0
          ? `${angleText(overlapDeg)} of azimuth can be reached on two turns: the plan says which one.`
          : overlapDeg < 0
            ? `${angleText(-overlapDeg)} of azimuth cannot be reached at all.`
            : 'Each azimuth is reached on one turn.'}
      </p>
    </>
  );
}
