import type { Config } from 'tailwindcss';

/**
 * Every colour of the interface. Text roles reach a contrast of 4.5 against paper and sheet, marks 3;
 * `rule` and `lichen-fill` are never the only sign of anything.
 */
export const palette = {
  light: {
    paper: '#f3efe6',
    sheet: '#fcfaf5',
    ink: '#23272b',
    muted: '#5d625f',
    rule: '#d8d1c3',
    lichen: '#566400',
    'lichen-fill': '#b4c24a',
    'stone-0': '#6f6a61',
    'stone-1': '#857f73',
    'stone-2': '#57534c',
    rust: '#9c3a12',
    slate: '#2f5583',
  },
  dark: {
    paper: '#141619',
    sheet: '#1b1e22',
    ink: '#ece7db',
    muted: '#a5a49b',
    rule: '#363a3f',
    lichen: '#c6d35c',
    'lichen-fill': '#8b9a2e',
    'stone-0': '#b8b1a3',
    'stone-1': '#989285',
    'stone-2': '#d0c9ba',
    rust: '#f0935f',
    slate: '#9bbce4',
  },
} as const;

type Token = keyof (typeof palette)['light'];
type Colours = Record<Token, string>;
type Styles = Record<string, string>;

// Printed: the sheet alone, dark on white, so that no ink goes into the ground.
const printed: Colours = { ...palette.light, paper: '#ffffff', sheet: '#ffffff', ink: '#000000', muted: '#3d403e' };

// In forced colours every token becomes one of the reader's own; shape and words then carry the meaning.
const forced: Colours = {
  paper: 'Canvas',
  sheet: 'Canvas',
  ink: 'CanvasText',
  muted: 'CanvasText',
  rule: 'GrayText',
  lichen: 'LinkText',
  'lichen-fill': 'Highlight',
  'stone-0': 'CanvasText',
  'stone-1': 'CanvasText',
  'stone-2': 'CanvasText',
  rust: 'CanvasText',
  slate: 'LinkText',
};

const variables = (colours: Colours, scheme: string): Styles => ({
  'color-scheme': scheme,
  ...Object.fromEntries(Object.entries(colours).map(([token, value]) => [`--${token}`, value])),
});

const tokens = Object.keys(palette.light) as Token[];

export default {
  theme: {
    colors: {
      transparent: 'transparent',
      current: 'currentColor',
      ...Object.fromEntries(tokens.map((token) => [token, `var(--${token})`])),
    },
    fontFamily: {
      heading: ['var(--font-heading-more)', 'var(--font-heading)', 'ui-sans-serif', 'sans-serif'],
      text: ['var(--font-text-more)', 'var(--font-text)', 'ui-sans-serif', 'sans-serif'],
      mono: ['var(--font-mono)', 'ui-monospace', 'monospace'],
    },
    // Named by what they are for. rem, so that a reader's own text size counts.
    fontSize: {
      name: ['2.625rem', { lineHeight: '1.12', letterSpacing: '-0.02em' }],
      'name-phone': ['2.0625rem', { lineHeight: '1.15', letterSpacing: '-0.02em' }],
      heading: ['1.5rem', { lineHeight: '1.25', letterSpacing: '-0.02em' }],
      subheading: ['1.125rem', { lineHeight: '1.35', letterSpacing: '-0.01em' }],
      lead: ['1.25rem', { lineHeight: '1.5' }],
      body: ['1rem', { lineHeight: '1.5' }],
      note: ['0.90625rem', { lineHeight: '1.5' }],
      caption: ['0.84375rem', { lineHeight: '1.5' }],
      axis: ['0.75rem', { lineHeight: '1.25' }],
      figure: ['2.125rem', { lineHeight: '1.1', letterSpacing: '-0.03em' }],
      fact: ['1.5625rem', { lineHeight: '1.2', letterSpacing: '-0.03em' }],
      cell: ['0.875rem', { lineHeight: '1.5' }],
    },
    borderRadius: { none: '0', DEFAULT: '3px', sheet: '4px', full: '9999px' },
    boxShadow: { none: 'none' },
    extend: { maxWidth: { page: '82rem', sheet: '57rem', prose: '41rem' } },
  },
  plugins: [
    ({ addBase }: { addBase: (base: Record<string, Styles | Record<string, Styles>>) => void }) => {
      addBase({
        ':root': variables(palette.light, 'light'),
        '@media (prefers-color-scheme: dark)': { ':root': variables(palette.dark, 'dark') },
        ':root[data-theme="light"]': variables(palette.light, 'light'),
        ':root[data-theme="dark"]': variables(palette.dark, 'dark'),
        '@media print': { ':root, :root[data-theme]': variables(printed, 'light') },
        '@media (forced-colors: active)': { ':root, :root[data-theme]': variables(forced, 'light dark') },
      });
    },
  ],
} satisfies Config;
