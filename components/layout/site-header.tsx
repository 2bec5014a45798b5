import type { ReactNode } from 'react';
import Link from 'next/link';
import { Mark } from './mark';
import { SearchBox } from './search-box';
import { ThemeSwitch } from './theme-switch';

const places = [
  { href: '/devices', name: 'Devices', narrow: true },
  { href: '/categories', name: 'Categories', narrow: false },
  { href: '/guides', name: 'Guides', narrow: true },
];

/** `account` is the signed-in corner; on a phone it shares the first line with the name. */
export function SiteHeader({ account, themeKey }: { account: ReactNode; themeKey: string }) {
  return (
    <header className="border-b border-rule print:hidden">
      <div className="mx-auto flex max-w-page flex-wrap items-center gap-x-5 gap-y-2 px-[18px] py-3 md:flex-nowrap md:px-10">
        <Link href="/" className="flex target shrink-0 items-center gap-2.5 font-heading text-[1.3rem] font-[650]">
          <Mark />
          Wattcairn
        </Link>
        <div className="order-last w-full md:order-none md:w-auto md:max-w-[27rem] md:flex-1">
          <SearchBox />
        </div>
        <nav aria-label="Main" className="ml-auto flex items-center gap-x-3.5 text-note md:gap-x-5">
          {places.map((place) => (
            <Link
              key={place.href}
              href={place.href}
              className={`target items-center underline-offset-4 hover:underline ${place.narrow ? 'flex' : 'hidden md:flex'}`}
            >
              {place.name}
            </Link>
          ))}
          <div className="flex min-w-12 justify-end">{account}</div>
          <div className="hidden md:block">
            <ThemeSwitch storageKey={themeKey} />
          </div>
        </nav>
      </div>
    </header>
  );
}
