import { RowMore, Table, Td, Th, Tr } from '@/components/ui/table';
import { formatDuration, formatFigure } from '@/lib/measurement/units/format-figure';
import type { ReportFigure } from '@/lib/reports/schema';

const PARTS: [keyof ReportFigure['parts'], string][] = [
  ['gain', 'the instrument’s gain'],
  ['offset', 'the instrument’s offset'],
  ['resolution', 'the display’s step'],
  ['repeatability', 'how it varied'],
  ['drift', 'the shortness of the recording'],
  ['belowLimit', 'what the instrument can’t see'],
];

/** Names and units of what a report yields, for readers. */
export function reportFigureName(figure: Pick<ReportFigure, 'quantity' | 'modeName'>): string {
  const mode = figure.modeName ?? '';
  switch (figure.quantity) {
    case 'day-energy':
      return 'Energy of a day';
    case 'use-energy':
      return 'Energy of a use';
    case 'maximum-power':
      return `${mode}, highest mean`;
    case 'minimum-power':
      return `${mode}, lowest`;
    case 'start-extra-energy':
      return 'Extra energy of a start';
    case 'mean-power':
      return mode;
  }
}

export function reportFigureText(figure: ReportFigure): string {
  const power = figure.powerKind === 'apparent' ? 'VA' : 'W';
  return formatFigure({
    value: figure.censoredAt ?? figure.value,
    standardUncertainty: figure.standardUncertainty,
    unit: figure.quantity.endsWith('-power') ? power : 'Wh',
    atMost: figure.censoredAt !== null,
  }).text;
}

/** What weighs most in a figure's uncertainty, by its share of the variance. */
function dominant(figure: ReportFigure): string {
  const [key, words] = PARTS.reduce((most, part) => (figure.parts[part[0]] > figure.parts[most[0]] ? part : most));
  const total = PARTS.reduce((sum, [part]) => sum + figure.parts[part] ** 2, 0);
  if (total === 0) return 'nothing';
  return `${words} (${Math.round((figure.parts[key] ** 2 / total) * 100)} %)`;
}

/** Each figure with its uncertainty, over which interval it averages, and what dominates. */
export function ReportFigures({ figures }: { figures: ReportFigure[] }) {
  return (
    <Table caption="Figures with their uncertainty (k = 2)">
      <thead>
        <tr>
          <Th>figure of</Th>
          <Th numeric>value</Th>
          <Th numeric wide>
            averaged over
          </Th>
          <Th numeric wide>
            coverage
          </Th>
          <Th wide>what dominates</Th>
        </tr>
      </thead>
      <tbody>
        {figures.map((figure) => (
          <FigureLine key={figure.id} figure={figure} />
        ))}
      </tbody>
    </Table>
  );
}

function FigureLine({ figure }: { figure: ReportFigure }) {
  const averaged = formatDuration(figure.averagingSeconds ?? figure.countedSeconds);
  const coverage = figure.coverage === null ? 'typed' : `${Math.floor(figure.coverage * 100)} %`;
  return (
    <>
      <Tr className="max-sm:border-0">
        <Td>
          {reportFigureName(figure)}
          {figure.setAside !== null && (
            <span className="block text-caption text-rust">set aside: {figure.setAside}</span>
          )}
        </Td>
        <Td numeric className="whitespace-nowrap">
          {reportFigureText(figure)}
        </Td>
        <Td numeric wide className="whitespace-nowrap">
          {averaged}
        </Td>
        <Td numeric wide>
          {coverage}
        </Td>
        <Td wide className="text-caption">
          {dominant(figure)}
        </Td>
      </Tr>
      <RowMore
        columns={2}
        of={reportFigureName(figure)}
        facts={[
          { label: 'averaged over', value: averaged },
          { label: 'coverage', value: coverage },
          { label: 'dominated by', value: dominant(figure) },
        ]}
      />
    </>
  );
}
