import { findFlags } from '@/lib/measurement/aggregation/flags';
import { median } from '@/lib/measurement/statistics/median';
import type { FigureStone } from '../schema';

/** One input of a published figure, with what a stone needs to know of it. */
export interface StoneInput {
  voice: string;
  label: string;
  value: number;
  /** The value is the limit of an instrument: what was measured lies at or below it. */
  censored: boolean;
  counted: boolean;
  flagged: boolean;
}

/**
 * The pile behind a published figure: a stone for each voice that counts, and a hollow one for each figure that was
 * left out, so that nothing goes unseen. A stone is flagged where it was when the figure was published, and where it
 * lies more than a factor of five from the category's median of today.
 */
export function stonesOf(inputs: readonly StoneInput[], categoryMedian: number | null): FigureStone[] {
  const voices = new Map<string, StoneInput[]>();
  for (const input of inputs.filter(({ counted }) => counted)) {
    const known = voices.get(input.voice);
    if (known) known.push(input);
    else voices.set(input.voice, [input]);
  }
  const counted = [...voices].map(([id, members]) => {
    const value = median(members.map((input) => input.value));
    const atMost = median(members.map((input) => (input.censored ? 0 : input.value))) !== value;
    const isFar = findFlags([{ value, censored: atMost }], categoryMedian)[0] === true;
    const label = [...new Set(members.map((input) => input.label))].join(' and ');
    return { id, value, atMost, flagged: isFar || members.some(({ flagged }) => flagged), setAside: false, label };
  });
  const leftOut = inputs.filter((input) => !input.counted);
  return [
    ...counted,
    ...leftOut.map((input, i) => ({
      id: `${input.voice} left out ${i + 1}`,
      value: input.value,
      atMost: input.censored,
      flagged: false,
      setAside: true,
      label: input.label,
    })),
  ];
}
