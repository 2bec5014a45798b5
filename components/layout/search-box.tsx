import { Search } from 'lucide-react';

interface SearchBoxProps {
  /** What was searched for, so that the box keeps it on the page of results. */
  query?: string;
  size?: 'header' | 'page';
}

/** A plain form: it works before and without any script. */
export function SearchBox({ query, size = 'header' }: SearchBoxProps) {
  return (
    <form
      action="/search"
      method="get"
      role="search"
      aria-label={size === 'page' ? 'Search the whole site' : 'Search'}
      className="relative"
    >
      <input
        type="search"
        name="q"
        defaultValue={query}
        aria-label="Search devices, categories and makers"
        placeholder="fridge, router, well pump, maker or model…"
        autoComplete="off"
        spellCheck={false}
        className={`w-full rounded border border-ink bg-sheet pr-12 pl-3 ${size === 'page' ? 'h-14 text-lead' : 'target text-note'}`}
      />
      <button
        type="submit"
        aria-label="Search"
        className="absolute inset-y-0 right-0 flex w-11 items-center justify-center rounded text-muted hover:text-ink"
      >
        <Search aria-hidden="true" className="size-[18px]" strokeWidth={1.75} />
      </button>
    </form>
  );
}
