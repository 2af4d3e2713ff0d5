import type { Metadata } from 'next';
import { BareFrame } from '@/app/_ui/bare-frame';
import { NothingHere } from '@/app/_ui/nothing-here';
import { staveOrder } from '@/app/_ui/stave-order';
import { networkOf } from '@/src/data/station/read';
import { currentViewer } from '@/src/viewer/current-viewer';

export const metadata: Metadata = { title: 'Nothing here' };

/** Inside the shell, where the staves can be named. */
export default async function NotFoundHere() {
  const stations = staveOrder(await networkOf(await currentViewer()));
  return (
    <BareFrame status="404">
      <NothingHere codes={stations.map(({ code }) => code)} />
    </BareFrame>
  );
}
