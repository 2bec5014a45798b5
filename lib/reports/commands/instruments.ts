import 'server-only';
import { now } from '@/lib/platform/clock';
import { recordEvent } from '@/lib/platform/database/record-event';
import type { Work } from '@/lib/platform/database/transaction';
import { AppError, notFound } from '@/lib/platform/errors';
import { publicId } from '@/lib/platform/ids';
import type { Instrument } from '@/models/instrument';
import { toInstrument } from '../queries/instruments';
import { canonicalJson } from '../rules/canonical-json';
import { instrumentInput, type InstrumentInput } from '../schema';

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

/**
 * A changed instrument is a new revision: reports keep the one that they were measured with. Saving it unchanged makes
 * none.
 *
 * @param revision the one that was read.
 * @throws {AppError} not-found; version-missing; version-changed with the revision in force.
 */
export async function reviseInstrument(
  work: Work,
  memberId: number,
  instrumentPublicId: string,
  revision: number | null,
  input: InstrumentInput,
): Promise<void> {
  if (revision === null) {
    const message = 'Say which revision you read, in If-Match, so that nothing is overwritten unseen.';
    throw new AppError('version-missing', message);
  }
  const { transaction } = work;
  const row = await lockInstrument(work, memberId, instrumentPublicId);
  const current = await work.models.InstrumentRevision.findOne({
    where: { instrumentId: row.id },
    order: [['n', 'DESC']],
    rejectOnEmpty: true,
    transaction,
  });
  if (current.n !== revision) {
    const message = 'This instrument was changed elsewhere. Look at it as it is now, and change that.';
    throw new AppError('version-changed', message, { facts: { version: current.n } });
  }
  if (canonicalJson(instrumentInput.parse(toInstrument(row, current))) === canonicalJson(input)) return;
  await row.update({ name: input.name }, { transaction });
  await addRevision(work, row.id, current.n + 1, input);
  await recordEvent(work, {
    actorId: memberId,
    action: 'instrument.revised',
    subject: { kind: 'instrument', id: row.id },
  });
}

/** Takes an instrument out of use: it is offered no more, and reports keep it. */
export async function retireInstrument(work: Work, memberId: number, instrumentPublicId: string): Promise<void> {
  const row = await lockInstrument(work, memberId, instrumentPublicId);
  if (row.retiredAt !== null) return;
  await row.update({ retiredAt: now() }, { transaction: work.transaction });
  await recordEvent(work, {
    actorId: memberId,
    action: 'instrument.retired',
    subject: { kind: 'instrument', id: row.id },
  });
}

async function lockInstrument({ models, transaction }: Work, memberId: number, publicId: string): Promise<Instrument> {
  const row = await models.Instrument.findOne({
    where: { publicId, memberId },
    transaction,
    lock: transaction.LOCK.UPDATE,
  });
  if (!row) throw notFound('instrument');
  return row;
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
