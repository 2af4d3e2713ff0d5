import { csvText } from '@/app/_ui/csv';
import { offsetWords } from '@/src/clock/reading';
import type { StationClockDto } from '@/src/data/clock/dto';

const HEAD = [
  'station',
  'pulse',
  'time_utc',
  'offset_s (station clock minus UTC, via GPS, positive = early)',
  'in words',
  'from_fit_s',
  'state',
  'reason',
  'second_checked',
  'whole_seconds_off',
  'origin',
  'note',
];

/** Every reading of the log, oldest first, in seconds with an ASCII sign. */
export function clockCsv({ station, readings }: StationClockDto): string {
  const lines = readings.map((one) => [
    station.code,
    one.pulse,
    new Date(one.atMs).toISOString(),
    one.offsetSeconds.toExponential(6),
    offsetWords(one.offsetSeconds),
    one.fromFitSeconds === null ? '' : one.fromFitSeconds.toExponential(3),
    one.isFar ? 'far from the fit' : one.state,
    one.reason,
    one.secondCheck,
    one.secondOff ?? '',
    one.origin,
    one.note,
  ]);
  return csvText([HEAD, ...lines.reverse()]);
}
