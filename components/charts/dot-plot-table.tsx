import { Table, Td, Th, Tr } from '@/components/ui/table';
import { threeDigits } from './axis';
import { type DotPlotNumbers, remarksOn } from './dot-plot-words';

/** The same numbers as the picture. Its rows, in the order of their values, are also what the arrow keys read out. */
export function DotPlotTable(props: DotPlotNumbers & { title: string }) {
  const { title, stones, median, q1, q3, atMost, claim, unit, noun, format = threeDigits } = props;
  const ordered = [...stones].sort((one, other) => one.value - other.value);
  const remarks = stones.some((stone) => remarksOn(stone) !== '');
  const summary = [
    { name: atMost ? 'Median, at most' : 'Median', value: format(median) },
    ...(q1 !== undefined && q3 !== undefined ? [{ name: 'Middle half', value: `${format(q1)}–${format(q3)}` }] : []),
  ];
  const one = noun?.one ?? 'contributor';
  return (
    <Table caption={title} className="max-w-md">
      <thead>
        <tr>
          <Th>{one}</Th>
          <Th numeric>value</Th>
          {remarks && <Th>remark</Th>}
        </tr>
      </thead>
      <tbody>
        {ordered.map((stone, index) => (
          <Tr key={stone.id} data-stone={stone.id}>
            <Th scope="row">{stone.label ?? `${one} ${index + 1}`}</Th>
            <Td numeric>
              {format(stone.value)} {unit}
            </Td>
            {remarks && <Td>{remarksOn(stone)}</Td>}
          </Tr>
        ))}
      </tbody>
      <tfoot>
        {summary.map((row) => (
          <Tr key={row.name}>
            <Th scope="row">{row.name}</Th>
            <Td numeric>
              {row.value} {unit}
            </Td>
            {remarks && <Td />}
          </Tr>
        ))}
        {claim && (
          <Tr>
            <Th scope="row">Claim</Th>
            <Td colSpan={remarks ? 2 : 1}>{claim.label}</Td>
          </Tr>
        )}
      </tfoot>
    </Table>
  );
}
