import { numberText } from '@/app/_ui/format';
import type { SourceDto } from '@/src/data/source/dto';
import { Scroll } from '../../../_catalogue/scroll';

export function FluxView({ flux }: { flux: SourceDto['blocks']['flux'] }) {
  const { bands, components } = flux;
  if (bands.length === 0) {
    return <p className="help">No band has a flux: every fringe of this source is “no data”.</p>;
  }
  return (
    <>
      <table className="tt">
        <thead>
          <tr>
            <th scope="col">Band</th>
            <th scope="col" className="num">
              Flux, Jy
            </th>
            <th scope="col" className="num">
              Size, mas
            </th>
          </tr>
        </thead>
        <tbody>
          {bands.map(({ band, fluxJy, sizeMas }) => (
            <tr key={band}>
              <th scope="row">
                <b>{band}</b>
              </th>
              <td className="num">{numberText(fluxJy, 2)}</td>
              <td className="num">
                {components.some((one) => one.band === band)
                  ? 'by components'
                  : sizeMas === null
                    ? 'point'
                    : numberText(sizeMas, 2)}
              </td>
            </tr>
          ))}
        </tbody>
      </table>
      <p className="help mt-1">The size is the width at half maximum of a round Gaussian.</p>
      {components.length > 0 && (
        <Scroll label="Components" className="mt-2">
          <table className="tt">
            <caption className="sr-only">Components</caption>
            <thead>
              <tr>
                <th scope="col">Component</th>
                {['Flux, Jy', 'Major, mas', 'Minor, mas', 'Angle, °', 'East, mas', 'North, mas'].map(
                  (head) => (
                    <th key={head} scope="col" className="num">
                      {head}
                    </th>
                  ),
                )}
              </tr>
            </thead>
            <tbody>
              {components.map((one, index) => (
                <tr key={index}>
                  <th scope="row">{one.band}</th>
                  <td className="num">{numberText(one.fluxJy, 3)}</td>
                  <td className="num">{numberText(one.majorMas, 2)}</td>
                  <td className="num">{numberText(one.minorMas, 2)}</td>
                  <td className="num">{numberText(one.positionAngleDeg)}</td>
                  <td className="num">{numberText(one.eastMas, 2)}</td>
                  <td className="num">{numberText(one.northMas, 2)}</td>
                </tr>
              ))}
            </tbody>
          </table>
        </Scroll>
      )}
    </>
  );
}
