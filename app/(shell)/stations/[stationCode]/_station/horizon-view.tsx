'use client';

import { useId, useState } from 'react';
import { angleText } from '@/app/_ui/format';
import type { StationDto } from '@/src/data/station/dto';
import type { MountValues } from '@/src/exchange/catalogue/station-site';
import { Scroll } from '../../../_catalogue/scroll';
import { MaskDrawing, type SkyPath } from './mask-drawing';

/** The mask as a drawing and a table, with the mount's limits and the paths of chosen sources over it. */
export function HorizonView({ station }: { station: StationDto }) {
  const { site, blocks, skySources } = station;
  const [chosen, setChosen] = useState<readonly string[]>([]);
  const corners = blocks.horizon.horizon;
  const paths = chosen.flatMap((id) => skySources.find((one) => one.id === id) ?? []);
  const lowest = angleText(blocks.mount.minElevationDeg, 1);
  return (
    <>
      <div className="mask">
        <MaskDrawing
          corners={corners}
          limits={limitsOf(blocks.mount)}
          latitudeDeg={site.latitudeDeg}
          paths={paths}
        />
        {corners.length > 0 && (
          <Scroll label="Corners" className="mask-table">
            <table className="tt">
              <thead>
                <tr>
                  <th scope="col" className="num">
                    Az °
                  </th>
                  <th scope="col" className="num">
                    El °
                  </th>
                </tr>
              </thead>
              <tbody>
                {corners.map(({ azimuthDeg, elevationDeg }, index) => (
                  <tr key={index}>
                    <td className="num">{azimuthDeg}</td>
                    <td className="num">{elevationDeg.toFixed(1)}</td>
                  </tr>
                ))}
              </tbody>
            </table>
          </Scroll>
        )}
      </div>
      <PathChoice sources={skySources} chosen={paths} onChoose={setChosen} />
      <p className="help mt-1">
        {corners.length === 0
          ? 'No mask: the horizon is free.'
          : `${corners.length} corners, straight lines between them, closed at 360°.`}{' '}
        Dashed: the lowest elevation of {lowest}
        {paths.length > 0 && ', and what the mount does not reach'}.
      </p>
    </>
  );
}

type ChoiceProps = {
  sources: readonly SkyPath[];
  chosen: readonly SkyPath[];
  onChoose: (ids: readonly string[]) => void;
};

function PathChoice({ sources, chosen, onChoose }: ChoiceProps) {
  const id = useId();
  // chosen first and drawn by the button: arrow keys run through the list without drawing each
  const [picked, setPicked] = useState('');
  const ids = chosen.map((one) => one.id);
  const left = sources.filter((one) => !ids.includes(one.id));
  if (sources.length === 0) return null;
  return (
    <form
      className="mt-2 flex flex-wrap items-center gap-1.5"
      aria-label="Paths over the mask"
      onSubmit={(event) => {
        event.preventDefault();
        if (picked === '') return;
        onChoose([...ids, picked]);
        setPicked('');
      }}
    >
      <label className="help" htmlFor={id}>
        Path of
      </label>
      <select
        id={id}
        className="field w-[150px]"
        value={picked}
        onChange={({ target }) => setPicked(target.value)}
      >
        <option value="">Choose a source</option>
        {left.map(({ id: value, name }) => (
          <option key={value} value={value}>
            {name}
          </option>
        ))}
      </select>
      <button type="submit" className="btn" aria-disabled={picked === ''}>
        Draw
      </button>
      {chosen.map(({ id: value, name }) => (
        <button
          key={value}
          type="button"
          className="btn btn-sm"
          aria-label={`Take the path of ${name} away`}
          onClick={() => onChoose(ids.filter((one) => one !== value))}
        >
          {name} <span aria-hidden="true">×</span>
        </button>
      ))}
    </form>
  );
}

export function limitsOf(mount: MountValues) {
  const isAzEl = mount.mountKind === 'az-el';
  return {
    lowestDeg: isAzEl ? Math.max(mount.minElevationDeg, mount.axis2MinDeg) : mount.minElevationDeg,
    highestDeg: isAzEl ? Math.min(mount.maxElevationDeg, mount.axis2MaxDeg) : mount.maxElevationDeg,
    azimuthMinDeg: isAzEl ? mount.axis1MinDeg : 0,
    azimuthMaxDeg: isAzEl ? mount.axis1MaxDeg : 360,
  };
}
