'use client';

import { archivo, serif, serifGreek } from './_fonts/fonts';
import { BareFrame } from './_ui/bare-frame';
import { Broken } from './_ui/broken';
import './_ui/masthead.css';
import './_ui/sheet.css';
import './globals.css';

/** Stands in for the root layout when that itself fails; the device chooses the theme. */
export default function GlobalError({ error, retry }: { error: unknown; retry: () => void }) {
  return (
    <html lang="en" className={`${archivo.variable} ${serif.variable} ${serifGreek.variable}`}>
      <body>
        <title>Antiphon</title>
        <BareFrame status="500">
          <Broken error={error} retry={retry} />
        </BareFrame>
      </body>
    </html>
  );
}
