import { scaleLinear } from 'd3-scale';
import { numberText } from '@/app/_ui/format';
import type { Channel } from '@/src/exchange/catalogue/mode';
import { coverOf } from '@/src/schedule/mode-channels';
import { Scroll } from '../../../_catalogue/scroll';

const WIDTH = 860;
const LEFT = 40;
const TOP = 22;
const PITCH = 28;

/** The channels along the sky frequency, one line for each polarisation. */
export function ChannelDrawing({ channels }: { channels: readonly Channel[] }) {
  const covers = channels.map((channel) => coverOf(channel));
  const lows = covers.map(({ lowHz }) => lowHz / 1e6);
  const highs = covers.map(({ highHz }) => highHz / 1e6);
  const [low, high] = [Math.min(...lows), Math.max(...highs)];
  const margin = (high - low) * 0.1;
  const x = scaleLinear([low - margin, high + margin], [LEFT, WIDTH - 20]);
  const lines = [...new Set(channels.map(({ polarisation }) => polarisation))];
  const foot = TOP + lines.length * PITCH;
  return (
    <Scroll label="Drawing of channels">
      <svg viewBox={`0 0 ${WIDTH} ${foot + 22}`} className="channel-drawing" aria-hidden="true">
        {x.ticks(8).map((tick) => (
          <g key={tick}>
            <line x1={x(tick)} x2={x(tick)} y1="10" y2={foot} stroke="var(--rule)" />
            <text
              x={x(tick)}
              y={foot + 16}
              fontSize={11.5}
              textAnchor="middle"
              style={{ fill: 'var(--ink2)' }}
            >
              {numberText(tick, Number.isInteger(tick) ? 0 : 1)}
            </text>
          </g>
        ))}
        {lines.map((word, line) => (
          <text key={word} x="30" y={TOP + line * PITCH + 15} fontSize={12} textAnchor="end">
            {word}
          </text>
        ))}
        {channels.map((channel, index) => {
          const line = lines.indexOf(channel.polarisation);
          const y = TOP + line * PITCH;
          const [from, to] = [x(lows[index] ?? low), x(highs[index] ?? high)];
          const width = Math.max(2, to - from - 2);
          const edge = channel.sideband === 'upper' ? from : to;
          const isFilled = line === 0;
          return (
            <g key={index}>
              <rect
                x={from + 1}
                y={y}
                width={width}
                height="22"
                fill={isFilled ? 'var(--fill)' : 'var(--sheet)'}
                stroke="var(--ink)"
                strokeWidth={1.5}
              />
              <text
                x={(from + to) / 2}
                y={y + 15.5}
                fontSize={12}
                fontWeight={600}
                textAnchor="middle"
                style={{ fill: isFilled ? 'var(--on-ink)' : 'var(--ink)' }}
              >
                {labelOf(channel, index, width)}
              </text>
              <path d={`M${edge} ${y - 2}v26`} stroke="var(--teal)" strokeWidth={4} />
            </g>
          );
        })}
        <line x1={LEFT} x2={WIDTH - 20} y1={foot + 0.5} y2={foot + 0.5} stroke="var(--ink)" />
        <text x={WIDTH} y={foot + 16} fontSize={11.5} textAnchor="end" style={{ fill: 'var(--ink2)' }}>
          MHz
        </text>
      </svg>
    </Scroll>
  );
}

function labelOf({ polarisation, sideband }: Channel, index: number, width: number): string {
  if (width > 150) return `${index + 1}, ${polarisation}, ${sideband} sideband`;
  return width > 18 ? String(index + 1) : '';
}
