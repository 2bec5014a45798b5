import 'server-only';
import { hash, verify } from '@node-rs/argon2';

/** The package's number for Argon2id; its own enumeration vanishes when files are compiled one by one. */
const ARGON2ID = 2;

/** 19 MiB, two passes, one lane: the least of OWASP's password storage sheet. */
const SETTINGS = { algorithm: ARGON2ID, memoryCost: 19_456, timeCost: 2, parallelism: 1 };

/** More at once would let a crowd of sign-ins take the machine's memory and cores. */
const MOST_AT_ONCE = 2;
const waiting: (() => void)[] = [];
let running = 0;

async function oneOfFew<T>(work: () => Promise<T>): Promise<T> {
  if (running >= MOST_AT_ONCE) await new Promise<void>((resolve) => waiting.push(resolve));
  running += 1;
  try {
    return await work();
  } finally {
    running -= 1;
    waiting.shift()?.();
  }
}

/** A password's hash. Composed and decomposed forms of one text are one password (NFC); nothing else is changed. */
export function hashPassword(password: string): Promise<string> {
  return oneOfFew(() => hash(password.normalize('NFC'), SETTINGS));
}

/** A hash that no password has, so that a sign-in with an unknown address takes as long as any other. */
let nobody: Promise<string> | undefined;

/** Whether the password is the one; where there is no hash the time is spent all the same and the answer is no. */
export async function passwordMatches(stored: string | null, password: string): Promise<boolean> {
  nobody ??= hashPassword('a password that nobody has, ever');
  const against = stored ?? (await nobody);
  const matches = await oneOfFew(() => verify(against, password.normalize('NFC')));
  return matches && stored !== null;
}
