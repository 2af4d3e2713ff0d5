import type { Metadata } from 'next';
import { BareFrame } from './_ui/bare-frame';
import { NothingHere } from './_ui/nothing-here';

export const metadata: Metadata = { title: 'Nothing here' };

export default function NotFound() {
  return (
    <BareFrame status="404">
      <NothingHere />
    </BareFrame>
  );
}
