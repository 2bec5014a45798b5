'use client';

import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { z } from 'zod';
import { TracePlot } from '@/components/charts/trace-plot';
import { formatDuration } from '@/lib/measurement/units/format-figure';
import { callApi } from '@/lib/platform/http/call-api';
import { traceLevel, type Phase, type ReportFigure, type ReportView } from '@/lib/reports/schema';

interface ReportTraceProps {
  trace: ReportView['traces'][number];
  phases: readonly Phase[];
  figures: readonly ReportFigure[];
}

const answer = z.object({ level: traceLevel });

/** A report's trace to explore: coarse at first, finer as one looks closer. */
export function ReportTrace({ trace, phases, figures }: ReportTraceProps) {
  const whole = { from: Date.parse(trace.startsAt) / 1000, to: Date.parse(trace.endsAt) / 1000 };
  const [shown, setShown] = useState<{ from: number; to: number } | null>(null);
  const finer = useQuery({
    enabled: shown !== null,
    staleTime: Infinity,
    queryKey: ['trace-window', trace.publicId, shown],
    queryFn: () =>
      callApi(`/api/v1/traces/${trace.publicId}/window?from=${shown?.from}&to=${shown?.to}&blocks=1600`, { answer }),
  });
  const level = trace.levels[trace.levels.length - 1];
  if (!level) return null;
  const nameOf = (code: string) =>
    figures.find((figure) => figure.modeCode === code)?.modeName ?? code.replaceAll('-', ' ');
  return (
    <TracePlot
      title={`${trace.fileName}: ${trace.samples} readings over ${formatDuration(whole.to - whole.from)}`}
      level={level}
      detail={finer.data && shown ? { level: finer.data.level, window: shown } : undefined}
      whole={whole}
      unit={trace.powerKind === 'real' ? 'W' : 'VA'}
      zone="UTC"
      phases={phases.flatMap((phase, i) =>
        phase.source === 'trace' && phase.tracePublicId === trace.publicId
          ? [{ id: String(i), name: nameOf(phase.modeCode), from: phase.fromSeconds, to: phase.toSeconds }]
          : [],
      )}
      onWindowChange={setShown}
    >
      <a
        href={`/api/v1/traces/${trace.publicId}/series`}
        className="text-caption text-lichen underline underline-offset-4"
      >
        Download the trace (CSV)
      </a>
    </TracePlot>
  );
}
