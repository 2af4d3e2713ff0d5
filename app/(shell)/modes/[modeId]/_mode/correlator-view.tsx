import { numberText, signedText } from '@/app/_ui/format';
import { delayWindowSeconds, rateWindow, windowAmplitude } from '@/src/clock/search-window';
import { plainChannel, type Channel, type CorrelatorValues } from '@/src/exchange/catalogue/mode';
import { summaryOf } from '@/src/schedule/mode-channels';
import { Pairs } from '../../../_catalogue/pairs';

type Props = { correlator: CorrelatorValues; channels: readonly Channel[] };

const WIDTH = 332;
const CENTRE = WIDTH / 2;
const REACH = CENTRE - 26;
const TOP = 12;
const FOOT = 84;

export function CorrelatorView({ correlator, channels }: Props) {
  const { integrationSeconds, spectralChannels } = correlator;
  const { skyHz, channelBandwidthHz } = summaryOf(channels.map(plainChannel));
  const delaySeconds = delayWindowSeconds(spectralChannels, channelBandwidthHz);
  const rate = rateWindow(integrationSeconds, skyHz);
  return (
    <>
      <Pairs
        pairs={[
          ['Integration time', `${numberText(integrationSeconds, 2)} s`],
          [
            'Spectral channels',
            `${numberText(spectralChannels)} in ${numberText(channelBandwidthHz / 1e6)} MHz`,
          ],
          ['Their spacing', `${numberText(channelBandwidthHz / spectralChannels / 1e3, 1)} kHz`],
          ['Delay search window', <b key="delay">± {numberText(delaySeconds * 1e6, 3)} µs</b>],
        ]}
      />
      <WindowDrawing delaySeconds={delaySeconds} />
      <Pairs
        pairs={[
          ['Fringe-rate window', `± ${numberText(500 / integrationSeconds)} mHz`],
          ['As a clock rate', `± ${numberText(rate * 1e12, 1)} ps/s at ${numberText(skyHz / 1e9, 3)} GHz`],
        ]}
      />
    </>
  );
}

/** What is left of the amplitude across the delay window. */
function WindowDrawing({ delaySeconds }: { delaySeconds: number }) {
  const x = (share: number) => CENTRE + share * REACH;
  const curve = Array.from({ length: 51 }, (_, step) => {
    const share = step / 25 - 1;
    return `${x(share).toFixed(1)} ${(FOOT - windowAmplitude(share, 0) * (FOOT - TOP)).toFixed(1)}`;
  }).join('L');
  return (
    <svg viewBox={`0 0 ${WIDTH} 122`} className="my-1.5 block w-full" aria-hidden="true">
      <rect
        x={x(-1)}
        y={TOP}
        width={2 * REACH}
        height={FOOT - TOP}
        fill="var(--teal-wash)"
        fillOpacity={0.6}
      />
      <rect x={x(-0.5)} y={TOP} width={REACH} height={FOOT - TOP} fill="var(--teal-wash)" />
      <path d={`M${curve}`} fill="none" stroke="var(--teal)" strokeWidth={1.75} />
      {[-1, -0.5, 0, 0.5, 1].map((share) => (
        <g key={share}>
          <line
            x1={x(share)}
            x2={x(share)}
            y1={Math.abs(share) === 0.5 ? TOP + 18 : TOP}
            y2={FOOT + 4}
            stroke="var(--ink)"
            strokeWidth={Math.abs(share) === 1 ? 1.5 : 0.75}
          />
          <text x={x(share)} y={FOOT + 18} fontSize={11.5} textAnchor="middle">
            {share === 0 ? '0' : signedText(share * delaySeconds * 1e6, 2)}
          </text>
        </g>
      ))}
      {[0.5, 1].map((share) => (
        <text
          key={share}
          x={x(share) - 4}
          y={FOOT - windowAmplitude(share, 0) * (FOOT - TOP) + 16}
          fontSize={11}
          fontWeight={600}
          textAnchor="end"
        >
          {windowAmplitude(share, 0).toFixed(2)}
        </text>
      ))}
      <line x1="6" x2={WIDTH - 6} y1={FOOT + 0.5} y2={FOOT + 0.5} stroke="var(--ink)" />
      <text x="2" y="118" fontSize={11} style={{ fill: 'var(--ink2)' }}>
        part of the amplitude that is left
      </text>
      <text x={WIDTH} y="118" fontSize={11} textAnchor="end" style={{ fill: 'var(--ink2)' }}>
        delay, µs
      </text>
    </svg>
  );
}
