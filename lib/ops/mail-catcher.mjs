import { randomUUID } from 'node:crypto';
import { readdirSync, renameSync, rmSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { simpleParser } from 'mailparser';
import { SMTPServer } from 'smtp-server';

/**
 * Stands in for a mail service in the demonstration and the tests: takes mail on loopback, sends none of it on, and
 * keeps each as a JSON file that the demonstration's mail page reads.
 */
const MOST_KEPT = 200;
const folder = process.env.CAUGHT_MAIL_DIR ?? '';
const { hostname, port } = new URL(process.env.SMTP_URL ?? '');

const server = new SMTPServer({
  authOptional: true,
  disabledCommands: ['STARTTLS'],
  size: 5_000_000,
  onData(stream, session, done) {
    simpleParser(stream)
      .then((mail) => {
        keep({
          to: session.envelope.rcptTo.map((recipient) => recipient.address).join(', '),
          subject: mail.subject ?? '',
          text: mail.text ?? '',
          html: mail.html || null,
          messageId: mail.messageId ?? '',
          at: new Date().toISOString(),
        });
        done();
      })
      .catch(done);
  },
});
server.listen(Number(port), hostname);
process.on('disconnect', () => process.exit(0));

/** @param {Record<string, unknown>} mail */
function keep(mail) {
  const id = `${Date.now()}-${randomUUID()}`;
  const file = path.join(folder, `${id}.json`);
  writeFileSync(`${file}.new`, JSON.stringify({ id, ...mail }));
  renameSync(`${file}.new`, file);
  const kept = readdirSync(folder)
    .filter((name) => name.endsWith('.json'))
    .sort();
  for (const name of kept.slice(0, Math.max(0, kept.length - MOST_KEPT))) rmSync(path.join(folder, name));
}
