import Link from 'next/link';
import { RangeAxis, RangeBar } from '@/components/charts/range-bar';
import { shareScale } from '@/components/charts/range-scale';
import { Table, Td, Th, Tr } from '@/components/ui/table';
import { medianOf, plainUnit } from '@/components/figures/figure-words';
import type { DeviceWithFigure } from '@/lib/figures/schema';

interface CategoryTableProps {
  devices: DeviceWithFigure[];
  quantityWords: string;
}

/** The devices of a category on one axis, so that the list is a chart. */
export function CategoryTable({ devices, quantityWords }: CategoryTableProps) {
  const measured = devices.flatMap(({ figure }) => (figure ? [figure] : []));
  const unit = measured[0] ? plainUnit(measured[0].unit) : '';
  const scale = shareScale(measured.map((figure) => ({ low: figure.minimum, high: figure.maximum })));
  return (
    <Table caption={`Devices by ${quantityWords}`}>
      <thead>
        <tr>
          <Th>device</Th>
          <Th numeric>{quantityWords}</Th>
          <Th numeric wide>
            contributors
          </Th>
          <Th wide className="w-2/5">
            <span className="sr-only">range</span>
            <RangeAxis scale={scale} unit={unit} />
          </Th>
        </tr>
      </thead>
      <tbody>
        {devices.map(({ publicId, slug, name, figure }) => (
          <Tr key={publicId}>
            <Td>
              <Link href={`/devices/${slug}`} className="text-lichen underline underline-offset-4">
                {name}
              </Link>
            </Td>
            <Td numeric>{figure ? medianOf(figure).text.replace(/\/(d|use)$/, '') : 'not measured'}</Td>
            <Td numeric wide>
              {figure?.n ?? 0}
            </Td>
            <Td wide>
              {figure && (
                <RangeBar
                  scale={scale}
                  low={figure.minimum}
                  high={figure.maximum}
                  median={figure.median}
                  q1={figure.lowerQuartile ?? undefined}
                  q3={figure.upperQuartile ?? undefined}
                  unit={unit}
                  name={name}
                />
              )}
            </Td>
          </Tr>
        ))}
      </tbody>
    </Table>
  );
}
