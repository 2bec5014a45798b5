'use client';

import { Table, Td, Th, Tr } from '@/components/ui/table';
import type { TraceDescription } from '@/lib/measurement/traces/import/types';

const DELIMITERS: Record<string, string> = { ',': 'comma', ';': 'semicolon', '\t': 'tab', '|': 'bar' };

/** What the importer understood of a file, before it counts. */
export function TraceUnderstood({ description }: { description: TraceDescription }) {
  const { time, value } = description;
  const timeName = description.columns.find((column) => column.index === time.timeColumn)?.name ?? 'none';
  return (
    <div className="text-note">
      <p>
        Read as {description.kind}: {description.kindReason}. Time from “{timeName}” ({time.format}, {time.zone}), power
        from “{value.name}” in {value.unit}; cells parted by{' '}
        {DELIMITERS[description.delimiter] ?? description.delimiter}, decimal{' '}
        {description.decimalMark === ',' ? 'comma' : 'point'}. {description.readings} readings of {description.rows}{' '}
        rows.
      </p>
      {description.warnings.length > 0 && (
        <ul className="mt-2 list-disc pl-5">
          {description.warnings.map(({ line, message }) => (
            <li key={`${line} ${message}`}>
              {line !== null && `Line ${line}. `}
              {message}
            </li>
          ))}
        </ul>
      )}
      <Table caption="First rows, as they were read" captionShown className="mt-3">
        <thead>
          <tr>
            <Th>line</Th>
            <Th wide>in the file</Th>
            <Th>time</Th>
            <Th numeric>{value.unit === 'Wh' || value.unit === 'kWh' ? 'Wh' : 'W'}</Th>
          </tr>
        </thead>
        <tbody>
          {description.firstRows.slice(0, 5).map((row) => (
            <Tr key={row.line}>
              <Td numeric className="text-left">
                {row.line}
              </Td>
              <Td wide className="font-mono text-cell">
                {row.cells.join(' · ')}
              </Td>
              <Td className="font-mono text-cell">{row.time ?? 'not read'}</Td>
              <Td numeric>{row.value ?? 'not read'}</Td>
            </Tr>
          ))}
        </tbody>
      </Table>
    </div>
  );
}
