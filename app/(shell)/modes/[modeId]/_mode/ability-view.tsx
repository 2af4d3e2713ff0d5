import { numberText } from '@/app/_ui/format';
import { staveOrder } from '@/app/_ui/stave-order';
import type { ModeAbility, ModeDto } from '@/src/data/mode/dto';
import { plainChannel, type Channel, type ModeStation } from '@/src/exchange/catalogue/mode';
import { dataRateOf } from '@/src/schedule/mode-channels';
import { Scroll } from '../../../_catalogue/scroll';

/** How each station does the mode: as it is, in another way, or not at all. */
export function AbilityView({ mode }: { mode: ModeDto }) {
  const channels = mode.blocks.channels.channels;
  const said = mode.blocks.stations.stations;
  const rows = staveOrder(mode.stations).map((station) => ({
    station,
    ...howOf(
      station,
      channels,
      said.find(({ stationCode }) => stationCode === station.code),
    ),
  }));
  const counts = (['as', 'other', 'not'] as const).map(
    (kind) => rows.filter((row) => row.kind === kind).length,
  );
  return (
    <>
      <p className="help mb-1">
        {counts[0]} of {rows.length} as it is, {counts[1]} in another way, {counts[2]} not.
      </p>
      <Scroll label="Table of stations">
        <table className="tt">
          <thead>
            <tr>
              <th scope="col">Station</th>
              <th scope="col">How</th>
              <th scope="col" className="num">
                Most it can
                <br />
                Mb/s
              </th>
              <th scope="col" className="num">
                This mode
                <br />
                Mb/s
              </th>
              <th scope="col" className="!pl-[18px]">
                Why, note
              </th>
            </tr>
          </thead>
          <tbody>
            {rows.map(({ station, how, bitsPerS, note }) => (
              <tr key={station.code}>
                <th scope="row">
                  <span className="code">{station.code}</span> {station.name}
                </th>
                <td>{how}</td>
                <td className="num">
                  {station.maxBitsPerS === null ? 'not said' : numberText(station.maxBitsPerS / 1e6)}
                </td>
                <td className="num">
                  <b>{bitsPerS === null ? 'none' : numberText(bitsPerS / 1e6)}</b>
                </td>
                <td className="!pl-[18px] text-ink2">{note}</td>
              </tr>
            ))}
          </tbody>
        </table>
      </Scroll>
    </>
  );
}

type How = { kind: 'as' | 'other' | 'not'; how: string; bitsPerS: number | null; note: string };

function howOf(station: ModeAbility, channels: readonly Channel[], said: ModeStation | undefined): How {
  const ofMode = channels[0]?.bits === '1' ? 1 : 2;
  const bits = said === undefined || said.bits === '' ? Math.min(station.bits, ofMode) : Number(said.bits);
  const wanted = dataRateOf(
    channels.map(plainChannel).map((channel) => ({ ...channel, bits: bits === 1 ? 1 : 2 })),
  );
  const problem = problemOf(station, channels, wanted);
  const unknown = station.feeds === null ? 'no SEFD in this band, so its fringes are “no data”' : '';
  const note = [said?.note, problem, unknown].filter(Boolean).join('; ');
  if (said?.isAble === 'no' || problem !== null) return { kind: 'not', how: 'cannot', bitsPerS: null, note };
  const linear = isLinear(channels) ? 'circular' : 'linear';
  const feeds = station.feeds === linear ? `, feeds ${linear}` : '';
  if (bits < ofMode) {
    return { kind: 'other', how: `${bits} bit instead of ${ofMode}${feeds}`, bitsPerS: wanted, note };
  }
  return { kind: 'as', how: `as it is${feeds}`, bitsPerS: wanted, note };
}

function problemOf(
  { maxBitsPerS, maxChannels }: ModeAbility,
  channels: readonly Channel[],
  wanted: number,
): string | null {
  if (maxChannels !== null && channels.length > maxChannels)
    return `it records at most ${maxChannels} channels`;
  if (maxBitsPerS !== null && wanted > maxBitsPerS) return 'the rate is too high';
  return null;
}

const isLinear = ([first]: readonly Channel[]) => first?.polarisation === 'X' || first?.polarisation === 'Y';
