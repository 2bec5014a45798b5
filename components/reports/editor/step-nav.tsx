import clsx from 'clsx';
import { STEPS, type StepKey } from './editor-values';
import type { EditorProblem } from './to-submission';

interface StepNavProps {
  current: StepKey;
  onStep: (step: StepKey) => void;
  problems: readonly EditorProblem[];
}

/** The steps, in any order; where something is to put right is said in words. */
export function StepNav({ current, onStep, problems }: StepNavProps) {
  const at = STEPS.findIndex((step) => step.key === current);
  return (
    <nav aria-label="Steps of the report" className="mb-6">
      <p className="text-caption text-muted lg:hidden">
        Step {at + 1} of {STEPS.length}
      </p>
      <ol className="flex gap-x-5 overflow-x-auto lg:block">
        {STEPS.map((step, index) => {
          const wrong = problems.filter((problem) => problem.step === step.key).length;
          return (
            <li key={step.key} className="shrink-0">
              <button
                type="button"
                aria-current={step.key === current ? 'step' : undefined}
                onClick={() => onStep(step.key)}
                className={clsx(
                  'target text-left text-note whitespace-nowrap underline-offset-4 hover:underline',
                  step.key === current ? 'font-semibold text-ink underline decoration-2' : 'text-muted',
                )}
              >
                {index + 1}. {step.title}
                {wrong > 0 && <span className="text-rust"> ({wrong} to put right)</span>}
              </button>
            </li>
          );
        })}
      </ol>
    </nav>
  );
}
