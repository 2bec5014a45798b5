import type { Figure, FigureSummary } from '@/lib/figures/schema';
import { formatFigure, formatRange } from '@/lib/measurement/units/format-figure';

const SMALL = ['no', 'one', 'two', 'three', 'four', 'five', 'six', 'seven', 'eight', 'nine', 'ten', 'eleven', 'twelve'];

/** A count as a word where it is small, for sentences. */
export function countWords(count: number, singular: string, plural = `${singular}s`): string {
  return `${SMALL[count] ?? count} ${count === 1 ? singular : plural}`;
}

/** What a figure is the figure of: "Energy of a day", "Compressor running". */
export function figureName(figure: Pick<Figure, 'quantity' | 'mode'>): string {
  const mode = figure.mode?.name ?? '';
  switch (figure.quantity) {
    case 'day-energy':
      return 'Energy of a day';
    case 'use-energy':
      return 'Energy of a use';
    case 'maximum-power':
      return `${mode}, highest 10 s mean`;
    case 'minimum-power':
      return `${mode}, lowest`;
    case 'start-extra-energy':
      return 'Extra energy of a start';
    case 'mean-power':
      return mode || 'Mean power';
  }
}

/** A published median as it is written: with its uncertainty where it has one. */
export function medianOf(figure: FigureSummary) {
  return formatFigure({
    value: figure.median,
    standardUncertainty: figure.standardUncertainty,
    unit: figure.unit,
    atMost: figure.atMost,
  });
}

/** In a sentence a day's energy reads "829 Wh", the day being said already. */
export function plainUnit(unit: string): string {
  return unit.replace(/\/(d|use)$/, '');
}

/** Who stands behind it: one unit, or so many contributors. */
export function voicesOf(figure: Pick<FigureSummary, 'n'>): string {
  return figure.n === 1 ? 'one unit' : countWords(figure.n, 'contributor');
}

/** The range beside a median, in the median's unit. */
export function rangeOf(figure: FigureSummary): string {
  return formatRange(figure.minimum, figure.maximum, plainUnit(figure.unit), figure.median);
}

const MONTHS = ['Jan', 'Feb', 'Mar', 'Apr', 'May', 'Jun', 'Jul', 'Aug', 'Sep', 'Oct', 'Nov', 'Dec'];

/** A day as it is written on a sheet: "3 Sep 2026". */
export function dayWords(isoDate: string): string {
  const [year, month, day] = isoDate.slice(0, 10).split('-').map(Number);
  return `${day} ${MONTHS[(month ?? 1) - 1]} ${year}`;
}
