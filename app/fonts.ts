import localFont from 'next/font/local';

// Every value is a literal because the font loader reads this file without running it. The three that every first screen shows are preloaded. The files with the rarer Latin letters stand first in the
// families of tailwind.config.ts and are fetched only by a page that has such a letter.
const heading = localFont({
  src: '../node_modules/@fontsource-variable/bricolage-grotesque/files/bricolage-grotesque-latin-wght-normal.woff2',
  weight: '200 800',
  variable: '--font-heading',
  fallback: ['ui-sans-serif', 'sans-serif'],
});

const text = localFont({
  src: '../node_modules/@fontsource-variable/atkinson-hyperlegible-next/files/atkinson-hyperlegible-next-latin-wght-normal.woff2',
  weight: '200 800',
  variable: '--font-text',
  fallback: ['ui-sans-serif', 'sans-serif'],
});

const mono = localFont({
  src: '../node_modules/@fontsource-variable/spline-sans-mono/files/spline-sans-mono-latin-wght-normal.woff2',
  weight: '300 700',
  variable: '--font-mono',
  adjustFontFallback: false,
  fallback: ['ui-monospace', 'monospace'],
});

const headingMore = localFont({
  src: '../node_modules/@fontsource-variable/bricolage-grotesque/files/bricolage-grotesque-latin-ext-wght-normal.woff2',
  weight: '200 800',
  variable: '--font-heading-more',
  preload: false,
  adjustFontFallback: false,
  declarations: [
    {
      prop: 'unicode-range',
      value:
        'U+0100-0130, U+0132-0151, U+0154-02BA, U+02BD-02C5, U+02C7-02CC, U+02CE-02D7, U+02DD-02FF, U+1D00-1DBF, U+1E00-1EFF, U+20A0-20AB, U+20AD-20C0, U+2113, U+2C60-2C7F, U+A720-A7FF',
    },
  ],
});

const textMore = localFont({
  src: '../node_modules/@fontsource-variable/atkinson-hyperlegible-next/files/atkinson-hyperlegible-next-latin-ext-wght-normal.woff2',
  weight: '200 800',
  variable: '--font-text-more',
  preload: false,
  adjustFontFallback: false,
  declarations: [
    {
      prop: 'unicode-range',
      value:
        'U+0100-0130, U+0132-0151, U+0154-02BA, U+02BD-02C5, U+02C7-02CC, U+02CE-02D7, U+02DD-02FF, U+1D00-1DBF, U+1E00-1EFF, U+20A0-20AB, U+20AD-20C0, U+2113, U+2C60-2C7F, U+A720-A7FF',
    },
  ],
});

/** Class names that define the font variables; they belong on the html element. */
export const fontVariables = [heading, text, mono, headingMore, textMore].map((f) => f.variable).join(' ');
