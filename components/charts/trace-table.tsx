import { Table, Td, Th, Tr } from '@/components/ui/table';
import { threeDigits } from './axis';
import type { TraceRow } from './trace-summary';
import { type TraceClock, moment } from './trace-time';

interface TraceTableProps {
  caption: string;
  rows: readonly TraceRow[];
  unit: string;
  clock: TraceClock;
  withSeconds: boolean;
}

/** The part of a trace that is drawn, in stretches of equal length. */
export function TraceTable({ caption, rows, unit, clock, withSeconds }: TraceTableProps) {
  return (
    <Table caption={caption} className="max-w-xl">
      <thead>
        <tr>
          <Th>from</Th>
          <Th numeric>least ({unit})</Th>
          <Th numeric>mean ({unit})</Th>
          <Th numeric>most ({unit})</Th>
        </tr>
      </thead>
      <tbody>
        {rows.map((row) => (
          <Tr key={row.from}>
            <Th scope="row">{moment(row.from, clock, withSeconds)}</Th>
            <Td numeric>{threeDigits(row.minimum)}</Td>
            <Td numeric>{threeDigits(row.mean)}</Td>
            <Td numeric>{threeDigits(row.maximum)}</Td>
          </Tr>
        ))}
      </tbody>
    </Table>
  );
}
