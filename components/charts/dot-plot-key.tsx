import type { ReactNode } from 'react';
import type { DotPlotNumbers } from './dot-plot-words';

const STONE = 'M1.5 6c0-2.5 3-4.5 7.5-4.5S16.5 3.3 16.5 5.8 13.5 10.5 9 10.5 1.5 8.5 1.5 6Z';

/** How to read the picture: only the marks that are in it. */
export function DotPlotKey({ stones, q1, q3, atMost, claim, noun }: DotPlotNumbers) {
  return (
    <ul aria-label="How to read it" className="flex flex-wrap gap-x-5 gap-y-0.5 py-1 text-caption text-muted">
      <Entry words={`one ${noun?.one ?? 'contributor'}`}>
        <path d={STONE} className="fill-stone-0" />
      </Entry>
      <Entry words={atMost ? 'median, at most' : 'median'}>
        {atMost ? (
          <path d="M16 1V11M16 6H3M7 2L3 6L7 10" className="fill-none stroke-lichen" strokeWidth="2" />
        ) : (
          <path d="M9 1L14.5 11H3.5Z" className="fill-lichen" />
        )}
      </Entry>
      {q1 !== undefined && q3 !== undefined && (
        <Entry words="middle half">
          <rect x="1" y="4" width="16" height="4" className="fill-lichen-fill stroke-lichen" strokeWidth="0.75" />
        </Entry>
      )}
      {claim && (
        <Entry words="the maker’s claim">
          <path d="M2 11V3H16V11" className="fill-none stroke-slate" strokeWidth="2" />
        </Entry>
      )}
      {stones.some((stone) => stone.flagged && !stone.setAside) && (
        <Entry words="flagged: far from the others">
          <path d={STONE} className="fill-none stroke-rust" strokeWidth="1.5" />
          <ellipse cx="9" cy="6" rx="5" ry="2.6" className="fill-stone-0" />
        </Entry>
      )}
      {stones.some((stone) => stone.setAside) && (
        <Entry words="set aside: not counted">
          <path d={STONE} className="fill-sheet stroke-stone-0" strokeWidth="1.25" strokeDasharray="2.5 1.5" />
        </Entry>
      )}
    </ul>
  );
}

function Entry({ words, children }: { words: string; children: ReactNode }) {
  return (
    <li className="inline-flex items-center gap-1.5">
      <svg viewBox="0 0 18 12" width="18" height="12" aria-hidden="true">
        {children}
      </svg>
      {words}
    </li>
  );
}
