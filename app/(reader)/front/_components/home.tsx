import Link from 'next/link';
import { DotPlot } from '@/components/charts/dot-plot';
import { dayWords, figureName, medianOf, plainUnit, rangeOf, voicesOf } from '@/components/figures/figure-words';
import { Section } from '@/components/layout/headings';
import { SearchBox } from '@/components/layout/search-box';
import { Sheet } from '@/components/layout/sheet';
import { loadCategories } from '@/lib/catalogue/loaders';
import { loadRecentlyChangedFigures } from '@/lib/figures/loaders';
import type { ChangedFigure } from '@/lib/figures/schema';

const MOST_CHANGED = 6;

/** Search first; then what is new; then how it works, in three lines. */
export async function Home() {
  const [changed, categories] = await Promise.all([loadRecentlyChangedFigures(MOST_CHANGED), loadCategories()]);
  return (
    <Sheet
      head={
        <>
          <h1 className="mt-1 text-name-phone sm:text-name">What does it really draw?</h1>
          <p className="mt-4 max-w-prose text-[1.1875rem] leading-normal sm:text-lead">
            Households measure what they own, moderators check it, and the pile shows what such a device takes, beside
            what its maker states.
          </p>
        </>
      }
    >
      <div className="mt-6 max-w-xl">
        <SearchBox size="page" />
      </div>
      <p className="mt-3 flex flex-wrap gap-x-5 text-note">
        {categories.map((category) => (
          <Link
            key={category.slug}
            href={`/categories/${category.slug}`}
            className="inline-block py-1 text-lichen underline underline-offset-4"
          >
            {category.name}
          </Link>
        ))}
      </p>
      <Section title="New and changed figures">
        {changed.length === 0 && <p className="mt-4 text-muted">Nothing has been verified yet.</p>}
        <ul>
          {changed.map((change) => (
            <ChangedRow key={`${change.device.publicId} ${change.figure.quantity}`} change={change} />
          ))}
        </ul>
      </Section>
      <Section title="How it works" ruled={false}>
        <ol className="mt-2 list-decimal space-y-1.5 pl-6">
          <li>You measure a device with what you have: a plug-in meter, a metering breaker, a logger’s file.</li>
          <li>A moderator checks device, instrument, duration and evidence, and says on the record what came of it.</li>
          <li>Your stone joins the pile: one voice a household, whatever it is, and the median moves or holds.</li>
        </ol>
      </Section>
    </Sheet>
  );
}

function ChangedRow({ change: { device, figure, medianBefore } }: { change: ChangedFigure }) {
  const median = medianOf(figure);
  const before =
    medianBefore === null
      ? 'the first figure'
      : medianBefore === figure.median
        ? 'the median holds'
        : `before ${medianOf({ ...figure, median: medianBefore, standardUncertainty: null }).text.replace(/\/(d|use)$/, '')}`;
  return (
    <li className="grid grid-cols-[1fr_auto] items-center gap-x-6 gap-y-1 border-b border-rule py-3 sm:grid-cols-[1fr_10rem_8rem]">
      <div>
        <Link href={`/devices/${device.slug}`} className="font-semibold text-lichen underline underline-offset-4">
          {device.name}
        </Link>
        <p className="text-caption text-muted">
          {figureName(figure)}, {voicesOf(figure)}, {dayWords(figure.changedAt)}; {before}
        </p>
      </div>
      <p className="text-right font-mono">
        {median.value} {plainUnit(median.unit)}
        <span className="block text-cell text-muted">{figure.n > 1 ? rangeOf(figure) : 'one unit'}</span>
      </p>
      <div className="max-sm:hidden">
        <DotPlot
          size="cell"
          title={device.name}
          stones={figure.stones}
          median={figure.median}
          unit={plainUnit(figure.unit)}
        />
      </div>
    </li>
  );
}
