import 'server-only';
import Fuse from 'fuse.js';

/** One thing that can be found: its name and everything else it is called by. */
export interface SearchEntry {
  id: string;
  name: string;
  words: string[];
}

const indexes = new WeakMap<readonly SearchEntry[], Fuse<SearchEntry & { squeezed: string[] }>>();

/** "KX-140" and "kx 140" are one spelling: letters and digits alone. */
const squeeze = (text: string) => text.toLowerCase().replace(/[^\p{L}\p{N}]+/gu, '');

/**
 * The entries that a query most likely means, best first: forgiving of slips in a word, of words in another order, and
 * of dashes and spaces in model numbers. The index is kept for as long as the list of entries is.
 */
export function rank(entries: readonly SearchEntry[], query: string, most: number): SearchEntry[] {
  const text = query.trim().slice(0, 100);
  if (text === '') return [];
  let fuse = indexes.get(entries);
  if (!fuse) {
    fuse = new Fuse(
      entries.map((entry) => ({ ...entry, squeezed: [entry.name, ...entry.words].map(squeeze) })),
      {
        keys: [
          { name: 'name', weight: 3 },
          { name: 'words', weight: 2 },
          { name: 'squeezed', weight: 2 },
        ],
        threshold: 0.4,
        ignoreLocation: true,
        includeScore: true,
        minMatchCharLength: 2,
      },
    );
    indexes.set(entries, fuse);
  }
  // Each word is looked for by itself, so that words in another order still meet; an entry's score is its mean.
  const words = text.split(/\s+/).filter((word) => word.length > 1);
  const scores = new Map<string, { entry: SearchEntry; sum: number; hits: number }>();
  const note = (found: ReturnType<typeof fuse.search>, weight: number) => {
    for (const { item, score } of found) {
      const known = scores.get(item.id) ?? { entry: item, sum: 0, hits: 0 };
      scores.set(item.id, { ...known, sum: known.sum + weight * (1 - (score ?? 1)), hits: known.hits + weight });
    }
  };
  for (const word of words) note(fuse.search(word), 1);
  note(fuse.search(squeeze(text)), Math.max(1, words.length));
  return [...scores.values()]
    .sort((a, b) => b.sum - a.sum || a.entry.name.localeCompare(b.entry.name))
    .slice(0, most)
    .map(({ entry }) => entry);
}
