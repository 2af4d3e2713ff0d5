import type { Metadata } from 'next';
import { cookies, headers } from 'next/headers';
import { archivo, serif, serifGreek } from './_fonts/fonts';
import './_ui/controls.css';
import './_ui/masthead.css';
import './_ui/sheet.css';
import './globals.css';
import './_ui/forced-colors.css';
import './_ui/print.css';

export const metadata: Metadata = {
  title: { default: 'Antiphon', template: '%s · Antiphon' },
  description: 'Plans multi-station VLBI sessions and keeps the stations’ clock log.',
};

export default async function RootLayout({ children }: { children: React.ReactNode }) {
  await headers();
  const theme = (await cookies()).get('antiphon_theme')?.value;
  return (
    <html
      lang="en"
      data-theme={theme === 'day' || theme === 'night' ? theme : undefined}
      className={`${archivo.variable} ${serif.variable} ${serifGreek.variable}`}
    >
      <body>{children}</body>
    </html>
  );
}
