import { numberText } from '@/app/_ui/format';
import { plainChannel, type Channel } from '@/src/exchange/catalogue/mode';
import { coverOf, dataRateOf } from '@/src/schedule/mode-channels';
import { ChannelDrawing } from './channel-drawing';
import { Scroll } from '../../../_catalogue/scroll';

const POLARISATIONS: Readonly<Record<Channel['polarisation'], string>> = {
  R: 'right circular',
  L: 'left circular',
  X: 'linear X',
  Y: 'linear Y',
};

type Props = { channels: readonly Channel[]; toneSpacingHz: number | null };

export function ChannelsView({ channels, toneSpacingHz }: Props) {
  const rate = dataRateOf(channels.map(plainChannel)) / 1e6;
  const products = new Set(channels.map(({ polarisation }) => polarisation)).size;
  const mhz = (hz: number, decimals = 2) => numberText(hz / 1e6, decimals);
  return (
    <>
      <p className="help text-right">teal: the edge the frequency belongs to</p>
      <ChannelDrawing channels={channels} />
      <Scroll label="Table of channels">
        <table className="tt">
          <thead>
            <tr>
              <th scope="col">Channel</th>
              <th scope="col" className="num">
                Edge
                <br />
                MHz
              </th>
              <th scope="col" className="!pl-[18px]">
                Sideband
              </th>
              <th scope="col">Polarisation</th>
              <th scope="col" className="num">
                Bandwidth
                <br />
                MHz
              </th>
              <th scope="col" className="num">
                Bits
              </th>
              <th scope="col" className="num">
                Samples
                <br />
                million a s
              </th>
              <th scope="col" className="num">
                Rate
                <br />
                Mb/s
              </th>
              <th scope="col" className="!pl-[18px]">
                Covers, MHz
              </th>
              <th scope="col">Tones</th>
            </tr>
          </thead>
          <tbody>
            {channels.map((channel, index) => {
              const { lowHz, highHz } = coverOf(channel);
              return (
                <tr key={index}>
                  <th scope="row">
                    <b>{index + 1}</b>
                  </th>
                  <td className="num">{mhz(channel.edgeHz)}</td>
                  <td className="!pl-[18px]">{channel.sideband}</td>
                  <td>{POLARISATIONS[channel.polarisation]}</td>
                  <td className="num">{numberText(channel.bandwidthHz / 1e6)}</td>
                  <td className="num">{channel.bits}</td>
                  <td className="num">{numberText((2 * channel.bandwidthHz) / 1e6)}</td>
                  <td className="num">{numberText(dataRateOf([plainChannel(channel)]) / 1e6)}</td>
                  <td className="whitespace-nowrap !pl-[18px]">
                    {mhz(lowHz)} to {mhz(highHz)}
                  </td>
                  <td>{toneSpacingHz === null ? 'none' : `each ${numberText(toneSpacingHz / 1e6)} MHz`}</td>
                </tr>
              );
            })}
          </tbody>
          <tfoot>
            <tr>
              <td colSpan={3}>
                <b>{channels.length}</b> {channels.length === 1 ? 'channel' : 'channels'}
              </td>
              <td>
                {products} {products === 1 ? 'product' : 'products'}
              </td>
              <td className="num" colSpan={3} />
              <td className="num">
                <b>{numberText(rate)}</b>
              </td>
              <td colSpan={2} />
            </tr>
          </tfoot>
        </table>
      </Scroll>
    </>
  );
}
