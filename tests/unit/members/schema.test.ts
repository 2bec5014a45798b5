import { describe, expect, it } from 'vitest';
import { emailAddress, memberName } from '@/lib/members/schema';

describe('an e-mail address', () => {
  it.each([
    ['  Ina@Orrin-Skerry.EXAMPLE ', 'ina@orrin-skerry.example'],
    ['o’fenn@example.org'.replace('’', "'"), "o'fenn@example.org"],
    // A full-width @ is one mailbox like any other once it is normalised.
    ['orla＠example.org', 'orla@example.org'],
    ['a+b.c_d@sub.example.org', 'a+b.c_d@sub.example.org'],
  ])('%s is kept as %s', (typed, kept) => {
    expect(emailAddress.parse(typed)).toBe(kept);
  });

  it.each([
    'a@x@y.org',
    '"a@evil.org"@example.org',
    'a@example.org, b@example.org',
    'a@example.org\r\nBcc: b@example.org',
    'a b@example.org',
    'a@example',
    '@example.org',
    'a@-example.org',
    'a@example..org',
    '<a@example.org>',
    'a@127.0.0.1',
    `${'a'.repeat(65)}@example.org`,
  ])('%j is no single mailbox', (typed) => {
    expect(emailAddress.safeParse(typed).success).toBe(false);
  });
});

describe('a member’s name', () => {
  it('loses control characters and doubled spaces, and keeps every script', () => {
    expect(memberName.parse('  Ina\r\n\u202eTolvers\u0007 ')).toBe('InaTolvers');
    expect(memberName.parse('Ína  Þórsdóttir 井上')).toBe('Ína Þórsdóttir 井上');
  });

  it('is not empty and not endless', () => {
    expect(memberName.safeParse(' \u200b ').success).toBe(false);
    expect(memberName.safeParse('x'.repeat(81)).success).toBe(false);
  });
});
