import 'server-only';
import { now } from '@/lib/platform/clock';
import { recordEvent } from '@/lib/platform/database/record-event';
import type { Work } from '@/lib/platform/database/transaction';
import { notFound } from '@/lib/platform/errors';
import { publicId } from '@/lib/platform/ids';
import type { InstrumentInput } from '../schema';

/** Adds an instrument with its first revision and returns its public id. */
export async function addInstrument(work: Work, memberId: number, input: InstrumentInput): Promise<string> {
  const { transaction } = work;
  const row = await work.models.Instrument.create(
    { publicId: publicId(), memberId, name: input.name, createdAt: now() },
    { transaction },
  );
  await addRevision(work, row.id, 1, input);
  await recordEvent(work, {
    actorId: memberId,
    action: 'instrument.added',
    subject: { kind: 'instrument', id: row.id },
  });
  return row.publicId;
}

/** A changed instrument is a new revision: reports keep the one that they were measured with. */
export async function reviseInstrument(
  work: Work,
  memberId: number,
  instrumentPublicId: string,
  input: InstrumentInput,
): Promise<void> {
  const { transaction } = work;
  const row = await work.models.Instrument.findOne({
    where: { publicId: instrumentPublicId, memberId },
    transaction,
    lock: transaction.LOCK.UPDATE,
  });
  if (!row) throw notFound('instrument');
  const last = await work.models.InstrumentRevision.count({ where: { instrumentId: row.id }, transaction });
  await row.update({ name: input.name }, { transaction });
  await addRevision(work, row.id, last + 1, input);
  await recordEvent(work, {
    actorId: memberId,
    action: 'instrument.revised',
    subject: { kind: 'instrument', id: row.id },
  });
}

async function addRevision(work: Work, instrumentId: number, n: number, input: InstrumentInput): Promise<void> {
  const { transaction } = work;
  const { name: _name, ...stated } = input;
  const revision = await work.models.InstrumentRevision.create(
    { ...stated, instrumentId, n, createdAt: now() },
    { transaction },
  );
  await work.models.Instrument.update({ currentRevisionId: revision.id }, { where: { id: instrumentId }, transaction });
}
