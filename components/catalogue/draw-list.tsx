import Link from 'next/link';
import { RangeAxis, RangeBar } from '@/components/charts/range-bar';
import { shareScale } from '@/components/charts/range-scale';
import { medianOf, plainUnit, rangeOf, voicesOf } from '@/components/figures/figure-words';
import type { Device } from '@/lib/catalogue/schema';
import type { Figure } from '@/lib/figures/schema';

export interface DrawHit {
  device: Pick<Device, 'publicId' | 'slug' | 'name' | 'aliases' | 'category'>;
  figure: Figure | null;
}

interface DrawListProps {
  hits: DrawHit[];
  /** Names the category in each line, where the list mixes them. */
  withCategory?: boolean;
}

/** Devices with their typical draw; those of one unit share one axis down the page. */
export function DrawList({ hits, withCategory = false }: DrawListProps) {
  const figures = hits.flatMap(({ figure }) => (figure ? [figure] : []));
  const unit = figures[0] ? plainUnit(figures[0].unit) : '';
  const sharesUnit = figures.length > 0 && figures.every((figure) => figure.unit === figures[0]?.unit);
  const scale = sharesUnit
    ? shareScale(figures.map(({ minimum, maximum }) => ({ low: minimum, high: maximum })))
    : null;
  const columns = 'grid grid-cols-[1fr_auto] gap-x-6 sm:grid-cols-[1fr_9rem_16rem]';
  return (
    <div>
      {scale && (
        <div className={`${columns} border-b border-rule py-1.5 max-sm:hidden`}>
          <span />
          <span />
          <RangeAxis scale={scale} unit={unit} />
        </div>
      )}
      <ul>
        {hits.map(({ device, figure }) => (
          <li key={device.publicId} className={`${columns} items-center border-b border-rule py-3`}>
            <div>
              <Link href={`/devices/${device.slug}`} className="font-semibold text-lichen underline underline-offset-4">
                {device.name}
              </Link>
              <p className="text-caption text-muted">
                {[
                  ...(withCategory ? [device.category.name] : []),
                  ...(device.aliases.length > 0 ? [`also ${device.aliases.join(', ')}`] : []),
                ].join('; ')}
              </p>
            </div>
            <p className="text-right font-mono">
              {figure ? (
                <>
                  {medianOf(figure).value} {medianOf(figure).unit}
                  <span className="block text-cell text-muted">
                    {figure.n > 1 ? `${rangeOf(figure)}, ` : ''}
                    {voicesOf(figure)}
                  </span>
                </>
              ) : (
                <span className="text-cell text-muted">not measured</span>
              )}
            </p>
            <div className="max-sm:hidden">
              {figure && scale && (
                <RangeBar
                  scale={scale}
                  low={figure.minimum}
                  high={figure.maximum}
                  median={figure.median}
                  q1={figure.lowerQuartile ?? undefined}
                  q3={figure.upperQuartile ?? undefined}
                  unit={unit}
                  name={device.name}
                />
              )}
            </div>
          </li>
        ))}
      </ul>
    </div>
  );
}
