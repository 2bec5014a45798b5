import { now } from '@/lib/platform/clock';
import { closeDatabase } from '@/lib/platform/database/connection';
import { recordEvent } from '@/lib/platform/database/record-event';
import { inTransaction } from '@/lib/platform/database/transaction';

/** `npm run make-admin -- EMAIL`: the first admin, for whom nobody could press a button yet. */
const email = process.argv[2]?.trim().toLowerCase();
if (!email) {
  process.stderr.write('Say whose account it is: npm run make-admin -- name@example.org\n');
  process.exit(1);
}
const made = await inTransaction(async (work) => {
  const member = await work.models.Member.findOne({
    where: { email },
    transaction: work.transaction,
    lock: work.transaction.LOCK.UPDATE,
  });
  if (!member) return false;
  const before = { role: member.role, state: member.state };
  // Whoever runs this holds the database: the address needs no letter to be believed.
  await member.update(
    { role: 'admin', state: 'active', confirmedAt: member.confirmedAt ?? now() },
    { transaction: work.transaction },
  );
  await recordEvent(work, {
    actorId: null,
    action: 'member.role-changed',
    subject: { kind: 'member', id: member.id },
    before,
    after: { role: 'admin', state: 'active' },
  });
  return true;
});
await closeDatabase();
process.stdout.write(
  made ? `${email} is an admin now.\n` : `There is no account of ${email}. Sign up first, then run this again.\n`,
);
if (!made) process.exitCode = 1;
