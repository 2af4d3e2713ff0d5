'use client';

import { useRef, useState, type ChangeEvent } from 'react';
import { Dialog } from '@/app/_ui/dialog';
import type { StationDto } from '@/src/data/station/dto';
import type { TypedRow } from '@/src/exchange/catalogue/block';
import { STATION_BLOCKS } from '@/src/exchange/catalogue/station';
import type { Corner } from '@/src/exchange/catalogue/station-site';
import { HORIZON_FILE_MOST, readHorizonFile, type HorizonFile } from '@/src/exchange/horizon-file';
import { limitsOf } from './horizon-view';
import { MaskDrawing } from './mask-drawing';

const SHOWN = 8;
const COLUMNS = STATION_BLOCKS.horizon.rows.horizon.columns;

type Props = { station: StationDto; rows: readonly TypedRow[]; onRows: (rows: TypedRow[]) => void };

/** Beside the table of a mask that is being edited: corners to drag, and a file to take them from. */
export function HorizonAid({ station, rows, onRows }: Props) {
  const [file, setFile] = useState<(HorizonFile & { name: string }) | null>(null);
  const [trouble, setTrouble] = useState<string | null>(null);
  const input = useRef<HTMLInputElement>(null);
  const drawn = rows.map(cornerOf);

  const look = async ({ target }: ChangeEvent<HTMLInputElement>) => {
    const [chosen] = target.files ?? [];
    target.value = '';
    setTrouble(null);
    if (!chosen) return;
    if (chosen.size > HORIZON_FILE_MOST)
      return setTrouble(`“${chosen.name}” is too large for a mask: ${HORIZON_FILE_MOST / 1000} kB at most.`);
    const read = readHorizonFile(await chosen.text());
    if (read.corners.length === 0 && read.wrong.length === 0)
      return setTrouble(
        `“${chosen.name}” holds no corner. It takes two columns, azimuth and elevation in degrees.`,
      );
    setFile({ ...read, name: chosen.name });
  };
  const move = (index: number, corner: Corner) => {
    const known = drawn.flatMap((one, at) => (one ? [at] : []))[index];
    onRows(rows.map((row, at) => (at === known ? rowOf(corner) : row)));
  };

  return (
    <div className="mb-2">
      <MaskDrawing
        corners={drawn.flatMap((one) => one ?? [])}
        limits={limitsOf(station.blocks.mount)}
        latitudeDeg={station.site.latitudeDeg}
        paths={[]}
        onMove={move}
      />
      <p className="help">Drag a corner, or type in the table.</p>
      <input
        ref={input}
        type="file"
        accept=".txt,.csv,.dat,text/plain,text/csv"
        className="sr-only"
        tabIndex={-1}
        aria-label="A file with two columns"
        onChange={(event) => void look(event)}
      />
      <button type="button" className="btn btn-sm mt-1" onClick={() => input.current?.click()}>
        Upload a file
      </button>
      {trouble !== null && (
        <p role="alert" className="error-box mt-1">
          {trouble}
        </p>
      )}
      <Preview
        file={file}
        station={station}
        onClose={() => setFile(null)}
        onTake={(corners) => {
          onRows(corners.map(rowOf));
          setFile(null);
        }}
      />
    </div>
  );
}

type PreviewProps = {
  file: (HorizonFile & { name: string }) | null;
  station: StationDto;
  onClose: () => void;
  onTake: (corners: readonly Corner[]) => void;
};

/** What a file would make of the mask, and each line of it that cannot be read; nothing is taken before it is said. */
function Preview({ file, station, onClose, onTake }: PreviewProps) {
  const corners = file?.corners ?? [];
  const wrong = file?.wrong ?? [];
  const count = `${corners.length} ${corners.length === 1 ? 'corner' : 'corners'}`;
  return (
    <Dialog
      isOpen={file !== null}
      title={file ? `The mask in ${file.name}` : ''}
      onClose={onClose}
      actions={
        <>
          <button type="button" className="btn" onClick={onClose}>
            Leave it
          </button>
          {corners.length > 0 && (
            <button type="button" className="btn btn-primary" onClick={() => onTake(corners)}>
              Take {count}
            </button>
          )}
        </>
      }
    >
      {corners.length > 0 && (
        <MaskDrawing
          corners={corners}
          limits={limitsOf(station.blocks.mount)}
          latitudeDeg={station.site.latitudeDeg}
          paths={[]}
        />
      )}
      <p>
        {corners.length === 0
          ? 'No line of it can be read.'
          : `${count} in place of the ${station.blocks.horizon.horizon.length} that stand now. They are kept with “Keep mask”.`}
        {corners.length === 1 && ' With one corner the mask is level all round.'}
      </p>
      {wrong.length > 0 && (
        <div className="error-box mt-2">
          <p>
            <b>
              {wrong.length} {wrong.length === 1 ? 'line' : 'lines'} cannot be read
            </b>
            {corners.length > 0 && ' and would be left out'}:
          </p>
          <ul>
            {wrong.slice(0, SHOWN).map(({ line, text, message }) => (
              <li key={line}>
                Line {line}, “{text}”: {message}
              </li>
            ))}
          </ul>
          {wrong.length > SHOWN && <p>and {wrong.length - SHOWN} more.</p>}
        </div>
      )}
    </Dialog>
  );
}

/** A row as a corner, where both its cells can be read. */
function cornerOf(row: TypedRow): Corner | null {
  const azimuth = COLUMNS.azimuthDeg.read(row.azimuthDeg ?? '');
  const elevation = COLUMNS.elevationDeg.read(row.elevationDeg ?? '');
  return azimuth.ok && elevation.ok ? { azimuthDeg: azimuth.value, elevationDeg: elevation.value } : null;
}

const rowOf = ({ azimuthDeg, elevationDeg }: Corner): TypedRow => ({
  azimuthDeg: COLUMNS.azimuthDeg.write(azimuthDeg),
  elevationDeg: COLUMNS.elevationDeg.write(elevationDeg),
});
