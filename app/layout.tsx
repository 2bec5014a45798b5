import type { ReactNode } from 'react';
import type { Metadata, Viewport } from 'next';
import { AccountMenu } from '@/components/account/account-menu';
import { QueryProvider } from '@/components/layout/query-provider';
import { SiteFooter } from '@/components/layout/site-footer';
import { SiteHeader } from '@/components/layout/site-header';
import { runsAsDemonstration } from '@/lib/platform/env';
import { THEME_KEY, THEME_SCRIPT } from '@/lib/platform/theme-script';
import { palette } from '@/tailwind.config';
import { fontVariables } from './fonts';
import './globals.css';

export const metadata: Metadata = {
  title: { default: 'Wattcairn: what devices really draw', template: '%s · Wattcairn' },
  description:
    'What electrical devices really draw: figures measured by many households, reviewed, and set beside what the maker states.',
};

export const viewport: Viewport = {
  themeColor: [
    { media: '(prefers-color-scheme: light)', color: palette.light.paper },
    { media: '(prefers-color-scheme: dark)', color: palette.dark.paper },
  ],
};

export default function RootLayout({ children }: { children: ReactNode }) {
  return (
    // The script below may set data-theme before React looks at this element.
    <html lang="en" className={fontVariables} suppressHydrationWarning>
      <head>
        <script dangerouslySetInnerHTML={{ __html: THEME_SCRIPT }} />
      </head>
      <body className="flex flex-col text-body">
        <a
          href="#main"
          className="absolute top-2 left-2 z-30 -translate-y-20 rounded bg-ink px-4 py-2 text-paper focus:translate-y-0"
        >
          Skip to the page
        </a>
        <QueryProvider>
          <SiteHeader account={<AccountMenu />} themeKey={THEME_KEY} />
          <main id="main" tabIndex={-1} className="flex-1 outline-none">
            {children}
          </main>
          <SiteFooter demonstration={runsAsDemonstration()} themeKey={THEME_KEY} />
        </QueryProvider>
      </body>
    </html>
  );
}
