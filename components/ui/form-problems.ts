import type { FieldErrors, FieldValues } from 'react-hook-form';
import { ApiProblem } from '@/lib/platform/http/call-api';

/** One line of an error summary. */
export interface FormProblem {
  field?: string;
  message: string;
}

/** What a form's own check found, in the order of its fields. */
export function problemsOf<T extends FieldValues>(errors: FieldErrors<T>): FormProblem[] {
  return Object.entries(errors).flatMap(([field, error]) => {
    const message = error?.message;
    return typeof message === 'string' && message !== '' ? [{ field, message }] : [];
  });
}

/** What the API answered, each field's pointer turned into the name of its control. */
export function problemsOfAnswer(error: unknown, nameOf: (pointer: string) => string = lastPart): FormProblem[] {
  if (!(error instanceof ApiProblem)) {
    return [{ message: 'Something went wrong in this page. What you typed is still here; try again.' }];
  }
  if (error.fields.length === 0) return [{ message: error.message }];
  return error.fields.map(({ pointer, message }) => ({ field: nameOf(pointer), message }));
}

const lastPart = (pointer: string) => pointer.split('/').pop() ?? '';
