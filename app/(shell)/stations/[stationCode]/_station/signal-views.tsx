import { numberText, signedText } from '@/app/_ui/format';
import { offsetFromCounter, offsetWords, type CounterWiring } from '@/src/clock/reading';
import {
  wiringSentence,
  type AllowanceValues,
  type RecordingValues,
  type StationBand,
  type WiringValues,
} from '@/src/exchange/catalogue/station-signal';
import { fullTimeText } from '@/src/schedule/words';
import { Pairs } from '../../../_catalogue/pairs';
import { WiringDrawing } from './wiring-drawing';
import { Scroll } from '../../../_catalogue/scroll';

export function BandsView({ bands }: { bands: readonly StationBand[] }) {
  if (bands.length === 0) {
    return <p className="help">No band has an SEFD: every fringe of this station is “no data”.</p>;
  }
  return (
    <Scroll label="Bands">
      <table className="tt">
        <thead>
          <tr>
            <th scope="col">Band</th>
            <th scope="col" className="num">
              SEFD zenith
              <br />
              Jy
            </th>
            <th scope="col" className="num">
              Opacity
              <br />
              zenith
            </th>
            <th scope="col" className="!pl-[18px]">
              Feeds
            </th>
            <th scope="col">Gain by elevation</th>
          </tr>
        </thead>
        <tbody>
          {bands.map(({ band, sefdJy, zenithOpacity, feeds, gainCurve }) => (
            <tr key={band}>
              <th scope="row">
                <b>{band}</b>
              </th>
              <td className="num">
                <b>{numberText(sefdJy)}</b>
              </td>
              <td className="num">{zenithOpacity === null ? 'none' : numberText(zenithOpacity, 3)}</td>
              <td className="!pl-[18px]">{feeds}</td>
              <td>
                {gainCurve.length === 0
                  ? 'flat'
                  : gainCurve.map(([deg, gain]) => `${deg}° ${gain.toFixed(2)}`).join(', ')}
              </td>
            </tr>
          ))}
        </tbody>
      </table>
    </Scroll>
  );
}

/** What the counter is shown to read, so that the sign can be checked by eye. */
const PLANTED_OFFSET_SECONDS = 3.214e-6;

export function WiringView({ wiring, code }: { wiring: WiringValues; code: string }) {
  const reading = plantedReading(wiring);
  return (
    <>
      <WiringDrawing wiring={wiring} />
      <p className="say">{wiringSentence(wiring).replace('the station is', `${code} is`)}</p>
      <p className="help mt-1">
        Check with a planted case: a counter reading of {reading.toFixed(9)} s gives{' '}
        <b>{offsetWords(offsetFromCounter(reading, counterOf(wiring)))}</b>.
      </p>
    </>
  );
}

const counterOf = ({ counterStart, counterStop, ...cables }: WiringValues): CounterWiring => ({
  start: counterStart,
  stop: counterStop,
  ...cables,
});

/** The reading at which this wiring gives the planted offset, to a nanosecond. */
function plantedReading(wiring: WiringValues): number {
  const cables = wiring.stationCableSeconds - wiring.gpsCableSeconds;
  const interval = (wiring.counterStart === 'gps' ? -1 : 1) * (PLANTED_OFFSET_SECONDS - cables);
  return Math.round((interval < 0 ? interval + 1 : interval) * 1e9) / 1e9;
}

export function RecordingView({
  recording,
  freeAtMs,
}: {
  recording: RecordingValues;
  freeAtMs: number | null;
}) {
  const rate = (bitsPerS: number | null) =>
    bitsPerS === null ? 'rate not said' : `up to ${numberText(bitsPerS / 1e6)} Mb/s`;
  return (
    <Pairs
      pairs={[
        ['Formatter', recording.formatter === '' ? 'not said' : recording.formatter],
        [
          'It samples',
          `${recording.bits} bit, ${recording.maxChannels === null ? 'channels not said' : `at most ${recording.maxChannels} channels`}, ${rate(recording.maxBitsPerS)}`,
        ],
        ['Recorder', recording.recorder === '' ? 'not said' : recording.recorder],
        ['It writes', rate(recording.recorderBitsPerS)],
        [
          'Free',
          recording.recorderFreeBytes === null
            ? 'not said'
            : `${numberText(recording.recorderFreeBytes / 1e12, 2)} TB${freeAtMs === null ? '' : `, said ${fullTimeText(freeAtMs)}`}`,
        ],
        [
          'Before a scan',
          `${numberText(recording.preScanSeconds)} s, calibration ${numberText(recording.calibrationSeconds)} s`,
        ],
      ]}
    />
  );
}

export function AllowancesView({ allowances }: { allowances: AllowanceValues }) {
  const {
    instrumentDelaySeconds: delay,
    instrumentDelaySigmaSeconds: sigma,
    instrumentDelayFromMs: fromMs,
  } = allowances;
  return (
    <>
      <Pairs
        pairs={[
          [
            'Instrument delay',
            delay === null || sigma === null
              ? 'not known'
              : `${signedText(delay * 1e6, 3)} ± ${numberText(sigma * 1e6, 3)} µs`,
          ],
          ['It holds from', fromMs === null ? 'not said' : fullTimeText(fromMs)],
          ['Stability floor', powerText(allowances.stabilityFloor)],
          ['Possible drift', <>{powerText(allowances.driftPerDay)} a day</>],
        ]}
      />
      <p className="help mt-1">
        Instrument delay: from the pulse to the recorded signal, positive = the signal is later. While it is
        not known, the session’s allowance is taken.
      </p>
    </>
  );
}

/** "2 · 10⁻¹⁴". */
function powerText(value: number) {
  if (value === 0) return '0';
  const power = Math.floor(Math.log10(value));
  const factor = Number((value / 10 ** power).toPrecision(3));
  return (
    <>
      {factor} · 10<sup>{String(power).replace('-', '\u2212')}</sup>
    </>
  );
}
