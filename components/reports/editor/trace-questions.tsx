'use client';

import { useState } from 'react';
import { Button } from '@/components/ui/button';
import { RadioGroup } from '@/components/ui/choices';
import { FieldError } from '@/components/ui/field';
import { TextInput } from '@/components/ui/inputs';
import type { TraceCorrections, TraceDescription, TraceQuestion } from '@/lib/measurement/traces/import/types';
import { callApi } from '@/lib/platform/http/call-api';
import { traceReading, type TraceReadingAnswer } from '@/lib/reports/schema/trace';
import { TraceUnderstood } from './trace-understood';

interface TraceQuestionsProps {
  uploadPublicId: string;
  zone: string;
  description: TraceDescription;
  onReading: (reading: TraceReadingAnswer) => void;
}

const NUMBERS = new Set<keyof TraceCorrections>(['volts', 'stepSeconds', 'valueColumn', 'segment']);

/** A typed answer in the shape that the importer takes. */
function toCorrection(question: TraceQuestion, answer: string): unknown {
  if (question.key === 'startsAt') return answer === '' ? undefined : new Date(answer).toISOString();
  return NUMBERS.has(question.key) ? Number(answer.replace(',', '.')) : answer;
}

/** What a file leaves open, asked until nothing is; the file is read again with the answers. */
export function TraceQuestions({ uploadPublicId, zone, description, onReading }: TraceQuestionsProps) {
  const [answers, setAnswers] = useState<Record<string, string>>({});
  const [given, setGiven] = useState<TraceCorrections>({});
  const [busy, setBusy] = useState(false);
  const [problem, setProblem] = useState<string | null>(null);

  const readAgain = async () => {
    const open = description.questions.find((question) => !answers[question.key]);
    if (open) return setProblem(`Answer this first: ${open.message}`);
    const corrections = { ...given };
    for (const question of description.questions) {
      Object.assign(corrections, { [question.key]: toCorrection(question, answers[question.key] ?? '') });
    }
    setBusy(true);
    setProblem(null);
    try {
      const reading = await callApi(`/api/v1/trace-uploads/${uploadPublicId}/readings`, {
        method: 'POST',
        body: { zone, corrections },
        answer: traceReading,
      });
      setGiven(corrections);
      setAnswers({});
      onReading(reading);
    } catch (error) {
      setProblem(error instanceof Error ? error.message : 'Try again.');
    } finally {
      setBusy(false);
    }
  };

  return (
    <section aria-label="Questions about the file" className="my-5 border-l-3 border-rule pl-5">
      <h3 className="text-subheading">Before it counts</h3>
      <TraceUnderstood description={description} />
      {description.questions.map((question) =>
        question.choices.length > 0 ? (
          <RadioGroup
            key={question.key}
            label={question.message}
            name={`question-${question.key}`}
            value={answers[question.key] ?? ''}
            onChange={(event) => setAnswers({ ...answers, [question.key]: event.target.value })}
            options={question.choices.map((choice) => ({ value: String(choice.value), label: choice.label }))}
          />
        ) : (
          <TextInput
            key={question.key}
            label={question.message}
            name={`question-${question.key}`}
            type={question.key === 'startsAt' ? 'datetime-local' : 'text'}
            className="max-w-64"
            value={answers[question.key] ?? ''}
            onChange={(event) => setAnswers({ ...answers, [question.key]: event.target.value })}
          />
        ),
      )}
      {problem && (
        <div role="alert">
          <FieldError id="questions">{problem}</FieldError>
        </div>
      )}
      <Button busy={busy} onClick={() => void readAgain()} className="mt-3">
        Read the file with these answers
      </Button>
    </section>
  );
}
