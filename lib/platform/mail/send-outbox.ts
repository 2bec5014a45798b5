import 'server-only';
import nodemailer from 'nodemailer';
import { QueryTypes } from 'sequelize';
import { now, secondsFromNow } from '../clock';
import { database } from '../database/connection';
import { env } from '../env';
import { log } from '../log';

const EVERY_MS = 1000;
const AT_ONCE = 20;
/** A minute after the first failure, twice as long after each further one, at most a day. */
const pauseSeconds = (attempts: number) => Math.min(86_400, 60 * 2 ** Math.max(0, attempts - 1));

interface Owed {
  id: number;
  messageId: string;
  toAddress: string;
  subject: string;
  bodyText: string;
  bodyHtml: string;
  attempts: number;
}

/**
 * Sends what the outbox owes, once. A row is locked while it is sent and skipped by others, so that several processes
 * never send it together; one that is killed between sending and noting it sends again under the same message id.
 *
 * @returns how many were sent.
 */
export async function sendOutbox(): Promise<number> {
  const { smtpUrl, mailFrom } = env();
  if (!smtpUrl) return 0;
  const { sequelize } = database();
  const transport = nodemailer.createTransport(smtpUrl);
  return sequelize.transaction(async (transaction) => {
    const rows = await sequelize.query<Owed>(
      `select id, message_id as "messageId", to_address as "toAddress", subject, body_text as "bodyText",
              body_html as "bodyHtml", attempts
       from outbox where sent_at is null and not_before <= $1 order by id limit $2 for update skip locked`,
      { bind: [now(), AT_ONCE], type: QueryTypes.SELECT, transaction },
    );
    let sent = 0;
    for (const row of rows) {
      const error = await transport
        .sendMail({
          from: mailFrom,
          to: { name: '', address: row.toAddress },
          subject: row.subject,
          text: row.bodyText,
          html: row.bodyHtml,
          messageId: row.messageId,
        })
        .then(() => null)
        .catch((reason: unknown) => (reason instanceof Error ? reason.message : String(reason)));
      if (error === null) sent += 1;
      else log().warn({ outboxId: row.id, reason: error }, 'mail could not be sent; it is tried again');
      await sequelize.query(
        `update outbox set attempts = attempts + 1, sent_at = $2, last_error = $3, not_before = $4 where id = $1`,
        {
          bind: [row.id, error === null ? now() : null, error, secondsFromNow(pauseSeconds(row.attempts + 1))],
          transaction,
        },
      );
    }
    return sent;
  });
}

const key = Symbol.for('wattcairn.outbox');
const holder = globalThis as unknown as Record<symbol, NodeJS.Timeout | undefined>;

/** Looks into the outbox every second, in this process, until it ends. Starting it twice starts it once. */
export function startOutbox(): void {
  if (holder[key]) return;
  let busy = false;
  holder[key] = setInterval(() => {
    if (busy) return;
    busy = true;
    sendOutbox()
      .catch((error: unknown) => log().error({ err: error }, 'the outbox could not be read'))
      .finally(() => {
        busy = false;
      });
  }, EVERY_MS);
  holder[key].unref();
}
