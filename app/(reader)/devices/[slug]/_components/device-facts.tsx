import Link from 'next/link';
import { Fact, Margin } from '@/components/layout/margin';
import { claimWords } from '@/components/claims/claim-words';
import {
  countWords,
  dayWords,
  figureName,
  medianOf,
  plainUnit,
  rangeOf,
  voicesOf,
} from '@/components/figures/figure-words';
import type { Category } from '@/lib/catalogue/schema';
import type { ClaimBeside } from '@/lib/claims/rules';
import type { Figure } from '@/lib/figures/schema';
import { formatFigure } from '@/lib/measurement/units/format-figure';

interface DeviceFactsProps {
  devicePublicId: string;
  category: Category;
  figures: Figure[];
  besides: ClaimBeside<Figure>[];
}

const NIGHT_HOURS = 8;

/** The margin: the same numbers as the sheet's, each with a line that says what it is. */
export function DeviceFacts({ devicePublicId, category, figures, besides }: DeviceFactsProps) {
  const headline = figures.find((figure) => figure.isHeadline);
  const [claim] = besides;
  const missing = category.modes.filter(
    (mode) =>
      mode.code !== 'cycling' &&
      mode.code !== 'programme' &&
      !figures.some((figure) => figure.mode?.code === mode.code),
  );
  return (
    <Margin>
      {headline && (
        <Fact label={figureName(headline)} figure={`${medianOf(headline).value} ${plainUnit(medianOf(headline).unit)}`}>
          median of {voicesOf(headline)}
          {headline.n > 1 && `, range ${rangeOf(headline)}`}
        </Fact>
      )}
      {claim && (
        <Fact label="The maker says" figure={claimWords(claim.claim)} tone="slate">
          “{claim.claim.term}”, read {dayWords(claim.claim.source.readOn)}
        </Fact>
      )}
      <NightFact category={category} figures={figures} />
      {headline && (
        <Fact label="Evidence" figure={`${headline.n} · ${headline.counts.reports}`}>
          contributors · reports; {headline.flagged === 0 ? 'none' : headline.flagged} flagged,{' '}
          {headline.setAside === 0 ? 'none' : headline.setAside} set aside
        </Fact>
      )}
      {missing.length > 0 && (
        <Fact label="Not measured yet">
          {missing.map((mode) => mode.name).join(', ')}.{' '}
          <Link
            href={`/reports/new?device=${devicePublicId}`}
            className="font-semibold text-lichen underline underline-offset-4"
          >
            Measure this
          </Link>
        </Fact>
      )}
      {headline && headline.counts.instruments > 0 && (
        <Fact label="Measured with">{countWords(headline.counts.instruments, 'kind')} of instrument</Fact>
      )}
    </Margin>
  );
}

/** What eight hours off would save of an idle draw; never for what must not be switched off. */
function NightFact({ category, figures }: Pick<DeviceFactsProps, 'category' | 'figures'>) {
  if (!category.mayBeSwitchedOff) {
    return (
      <Fact label="Switched off at night">Not for this: food can spoil, and the heat comes back as energy later.</Fact>
    );
  }
  const idle = figures.find(
    (figure) => figure.isMain && figure.quantity === 'mean-power' && figure.mode?.code === 'idle',
  );
  const left = figures.find(
    (figure) => figure.isMain && figure.quantity === 'mean-power' && figure.mode?.code === 'left-on',
  );
  const figure = idle ?? left;
  if (!figure) return null;
  const saved = formatFigure({ value: -figure.median * NIGHT_HOURS, unit: 'Wh' });
  return (
    <Fact label="Switched off at night" figure={`${saved.value} ${saved.unit}`}>
      {NIGHT_HOURS} hours of {figure.mode?.name.toLowerCase()}, nothing drawn when off; what the next start costs is not
      in it
    </Fact>
  );
}
