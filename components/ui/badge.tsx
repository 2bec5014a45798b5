import type { ReactNode } from 'react';
import clsx from 'clsx';

/** `good`: verified; `warning`: flagged, declined, changes requested; `claim`: the maker's; `quiet`: anything else. */
type Tone = 'good' | 'warning' | 'claim' | 'quiet';

const tones: Record<Tone, string> = {
  good: 'text-lichen font-semibold',
  warning: 'text-rust font-semibold',
  claim: 'text-slate font-semibold',
  quiet: 'text-muted',
};

/** A state, in a word: the word carries the meaning, the colour only helps to find it. */
export function Badge({ tone = 'quiet', children }: { tone?: Tone; children: ReactNode }) {
  return <span className={clsx('whitespace-nowrap', tones[tone])}>{children}</span>;
}
