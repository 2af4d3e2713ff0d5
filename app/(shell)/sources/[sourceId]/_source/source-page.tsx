'use client';

import type { Route } from 'next';
import { useState } from 'react';
import { MINUS, numberText, signedText } from '@/app/_ui/format';
import type { SourceDto } from '@/src/data/source/dto';
import { ROLE_CHOICES, SOURCE_BLOCKS } from '@/src/exchange/catalogue/source';
import { declinationText, rightAscensionText } from '@/src/units/sexagesimal';
import { ObjectBlock, type Editing } from '../../../_catalogue/object-block';
import { ObjectHead } from '../../../_catalogue/object-head';
import { Pairs } from '../../../_catalogue/pairs';
import { keepBlock, retire } from '../actions';
import { FluxView } from './flux-view';
import '../../../_catalogue/object.css';

export function SourcePage({ source }: { source: SourceDto }) {
  const { id, blocks, canEdit } = source;
  const { place } = blocks;
  const [open, setOpen] = useState<string | null>(null);
  const editing: Editing = { open, setOpen, can: () => canEdit, keep: (act) => keepBlock(id, act) };
  const role = ROLE_CHOICES.find(({ value }) => value === place.role)?.label ?? place.role;
  const motion = (mas: number | null) => (mas === null ? 'none' : `${signedText(mas, 3)} mas a year`);

  return (
    <>
      <ObjectHead
        list={{ href: '/sources' as Route, label: 'Sources' }}
        name={place.name}
        sub={`${role} · ${rightAscensionText(place.raDeg)}, ${declinationText(place.decDeg)}`}
        noun="source"
        retiredAtMs={source.retiredAtMs}
        sessionsAhead={source.sessionsAhead}
        retire={canEdit ? (isRetired) => retire(id, isRetired) : null}
      />
      <div className="object-columns object-columns-halves">
        <div className="object-column">
          <ObjectBlock name="place" block={SOURCE_BLOCKS.place} value={place} editing={editing}>
            <Pairs
              pairs={[
                ['Name', place.name],
                ['Other names', place.aliases.length === 0 ? 'none' : place.aliases.join(', ')],
                ['Role', role],
                ['Right ascension, ICRS', rightAscensionText(place.raDeg)],
                ['in degrees', `${place.raDeg.toFixed(7)}°`],
                ['Declination, ICRS', declinationText(place.decDeg)],
                ['in degrees', `${place.decDeg.toFixed(7).replace('-', MINUS)}°`],
                ['Motion to the east', motion(place.properMotionEastMas)],
                ['Motion to the north', motion(place.properMotionNorthMas)],
                ['Parallax', place.parallaxMas === null ? 'none' : `${numberText(place.parallaxMas, 3)} mas`],
              ]}
            />
          </ObjectBlock>
        </div>
        <div className="object-column">
          <ObjectBlock name="flux" block={SOURCE_BLOCKS.flux} value={blocks.flux} editing={editing}>
            <FluxView flux={blocks.flux} />
          </ObjectBlock>
        </div>
      </div>
    </>
  );
}
