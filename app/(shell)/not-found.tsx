import type { Metadata } from 'next';
import { BareFrame } from '@/app/_ui/bare-frame';
import { NothingHere } from '@/app/_ui/nothing-here';

export const metadata: Metadata = { title: 'Nothing here' };

/** Inside the shell, where the staves can be named. */
export default function NotFoundHere() {
  return (
    <BareFrame status="404">
      <NothingHere />
    </BareFrame>
  );
}
