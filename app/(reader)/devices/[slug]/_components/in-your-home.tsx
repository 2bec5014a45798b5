import { Section } from '@/components/layout/headings';
import { Figure as Number } from '@/components/ui/figure';
import type { Category } from '@/lib/catalogue/schema';
import type { Figure } from '@/lib/figures/schema';
import { formatFigure } from '@/lib/measurement/units/format-figure';

const DAYS_A_YEAR = 365;

interface HomeEnergy {
  wattHoursADay: number;
  how: string;
}

/** A day's energy in an ordinary home: as measured, by uses, or by the hours of each mode. */
function dayEnergy(category: Category, figures: Figure[]): HomeEnergy | null {
  const main = figures.filter((figure) => figure.isMain);
  const { hoursByMode, usesPerDay } = category.usePattern;
  const use = main.find((figure) => figure.quantity === 'use-energy');
  if (use && usesPerDay !== null) {
    return { wattHoursADay: use.median * usesPerDay, how: `${usesPerDay} uses a day, what stands by left out` };
  }
  const day = main.find((figure) => figure.quantity === 'day-energy');
  if (day && category.duty === 'cyclic') return { wattHoursADay: day.median, how: 'measured over whole days' };
  const parts = Object.entries(hoursByMode).map(([code, hours]) => {
    const power = main.find((figure) => figure.quantity === 'mean-power' && figure.mode?.code === code);
    return power ? { wattHours: power.median * hours, words: `${hours} h ${power.mode?.name.toLowerCase()}` } : null;
  });
  if (parts.length === 0 || parts.some((part) => part === null)) return null;
  const known = parts.filter((part) => part !== null);
  return {
    wattHoursADay: known.reduce((sum, part) => sum + part.wattHours, 0),
    how: `a day of ${known.map((part) => part.words).join(' and ')}`,
  };
}

/** What the figures come to over a year, with the day that it rests on. */
export function InYourHome({ category, figures }: { category: Category; figures: Figure[] }) {
  const energy = dayEnergy(category, figures);
  if (!energy) return null;
  const day = formatFigure({ value: energy.wattHoursADay, unit: 'Wh' });
  const year = formatFigure({ value: energy.wattHoursADay * DAYS_A_YEAR, unit: 'Wh' });
  return (
    <Section title="In your home">
      <p className="mt-4 flex flex-wrap gap-x-8 gap-y-2">
        <Number size="row" value={day.value} unit={`${day.unit} a day`} />
        <Number size="row" value={year.value} unit={`${year.unit} a year`} />
      </p>
      <p className="mt-2 text-note text-muted">For {energy.how}..</p>
    </Section>
  );
}
