import { Section } from '@/components/layout/headings';
import { Figure as Number } from '@/components/ui/figure';
import type { Category } from '@/lib/catalogue/schema';
import type { Figure } from '@/lib/figures/schema';
import { formatFigure } from '@/lib/measurement/units/format-figure';

const DAYS_A_YEAR = 365;

interface HomeEnergy {
  wattHoursADay: number;
  /** Known where the day itself was measured. */
  standardUncertainty: number | null;
  how: string;
}

/** A day's energy in an ordinary home: as measured, by uses, or by the hours of each mode. */
function dayEnergy(category: Category, figures: Figure[]): HomeEnergy | null {
  const main = figures.filter((figure) => figure.isMain);
  const { hoursByMode, usesPerDay } = category.usePattern;
  const use = main.find((figure) => figure.quantity === 'use-energy');
  if (use && usesPerDay !== null) {
    return {
      wattHoursADay: use.median * usesPerDay,
      standardUncertainty: use.standardUncertainty === null ? null : use.standardUncertainty * usesPerDay,
      how: `With ${usesPerDay} uses a day; what it takes in between is left out.`,
    };
  }
  const day = main.find((figure) => figure.quantity === 'day-energy');
  if (day && category.duty === 'cyclic') {
    return {
      wattHoursADay: day.median,
      standardUncertainty: day.standardUncertainty,
      how: 'As measured, over whole days.',
    };
  }
  const parts = Object.entries(hoursByMode).map(([code, hours]) => {
    const power = main.find((figure) => figure.quantity === 'mean-power' && figure.mode?.code === code);
    return power ? { wattHours: power.median * hours, words: `${hours} h ${power.mode?.name.toLowerCase()}` } : null;
  });
  if (parts.length === 0 || parts.some((part) => part === null)) return null;
  const known = parts.filter((part) => part !== null);
  return {
    wattHoursADay: known.reduce((sum, part) => sum + part.wattHours, 0),
    standardUncertainty: null,
    how: `For a day of ${known.map((part) => part.words).join(' and ')}.`,
  };
}

/** What the figures come to over a year, with the day that it rests on. */
export function InYourHome({ category, figures }: { category: Category; figures: Figure[] }) {
  const energy = dayEnergy(category, figures);
  if (!energy) return null;
  const over = (days: number, unit: string) => {
    const u = energy.standardUncertainty;
    const figure = formatFigure({
      value: energy.wattHoursADay * days,
      standardUncertainty: u === null ? null : u * days,
      unit: 'Wh',
    });
    const note = figure.uncertainty === null ? undefined : `± ${figure.uncertainty}`;
    return <Number size="row" value={figure.value} unit={`${figure.unit} ${unit}`} note={note} />;
  };
  return (
    <Section title="In your home">
      <p className="mt-4 flex flex-wrap gap-x-8 gap-y-2">
        {over(1, 'a day')}
        {over(DAYS_A_YEAR, 'a year')}
      </p>
      <p className="mt-2 text-note text-muted">{energy.how}</p>
    </Section>
  );
}
