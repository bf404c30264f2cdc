import localFont from 'next/font/local';

/** Words: drawn so that 0/O, 1/l/I and 6/8 cannot be mistaken. */
export const words = localFont({
  src: '../node_modules/@fontsource-variable/atkinson-hyperlegible-next/files/atkinson-hyperlegible-next-latin-wght-normal.woff2',
  variable: '--font-words',
  weight: '200 800',
  display: 'swap',
});

/** Figures: the mono of the same family, so that columns of numbers line up. */
export const figures = localFont({
  src: '../node_modules/@fontsource-variable/atkinson-hyperlegible-mono/files/atkinson-hyperlegible-mono-latin-wght-normal.woff2',
  variable: '--font-figures',
  weight: '200 800',
  display: 'swap',
});
