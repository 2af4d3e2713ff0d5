'use client';

import type { Route } from 'next';
import type { AnyBlock } from '@/src/exchange/catalogue/block';
import { SOURCE_BLOCKS } from '@/src/exchange/catalogue/source';
import { NewObject } from '../../../_catalogue/new-object';
import { add } from '../actions';

export function NewSource() {
  return (
    <NewObject
      title="New source"
      list={{ href: '/sources' as Route, label: 'Sources' }}
      label="Add the source"
      blocks={[
        { name: 'place', block: SOURCE_BLOCKS.place as unknown as AnyBlock, start: { role: 'target' } },
        { name: 'flux', block: SOURCE_BLOCKS.flux as unknown as AnyBlock, start: {} },
      ]}
      note="A source without a flux in the session’s band has “no data” for its fringes."
      add={add}
    />
  );
}
