'use client';

import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { z } from 'zod';
import { TracePlot } from '@/components/charts/trace-plot';
import { Button } from '@/components/ui/button';
import { Disclosure } from '@/components/ui/disclosure';
import { Select, TextInput } from '@/components/ui/inputs';
import { formatDuration } from '@/lib/measurement/units/format-figure';
import { callApi } from '@/lib/platform/http/call-api';
import { traceLevel } from '@/lib/reports/schema';
import type { TracedPhaseValues, TraceValues } from './editor-values';
import { TraceUnderstood } from './trace-understood';
import type { EditorCategory } from './use-editor-data';

const windowAnswer = z.object({ level: traceLevel });

interface TraceCardProps {
  trace: TraceValues;
  category: EditorCategory | undefined;
  onChange: (phases: TracedPhaseValues[]) => void;
  onRemove: () => void;
}

/** A trace as it was read: drawn, with its phases to set by dragging, by keys, by buttons or by choosing. */
export function TraceCard({ trace, category, onChange, onRemove }: TraceCardProps) {
  const { summary, phases } = trace;
  const whole = { from: Date.parse(summary.startsAt) / 1000, to: Date.parse(summary.endsAt) / 1000 };
  const [shown, setShown] = useState<{ from: number; to: number } | null>(null);
  const finer = useQuery({
    enabled: shown !== null,
    queryKey: ['trace-window', trace.tracePublicId, shown],
    queryFn: () =>
      callApi(`/api/v1/traces/${trace.tracePublicId}/window?from=${shown?.from}&to=${shown?.to}&blocks=1600`, {
        answer: windowAnswer,
      }),
  });
  const nameOf = (code: string) => category?.modes.find((mode) => mode.code === code)?.name ?? 'no mode yet';
  const coarse = summary.levels[summary.levels.length - 1];
  const change = (id: string, changed: Partial<TracedPhaseValues>) =>
    onChange(phases.map((phase) => (phase.id === id ? { ...phase, ...changed } : phase)));
  const split = (phase: TracedPhaseValues) => {
    const middle = (phase.fromSeconds + phase.toSeconds) / 2;
    onChange(
      phases.flatMap((known) =>
        known.id === phase.id
          ? [
              { ...phase, toSeconds: middle },
              { ...phase, id: crypto.randomUUID(), fromSeconds: middle },
            ]
          : [known],
      ),
    );
  };
  return (
    <section aria-label={`Trace ${trace.fileName}`} className="my-6 border-t border-rule pt-4">
      {coarse && (
        <TracePlot
          title={`${trace.fileName}: ${formatDuration(whole.to - whole.from)}`}
          level={coarse}
          detail={finer.data && shown ? { level: finer.data.level, window: shown } : undefined}
          whole={whole}
          unit={summary.powerKind === 'real' ? 'W' : 'VA'}
          zone={trace.zone}
          phases={phases.map((phase) => ({
            id: phase.id,
            name: nameOf(phase.modeCode),
            from: phase.fromSeconds,
            to: phase.toSeconds,
          }))}
          onWindowChange={setShown}
          onPhaseChange={(id, { from, to }) => change(id, { fromSeconds: from, toSeconds: to })}
        />
      )}
      {phases.map((phase, index) => (
        <div key={phase.id} className="flex flex-wrap items-end gap-x-5 border-b border-rule">
          <Select
            label={`Mode of phase ${index + 1}`}
            placeholder="Choose a mode"
            name={`phase-${phase.id}`}
            fieldClassName="min-w-56 flex-1"
            value={phase.modeCode}
            onChange={(event) => change(phase.id, { modeCode: event.target.value })}
            options={(category?.modes ?? []).map((mode) => ({ value: mode.code, label: mode.name }))}
          />
          {category?.duty === 'per-use' && (
            <TextInput
              label="Uses in it"
              name={`uses-${phase.id}`}
              inputMode="numeric"
              className="max-w-24"
              value={phase.uses}
              onChange={(event) => change(phase.id, { uses: event.target.value })}
            />
          )}
          <p className="mb-5 flex gap-4">
            <Button look="quiet" onClick={() => split(phase)}>
              Split phase {index + 1}
            </Button>
            {phases.length > 1 && (
              <Button look="quiet" onClick={() => onChange(phases.filter((known) => known.id !== phase.id))}>
                Remove phase {index + 1}
              </Button>
            )}
          </p>
        </div>
      ))}
      <Disclosure summary="What was understood of the file">
        <TraceUnderstood description={trace.description} />
      </Disclosure>
      <Button look="quiet" onClick={onRemove}>
        Remove {trace.fileName}
      </Button>
    </section>
  );
}
