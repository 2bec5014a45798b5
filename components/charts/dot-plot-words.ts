import { type Claim, plainNumber, threeDigits } from './axis';
import type { PlotStone } from './dot-plot-layout';

export interface DotPlotNumbers {
  stones: readonly PlotStone[];
  median: number;
  q1?: number;
  q3?: number;
  /** The figure itself is an upper limit. */
  atMost?: boolean;
  claim?: Claim;
  unit: string;
  /** What one stone is. */
  noun?: { one: string; many: string };
  /** Writes a value without its unit; three significant digits by default. */
  format?: (value: number) => string;
}

const contributors = { one: 'contributor', many: 'contributors' };

/** The picture in one or two sentences, with the numbers that it shows. */
export function describeDotPlot(numbers: DotPlotNumbers): string {
  const { stones, median, q1, q3, atMost, claim, unit, noun = contributors, format = threeDigits } = numbers;
  const counted = stones.filter((stone) => !stone.setAside).map((stone) => stone.value);
  const count = `${plainNumber(counted.length, 0)} ${counted.length === 1 ? noun.one : noun.many}`;
  const parts = [`${count}: median ${atMost ? 'at most ' : ''}${format(median)} ${unit}`];
  if (counted.length > 1) {
    parts.push(`range ${format(Math.min(...counted))} to ${format(Math.max(...counted))} ${unit}`);
  }
  if (q1 !== undefined && q3 !== undefined) {
    parts.push(`the middle half between ${format(q1)} and ${format(q3)} ${unit}`);
  }
  const flagged = stones.filter((stone) => stone.flagged && !stone.setAside).length;
  const aside = stones.filter((stone) => stone.setAside).length;
  const remarks = [flagged > 0 && `${flagged} flagged`, aside > 0 && `${aside} set aside`].filter(Boolean);
  const sentences = [parts.join(', ')];
  if (remarks.length > 0) sentences.push(remarks.join(', '));
  if (claim) sentences.push(`Claim: ${claim.label}`);
  return `${sentences.join('. ')}.`;
}

/** What is said of a stone beside its value. */
export function remarksOn(stone: PlotStone): string {
  return [stone.atMost && 'at most', stone.flagged && 'flagged', stone.setAside && 'set aside']
    .filter(Boolean)
    .join(', ');
}
