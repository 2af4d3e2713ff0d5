import { normalise360 } from '../units/angle';
import { numberIn } from './catalogue/field';

export type MaskCorner = { azimuthDeg: number; elevationDeg: number };

/** What a file of two columns holds: its corners by azimuth, and each line that could not be read. */
export type HorizonFile = {
  corners: MaskCorner[];
  wrong: { line: number; text: string; message: string }[];
};

/** More bytes than the longest mask could have. */
export const HORIZON_FILE_MOST = 200_000;

const LONGEST = 60;

/**
 * A horizon mask from text of two columns: azimuth and elevation in degrees.
 *
 * @param text  columns apart by blanks, tab, comma or semicolon; "#" begins a remark; one head line is passed over
 * @returns corners by azimuth, [0, 360), those of one azimuth in the order of the file; azimuths from −180 on are read
 *          on the other side of north. A line that is wrong is told with its number and is not among the corners
 */
export function readHorizonFile(text: string): HorizonFile {
  const corners: MaskCorner[] = [];
  const wrong: HorizonFile['wrong'] = [];
  let isFirst = true;
  text.split(/\r\n|\r|\n/).forEach((whole, index) => {
    const line = whole.replace(/#.*$/, '').trim();
    if (line === '') return;
    const cells = line.split(/[\s,;]+/).filter((cell) => cell !== '');
    const isHead = isFirst && cells.every((cell) => numberIn(cell) === null);
    isFirst = false;
    if (isHead) return;
    const read = cornerIn(cells);
    if (typeof read === 'string') wrong.push({ line: index + 1, text: short(line), message: read });
    else corners.push(read);
  });
  corners.sort((a, b) => a.azimuthDeg - b.azimuthDeg);
  return { corners, wrong };
}

/** The corner, or what is wrong with the line. */
function cornerIn(cells: readonly string[]): MaskCorner | string {
  const [first = '', second = ''] = cells;
  if (cells.length !== 2)
    return `It has ${cells.length} ${cells.length === 1 ? 'column' : 'columns'}, not two: azimuth and elevation.`;
  const [azimuthDeg, elevationDeg] = [numberIn(first), numberIn(second)];
  if (azimuthDeg === null) return `“${short(first)}” is no azimuth.`;
  if (elevationDeg === null) return `“${short(second)}” is no elevation.`;
  if (azimuthDeg < -180 || azimuthDeg > 360) return 'The azimuth is outside −180° to 360°.';
  if (elevationDeg < 0 || elevationDeg > 90) return 'The elevation is outside 0° to 90°.';
  return { azimuthDeg: normalise360(azimuthDeg), elevationDeg };
}

const short = (text: string) => (text.length > LONGEST ? `${text.slice(0, LONGEST)}…` : text);
