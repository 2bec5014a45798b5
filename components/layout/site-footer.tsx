import Link from 'next/link';
import { ThemeSwitch } from './theme-switch';

/** `demonstration`: say that everything on the site is invented. */
export function SiteFooter({ demonstration, themeKey }: { demonstration: boolean; themeKey: string }) {
  return (
    <footer className="mt-16 border-t border-rule text-caption text-muted print:hidden">
      <div className="mx-auto flex max-w-page flex-wrap items-start justify-between gap-x-10 gap-y-4 px-[18px] py-6 md:px-10">
        <div className="max-w-prose space-y-1">
          <p>A record, kept by those who measure, of what electrical devices really draw.</p>
          <p>
            Data and text:{' '}
            <a href="https://creativecommons.org/licenses/by/4.0/" rel="license" className="link">
              CC BY 4.0
            </a>
            . Use them, and say where they come from.
          </p>
          {demonstration && <p>Demonstration: all makers, models, people and figures here are invented.</p>}
        </div>
        <nav aria-label="Footer" className="flex items-center gap-x-5">
          <Link href="/devices" className="flex target items-center hover:underline">
            Devices
          </Link>
          <Link href="/categories" className="flex target items-center hover:underline">
            Categories
          </Link>
          <Link href="/guides" className="flex target items-center hover:underline">
            Guides
          </Link>
          <span className="md:hidden">
            <ThemeSwitch storageKey={themeKey} />
          </span>
        </nav>
      </div>
    </footer>
  );
}
