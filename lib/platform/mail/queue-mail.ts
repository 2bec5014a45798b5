import 'server-only';
import { randomUUID } from 'node:crypto';
import { now } from '../clock';
import type { Work } from '../database/transaction';
import { env } from '../env';
import { renderHtml } from './render-html';

/** A letter in plain words; the HTML form is made from the same paragraphs. */
export interface Letter {
  to: string;
  subject: string;
  /** Paragraphs. One that is a link alone becomes a button. */
  paragraphs: (string | { label: string; href: string })[];
}

/**
 * Puts a letter into the outbox, in the transaction of what it tells of: it is owed exactly when that is committed.
 * @throws {Error} where the address or the subject could break out of its header.
 */
export async function queueMail(work: Work, letter: Letter): Promise<void> {
  if (!/^[^\s<>(),;:"\\@]+@[^\s<>(),;:"\\@]+$/.test(letter.to)) throw new Error('The address is no single mailbox.');
  if (/[\r\n]/.test(letter.subject)) throw new Error('A subject is one line.');
  const text = letter.paragraphs
    .map((part) => (typeof part === 'string' ? part : `${part.label}:\n${part.href}`))
    .join('\n\n');
  await work.models.Outbox.create(
    {
      messageId: `<${randomUUID()}@${new URL(env().publicOrigin).hostname}>`,
      toAddress: letter.to,
      subject: letter.subject,
      bodyText: `${text}\n\n—\nWattcairn, ${env().publicOrigin}\n`,
      bodyHtml: renderHtml(letter, env().publicOrigin),
      notBefore: now(),
      createdAt: now(),
    },
    { transaction: work.transaction },
  );
}
