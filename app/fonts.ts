import localFont from 'next/font/local';

/** Figures, headings and labels. */
export const figures = localFont({
  src: [
    {
      path: '../node_modules/@fontsource/barlow-condensed/files/barlow-condensed-latin-500-normal.woff2',
      weight: '500',
    },
    {
      path: '../node_modules/@fontsource/barlow-condensed/files/barlow-condensed-latin-600-normal.woff2',
      weight: '600',
    },
  ],
  variable: '--font-barlow',
  display: 'swap',
  fallback: ['Arial Narrow', 'sans-serif'],
});

/** Reading text. */
export const reading = localFont({
  src: '../node_modules/@fontsource-variable/atkinson-hyperlegible-next/files/atkinson-hyperlegible-next-latin-wght-normal.woff2',
  weight: '200 800',
  variable: '--font-atkinson',
  display: 'swap',
  fallback: ['Verdana', 'sans-serif'],
});
