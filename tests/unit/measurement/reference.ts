import rules from '@/tests/reference/rules.json';

type Check = (typeof rules.checks)[number];

/** A published value with its source; the project did not write it. */
export function check(id: string): Check {
  const found = rules.checks.find((entry) => entry.id === id);
  if (!found) throw new Error(`There is no reference value ${id}.`);
  return found;
}

export const fridge: readonly number[] = rules.fridge;
