import localFont from 'next/font/local';

export const archivo = localFont({
  src: '../../fonts/archivo-latin-wdth-normal.woff2',
  variable: '--font-archivo',
  weight: '100 900',
  display: 'swap',
  declarations: [{ prop: 'font-stretch', value: '62% 125%' }],
});

export const serif = localFont({
  src: [
    { path: '../../fonts/source-serif-4-latin-opsz-normal.woff2', style: 'normal', weight: '200 900' },
    { path: '../../fonts/source-serif-4-latin-opsz-italic.woff2', style: 'italic', weight: '200 900' },
  ],
  variable: '--font-serif',
  display: 'swap',
});

export const serifGreek = localFont({
  src: '../../fonts/source-serif-4-greek-opsz-normal.woff2',
  variable: '--font-serif-greek',
  weight: '200 900',
  display: 'swap',
  preload: false,
  declarations: [{ prop: 'unicode-range', value: 'U+0370-03FF' }],
});
