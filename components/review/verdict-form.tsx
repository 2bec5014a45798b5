'use client';

import { zodResolver } from '@hookform/resolvers/zod';
import { useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { useFieldArray, useForm, useWatch } from 'react-hook-form';
import { Notice } from '@/components/layout/notices';
import { Button } from '@/components/ui/button';
import { RadioGroup } from '@/components/ui/choices';
import { ErrorSummary } from '@/components/ui/error-summary';
import { problemsOfAnswer, type FormProblem } from '@/components/ui/form-problems';
import { Select, Textarea } from '@/components/ui/inputs';
import { callApi } from '@/lib/platform/http/call-api';
import type { ReportView } from '@/lib/reports/schema';
import { outcomeOf } from '@/lib/review/rules/outcome';
import {
  CHECK_RESULTS,
  verdictInput,
  verdictResult,
  type Verdict,
  type VerdictInput,
  type VerdictResult,
  type Warning,
} from '@/lib/review/schema';

interface VerdictFormProps {
  report: ReportView;
  warnings: readonly Warning[];
  onDecided: (result: VerdictResult) => void;
}

/** The fields that a remark may be pinned to, in the words of the editor. */
const FIELDS: [pointer: string, label: string][] = [
  ['/methodCode', 'Method'],
  ['/measuringPoint', 'Where it was measured'],
  ['/supplyClass', 'Supply'],
  ['/ambientCelsius', 'Room temperature'],
  ['/conditions', 'Conditions'],
  ['/phases', 'Phases'],
  ['/traces', 'Traces'],
  ['/photos', 'Photos'],
  ['/notes', 'Notes'],
];

/** Checklist, remarks and reason. The verdicts that the checklist allows can be pressed; the rule is the published one. */
export function VerdictForm({ report, warnings, onDecided }: VerdictFormProps) {
  const client = useQueryClient();
  const items = report.method.checklist;
  const form = useForm<VerdictInput>({
    resolver: zodResolver(verdictInput),
    defaultValues: {
      revision: report.revision,
      verdict: undefined,
      checklist: items.map((item) => ({ key: item.key, result: undefined, remark: '' })),
      reason: '',
      remarks: [],
    },
    shouldFocusError: false,
  });
  const remarks = useFieldArray({ control: form.control, name: 'remarks' });
  const checklist = useWatch({ control: form.control, name: 'checklist' });
  const [refused, setRefused] = useState<FormProblem[]>([]);
  const [attempt, setAttempt] = useState(0);
  const [busy, setBusy] = useState(false);
  const outcome = outcomeOf(
    items,
    checklist.filter((item) => item.result !== undefined),
  );

  const decide = (verdict: Verdict) => {
    setAttempt((count) => count + 1);
    setRefused([]);
    form.setValue('verdict', verdict);
    void form.handleSubmit(async (input) => {
      setBusy(true);
      try {
        const result = await callApi(`/api/v1/review/reports/${report.publicId}/verdict`, {
          method: 'POST',
          body: input,
          answer: verdictResult,
        });
        await client.invalidateQueries({ queryKey: ['review-queue'] });
        onDecided(result);
        window.scrollTo({ top: 0 });
      } catch (error) {
        setRefused(problemsOfAnswer(error, (pointer) => pointer.slice(1).replaceAll('/', '.')));
      } finally {
        setBusy(false);
      }
    })();
  };

  const { errors } = form.formState;
  const problems: FormProblem[] = [
    ...items.flatMap((item, i) => {
      const message = errors.checklist?.[i]?.result?.message;
      return message ? [{ field: `checklist.${i}.result`, message: `${item.label}: ${message}` }] : [];
    }),
    ...((errors.remarks ?? []).flatMap?.((remark, i) =>
      remark?.remark?.message ? [{ field: `remarks.${i}.remark`, message: remark.remark.message }] : [],
    ) ?? []),
    ...(errors.reason?.message ? [{ field: 'reason', message: errors.reason.message }] : []),
    ...refused,
  ];
  return (
    <form noValidate onSubmit={(event) => event.preventDefault()}>
      <ErrorSummary errors={problems} attempt={attempt} />
      {items.map((item, i) => {
        const doubts = warnings.filter((warning) => warning.check === item.key);
        const result = checklist[i]?.result;
        return (
          <div key={item.key} className="border-b border-rule">
            <RadioGroup
              label={item.label}
              hint={[item.hint, ...doubts.map((doubt) => doubt.message)].join(' ')}
              name={`checklist.${i}.result`}
              value={result ?? ''}
              onChange={(event) =>
                form.setValue(`checklist.${i}.result`, event.target.value as keyof typeof CHECK_RESULTS, {
                  shouldValidate: form.formState.isSubmitted,
                })
              }
              error={errors.checklist?.[i]?.result?.message}
              options={Object.entries(CHECK_RESULTS).map(([value, label]) => ({ value, label }))}
            />
            {result === 'failed' && (
              <Textarea
                label={`What is wrong: ${item.label.toLowerCase()}`}
                optional
                rows={2}
                {...form.register(`checklist.${i}.remark`)}
              />
            )}
          </div>
        );
      })}
      {remarks.fields.map((remark, i) => (
        <div key={remark.id} className="my-5 border-l-3 border-rule pl-5">
          <Select
            label={`Field of remark ${i + 1}`}
            options={FIELDS.map(([value, label]) => ({ value, label }))}
            {...form.register(`remarks.${i}.pointer`)}
          />
          <Textarea
            label={`Remark ${i + 1}`}
            rows={2}
            error={errors.remarks?.[i]?.remark?.message}
            {...form.register(`remarks.${i}.remark`)}
          />
          <Button look="quiet" onClick={() => remarks.remove(i)}>
            Remove remark {i + 1}
          </Button>
        </div>
      ))}
      <Button look="quiet" onClick={() => remarks.append({ pointer: '/phases', remark: '' })}>
        Pin a remark to a field
      </Button>
      <Textarea
        label="Reason"
        hint="The member reads it, and so does everybody who opens the report. Needed unless you verify."
        rows={3}
        error={errors.reason?.message}
        {...form.register('reason')}
      />
      {outcome === 'incomplete' && <Notice>The checklist decides: give each item its result.</Notice>}
      <div className="mt-5 flex flex-wrap gap-4">
        <Button look="main" busy={busy} unavailable={outcome !== 'verified'} onClick={() => decide('verified')}>
          Verify
        </Button>
        <Button busy={busy} unavailable={outcome !== 'not-verified'} onClick={() => decide('changes-requested')}>
          Request changes
        </Button>
        <Button look="warning" busy={busy} unavailable={outcome !== 'not-verified'} onClick={() => decide('declined')}>
          Decline
        </Button>
      </div>
    </form>
  );
}
