/** How long a session lives: so long without a request, and so long at all. */
export const SESSION_IDLE_SECONDS = 14 * 24 * 3600;
export const SESSION_ABSOLUTE_SECONDS = 60 * 24 * 3600;

/** How often a request moves the idle end: a write an hour a session, not a write a request. */
export const SESSION_SEEN_EVERY_SECONDS = 3600;

/** The session cookie's name; browsers bind a __Host- cookie to this host and to https. */
export function sessionCookieName(secure: boolean): string {
  return secure ? '__Host-wattcairn.session' : 'wattcairn.session';
}

export const PASSWORD_LEAST = 15;
export const PASSWORD_MOST = 256;

/** Words that a guesser tries first here; a password that is little else is refused. */
const EXPECTED_WORDS = ['wattcairn', 'password', 'passphrase', 'qwertyuiop', 'letmein', 'electricity', 'iloveyou'];

/**
 * What stands against a password, as a sentence, or null. NIST SP 800-63B-4: fifteen characters where it is the only
 * factor, any characters, no rules of composition, a block list with reasons. Characters are code points after NFC.
 */
export function passwordProblem(password: string, own: { name: string; email: string }): string | null {
  const text = password.normalize('NFC');
  const length = [...text].length;
  if (length < PASSWORD_LEAST) {
    return `Use ${PASSWORD_LEAST} characters or more; this has ${length}. Four unrelated words make a good one.`;
  }
  if (length > PASSWORD_MOST) return `Use ${PASSWORD_MOST} characters or fewer.`;
  const folded = text.toLowerCase();
  if (new Set(folded).size < 5) return 'This repeats a few characters. Choose one with more different ones.';
  if (isRun(folded)) return 'This follows the alphabet, the digits or the keyboard. Choose one that doesn’t.';
  const ownWords = [...own.name.toLowerCase().split(/\s+/), own.email.toLowerCase().split('@')[0] ?? ''];
  for (const word of [...EXPECTED_WORDS, ...ownWords.filter((part) => part.length >= 4)]) {
    const rest = folded.split(word).join('');
    if (rest.length < folded.length && rest.length < 8) {
      return `Without “${word}” little is left of this, and that word is guessed first. Choose another.`;
    }
  }
  return null;
}

const ROWS = ['abcdefghijklmnopqrstuvwxyz', '01234567890123456789', 'qwertyuiopasdfghjklzxcvbnm'];

/** Whether a text is made of runs along the alphabet, the digits or a keyboard's rows. */
function isRun(text: string): boolean {
  let followed = 0;
  for (let i = 1; i < text.length; i += 1) {
    const pair = text.slice(i - 1, i + 1);
    const back = `${pair[1]}${pair[0]}`;
    if (ROWS.some((row) => row.includes(pair) || row.includes(back))) followed += 1;
  }
  return followed >= 0.8 * (text.length - 1);
}
