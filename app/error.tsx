'use client';

import { BareFrame } from './_ui/bare-frame';
import { Broken } from './_ui/broken';

export default function ErrorPage({ error, retry }: { error: unknown; retry: () => void }) {
  return (
    <BareFrame status="500">
      <Broken error={error} retry={retry} />
    </BareFrame>
  );
}
