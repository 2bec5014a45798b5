import { FigureRow, type PlottedClaim } from '@/components/figures/figure-row';
import { claimWords } from '@/components/claims/claim-words';
import type { Category } from '@/lib/catalogue/schema';
import type { ClaimBeside } from '@/lib/claims/rules';
import type { Figure } from '@/lib/figures/schema';

interface DeviceFiguresProps {
  category: Category;
  figures: Figure[];
  besides: ClaimBeside<Figure>[];
}

const ORDER: Figure['quantity'][] = [
  'day-energy',
  'use-energy',
  'mean-power',
  'start-extra-energy',
  'maximum-power',
  'minimum-power',
];

/** The figures of a device: the category's basis first, then the modes in the category's order, then extremes. */
export function DeviceFigures({ category, figures, besides }: DeviceFiguresProps) {
  const place = (figure: Figure) => category.modes.findIndex((mode) => mode.code === figure.mode?.code);
  const shown = figures
    .filter((figure) => figure.isMain)
    .sort(
      (a, b) =>
        Number(b.isHeadline) - Number(a.isHeadline) ||
        ORDER.indexOf(a.quantity) - ORDER.indexOf(b.quantity) ||
        place(a) - place(b),
    );
  const noteOf = (figure: Figure) => category.modes.find((mode) => mode.code === figure.mode?.code)?.note;
  return shown.map((figure) => (
    <FigureRow
      key={`${figure.quantity} ${figure.mode?.code}`}
      figure={figure}
      note={noteOf(figure)}
      claim={claimOf(figure, besides)}
    />
  ));
}

/** The claim that is compared with this figure, in its unit, for the bracket above the pile. */
function claimOf(figure: Figure, besides: ClaimBeside<Figure>[]): PlottedClaim | undefined {
  const beside = besides.find((known) => known.figure === figure && known.comparison?.interval);
  const interval = beside?.comparison?.interval;
  return beside && interval ? { ...interval, label: `maker ${claimWords(beside.claim)}` } : undefined;
}
