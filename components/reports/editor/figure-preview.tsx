'use client';

import { useQuery } from '@tanstack/react-query';
import { useFormContext, useWatch } from 'react-hook-form';
import { z } from 'zod';
import { Notice } from '@/components/layout/notices';
import { Table, Td, Th, Tr } from '@/components/ui/table';
import { formatDuration, formatFigure } from '@/lib/measurement/units/format-figure';
import { readQuantity } from '@/lib/measurement/units/read-quantity';
import { callApi } from '@/lib/platform/http/call-api';
import { reportFigure } from '@/lib/reports/schema';
import { phase, type Phase } from '@/lib/reports/schema/content';
import type { EditorValues } from './editor-values';
import { toSubmission } from './to-submission';
import type { EditorCategory } from './use-editor-data';

const preview = z.object({
  figures: z.array(reportFigure.omit({ id: true, setAside: true, modeName: true })),
  refusals: z.array(z.object({ modeCode: z.string().nullable(), reason: z.string() })),
  missing: z.array(z.string()),
});

const QUANTITY_WORDS: Record<string, string> = {
  'mean-power': 'mean power',
  'minimum-power': 'lowest power',
  'maximum-power': 'highest 10 s mean',
  'day-energy': 'energy of a day',
  'use-energy': 'energy of a use',
  'start-extra-energy': 'extra energy of a start',
};

function unitOf(quantity: string, powerKind: string): string {
  if (quantity === 'day-energy') return 'Wh/d';
  if (quantity === 'use-energy') return 'Wh/use';
  return powerKind === 'apparent' ? 'VA' : 'W';
}

/** The phases that can be computed as they stand; unfinished ones are left out of the preview. */
function readyPhases(values: EditorValues): Phase[] {
  const tried = toSubmission({ ...values, licenceAgreed: true });
  if (tried.ok) return tried.submission.content.phases;
  const traced = values.traces.flatMap((trace) =>
    trace.phases.map((known) => ({
      source: 'trace' as const,
      modeCode: known.modeCode,
      tracePublicId: trace.tracePublicId,
      fromSeconds: known.fromSeconds,
      toSeconds: known.toSeconds,
      uses: known.uses === '' ? null : Number(known.uses),
      note: '',
    })),
  );
  return traced.filter((known) => phase.safeParse(known).success);
}

/** The voltage, where one was measured and can be read. */
function voltsOf({ supplyVolts }: EditorValues): number | null {
  const reading = readQuantity(supplyVolts, 'V');
  return reading.status === 'understood' && reading.value > 0 && reading.value <= 1000 ? reading.value : null;
}

/** Figures with their uncertainty as readings come in, so that the member sees what the instrument can tell. */
export function FigurePreview({ category }: { category: EditorCategory }) {
  const form = useFormContext<EditorValues>();
  const values = useWatch({ control: form.control }) as EditorValues;
  const phases = readyPhases(values);
  const body = {
    categoryPublicId: category.publicId,
    instrumentPublicId: values.instrumentPublicId,
    methodCode: values.methodCode || null,
    ...(values.supplyClass ? { supplyClass: values.supplyClass } : {}),
    supplyVolts: voltsOf(values),
    phases,
  };
  const result = useQuery({
    enabled: phases.length > 0 && values.instrumentPublicId !== '',
    queryKey: ['preview', body],
    queryFn: () => callApi('/api/v1/figure-previews', { method: 'POST', body, answer: preview }),
    placeholderData: (before) => before,
  });
  if (phases.length === 0) return null;
  if (values.instrumentPublicId === '') {
    return <Notice>Choose the instrument, and the figures appear here with their uncertainty.</Notice>;
  }
  const nameOf = (code: string | null) => category.modes.find((mode) => mode.code === code)?.name ?? 'the whole';
  return (
    <section aria-label="Figures so far" className="mt-8">
      <h3 className="text-subheading">Figures so far</h3>
      {result.isError && (
        <Notice tone="warning" role="alert">
          {result.error.message}
        </Notice>
      )}
      {result.data?.refusals.map((refusal) => (
        <Notice key={refusal.reason} tone="warning" title={`No figure of ${nameOf(refusal.modeCode).toLowerCase()}`}>
          {refusal.reason}
        </Notice>
      ))}
      {result.data && result.data.missing.length > 0 && (
        <Notice title="What the method asks for besides">
          {result.data.missing.map((line) => (
            <p key={line}>{line}</p>
          ))}
          <p>You can send it all the same; the moderator decides.</p>
        </Notice>
      )}
      {result.data && result.data.figures.length > 0 && (
        <Table caption="Figures so far, with their uncertainty (k = 2)">
          <thead>
            <tr>
              <Th>mode</Th>
              <Th>quantity</Th>
              <Th numeric>figure</Th>
              <Th numeric wide>
                counted time
              </Th>
            </tr>
          </thead>
          <tbody>
            {result.data.figures.map((figure) => (
              <Tr key={`${figure.modeCode} ${figure.quantity} ${figure.powerKind}`}>
                <Td>{nameOf(figure.modeCode)}</Td>
                <Td>{QUANTITY_WORDS[figure.quantity]}</Td>
                <Td numeric>
                  {
                    formatFigure({
                      value: figure.censoredAt ?? figure.value,
                      standardUncertainty: figure.standardUncertainty,
                      unit: unitOf(figure.quantity, figure.powerKind),
                      atMost: figure.censoredAt !== null,
                    }).text
                  }
                </Td>
                <Td numeric wide>
                  {formatDuration(figure.countedSeconds)}
                </Td>
              </Tr>
            ))}
          </tbody>
        </Table>
      )}
    </section>
  );
}
