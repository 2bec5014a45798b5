import distributions from '@/tests/reference/distributions.json';
import published from '@/tests/reference/statistics.json';

type Check = (typeof published.checks)[number];

/** A published value with its source; the project did not write it. */
export function check(id: string): Check {
  const found = published.checks.find((entry) => entry.id === id);
  if (!found) throw new Error(`There is no reference value ${id}.`);
  return found;
}

/** The expected number of a check. */
export function expected(id: string): number {
  return Number(check(id).expected);
}

/** NIST's univariate data sets; the long ones are stated by their rule. */
export function nistData(name: 'michelso' | 'numacc1' | 'numacc2' | 'numacc3' | 'numacc4'): number[] {
  const data = published.data[name];
  if (Array.isArray(data)) return data;
  return [data.first, ...Array.from({ length: data.times }, () => data.then).flat()];
}

/** R's answers; distributions.R beside them made them. */
export const fromR = distributions;

/** How far apart two numbers are, as a share of the expected one. */
export function relativeError(actual: number, wanted: number): number {
  return wanted === 0 ? Math.abs(actual) : Math.abs(actual - wanted) / Math.abs(wanted);
}

/** Where R's value is a row of numbers, as JSON reads it. */
export function row(values: readonly (number | null)[]): number[] {
  return values.map(Number);
}
