/**
 * Whether a JSON pointer leads to something in a value.
 *
 * Source: RFC 6901.
 * @example pointsInto({ phases: [{ note: '' }] }, '/phases/0/note') // true
 */
export function pointsInto(value: unknown, pointer: string): boolean {
  const parts = pointer
    .split('/')
    .slice(1)
    .map((part) => part.replaceAll('~1', '/').replaceAll('~0', '~'));
  let at: unknown = value;
  for (const part of parts) {
    if (typeof at !== 'object' || at === null || !Object.hasOwn(at, part)) return false;
    at = (at as Record<string, unknown>)[part];
  }
  return true;
}
