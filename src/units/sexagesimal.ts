import type { Entry } from './entry';

/**
 * A right ascension as people type it.
 *
 * @param text  hours "08 25 50.338", "08:25:50.338", "8h25m50.338s"; or degrees "126.4597431", "126.46°"
 * @returns degrees [0, 360), or a sentence; one number alone is degrees
 */
export function readRightAscension(text: string): Entry<number> {
  const typed = plain(text);
  const parts = sexagesimal(typed, 'h');
  if (parts) {
    if (parts.isNegative)
      return refuse(`${shown(text)} is below zero. A right ascension goes from 0 h to 24 h.`);
    const problem = partsProblem(text, parts, 'minutes of time', 'seconds of time');
    if (problem) return problem;
    if (parts.whole >= 24)
      return refuse(`${shown(text)} is over the end. A right ascension goes from 0 h to 24 h.`);
    return { ok: true, value: degreesOf(parts) * 15 };
  }
  const degrees = decimal(typed);
  if (degrees === null) {
    return refuse(`${shown(text)} is no right ascension. Type hours as 08 25 50.338, or degrees as 126.46.`);
  }
  if (degrees < 0 || degrees >= 360) {
    return refuse(`${shown(text)} is out of range. A right ascension in degrees lies between 0 and 360.`);
  }
  return { ok: true, value: degrees };
}

/**
 * A declination as people type it.
 *
 * @param text  "+03 09 24.5", "−24:07:38", "3d9m24.5s", "3°9′24.5″"; or degrees "3.1568111"
 * @returns degrees [−90, 90], or a sentence; "−00 10 00" keeps its sign
 */
export function readDeclination(text: string): Entry<number> {
  const typed = plain(text);
  const parts = sexagesimal(typed, 'd');
  const degrees = parts ? (parts.isNegative ? -degreesOf(parts) : degreesOf(parts)) : decimal(typed);
  if (parts) {
    const problem = partsProblem(text, parts, 'minutes of arc', 'seconds of arc');
    if (problem) return problem;
  }
  if (degrees === null) {
    return refuse(`${shown(text)} is no declination. Type it as +03 09 24.5, or in degrees as 3.1568.`);
  }
  if (Math.abs(degrees) > 90) {
    return refuse(`${shown(text)} is out of range. A declination lies between \u221290° and 90°.`);
  }
  return { ok: true, value: degrees + 0 };
}

/** "08 25 50.3383": hours, minutes, seconds to 0.1 ms of time. */
export function rightAscensionText(raDeg: number): string {
  const [hours, minutes, seconds] = split(raDeg / 15, 4);
  // rounded up to 24 h it is 0 h again
  return hours === '24' ? `00 ${minutes} ${seconds}` : `${hours} ${minutes} ${seconds}`;
}

/** "+03 09 24.520": degrees, minutes and seconds of arc, to a milliarcsecond; a true minus. */
export function declinationText(decDeg: number): string {
  const [degrees, minutes, seconds] = split(Math.abs(decDeg), 3);
  return `${decDeg < 0 ? '\u2212' : '+'}${degrees} ${minutes} ${seconds}`;
}

type Parts = { isNegative: boolean; whole: number; minutes: number; seconds: number };

const plain = (text: string) =>
  text
    .trim()
    .replaceAll(/[\u2212\u2013]/g, '-')
    .replaceAll(',', '.')
    .replaceAll(/[\u2009\u202f]/g, ' ')
    .toLowerCase();

function sexagesimal(text: string, whole: 'h' | 'd'): Parts | null {
  const marks = whole === 'h' ? 'h' : 'd°';
  const found = new RegExp(
    `^([+-]?)\\s*(\\d{1,3})\\s*[:\\s${marks}]\\s*(\\d{1,2})(?:\\s*[:\\sm'′]\\s*(\\d{1,2}(?:\\.\\d*)?)?\\s*[s"″]?)?$`,
  ).exec(text);
  if (!found) return null;
  const [, sign, first, minutes, seconds] = found;
  return {
    isNegative: sign === '-',
    whole: Number(first),
    minutes: Number(minutes),
    seconds: Number(seconds ?? 0),
  };
}

function decimal(text: string): number | null {
  const bare = text.replace(/\s*(°|deg|d)$/, '');
  return /^[+-]?(\d+\.?\d*|\.\d+)$/.test(bare) ? Number(bare) : null;
}

function partsProblem(text: string, { minutes, seconds }: Parts, minuteName: string, secondName: string) {
  if (minutes >= 60) return refuse(`${shown(text)} has ${minutes} ${minuteName}. They go from 0 to 59.`);
  if (seconds >= 60) return refuse(`${shown(text)} has ${seconds} ${secondName}. They stay below 60.`);
  return null;
}

const degreesOf = ({ whole, minutes, seconds }: Parts) => whole + minutes / 60 + seconds / 3600;

function split(value: number, decimals: number): [string, string, string] {
  const unit = 10 ** decimals;
  const ticks = Math.round(value * 3600 * unit);
  const seconds = (ticks % (60 * unit)) / unit;
  const minutes = Math.floor(ticks / (60 * unit));
  const two = (whole: number) => String(whole).padStart(2, '0');
  return [
    two(Math.floor(minutes / 60)),
    two(minutes % 60),
    seconds.toFixed(decimals).padStart(decimals + 3, '0'),
  ];
}

const shown = (text: string) => `“${text.trim().slice(0, 40)}”`;
const refuse = (message: string): { ok: false; message: string } => ({ ok: false, message });
