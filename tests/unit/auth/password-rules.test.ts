import { describe, expect, it } from 'vitest';
import { passwordProblem } from '@/lib/auth/rules';

const own = { name: 'Ina Tolvers', email: 'ina.tolvers@orrin-skerry.example' };

describe('a password (NIST SP 800-63B-4: fifteen characters where it is the only factor)', () => {
  it('is refused below fifteen characters and taken from there on (ASVS 6.2.1)', () => {
    expect(passwordProblem('sevenlt', own)).toMatch(/15 characters or more; this has 7/);
    expect(passwordProblem('kelp rope lamp', own)).toMatch(/this has 14/);
    expect(passwordProblem('kelp rope lamps', own)).toBeNull();
    expect(passwordProblem('kelp rope lamp '.repeat(4), own)).toBeNull();
  });

  it('counts characters, not bytes, after composing them', () => {
    expect(passwordProblem('ü'.normalize('NFD').repeat(14), own)).toMatch(/this has 14/);
    expect(passwordProblem('🦀🪢🔦🧊⚓🐚🌊🪵🧭🛶🪨🐟🦑🌫🌧', own)).toBeNull();
  });

  it.each([
    ['aaaaaaaaaaaaaaaa', /repeats a few characters/],
    ['abababababababab', /repeats a few characters/],
    ['abcdefghijklmnopq', /follows the alphabet/],
    ['qwertyuiopasdfghj', /follows the alphabet/],
    ['01234567890123456', /follows the alphabet/],
    ['passwordpassword1', /password/],
    ['Wattcairn-2026!!', /wattcairn/],
    ['tolvers.tolvers1', /tolvers/],
    ['iloveyouiloveyou', /iloveyou/],
  ])('says why %s is guessed early (ASVS 6.2.4, 6.2.11)', (password, reason) => {
    expect(passwordProblem(password, own)).toMatch(reason);
  });

  it('may hold any characters (ASVS 6.2.5)', () => {
    expect(passwordProblem('"; drop table -- <b>', own)).toBeNull();
  });
});
