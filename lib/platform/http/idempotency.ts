import 'server-only';
import { Op } from 'sequelize';
import { now, secondsFromNow } from '../clock';
import { database } from '../database/connection';
import { AppError } from '../errors';
import { sha256 } from '../ids';

const UNDER_WAY = 0;
/** An answer that never came (a killed process) frees its key after this. */
const GIVEN_UP_SECONDS = 60;

export interface StoredAnswer {
  status: number;
  body: unknown;
}

/**
 * Runs a creation once for a member's key: a repeat gets the first answer. The rows that a command makes carry unique
 * keys of their own besides, so that a process killed between commit and answer can't create a second one.
 * @throws {AppError} conflict while the first is under way; bad-input where the key came with another request.
 */
export async function onceForKey(
  memberId: number,
  key: string,
  request: string,
  run: () => Promise<StoredAnswer>,
): Promise<StoredAnswer> {
  const { IdempotencyKey } = database().models;
  if (key.length < 8 || key.length > 128) {
    throw new AppError('bad-request', 'An Idempotency-Key has 8 to 128 characters.');
  }
  const requestHash = sha256(request);
  const where = { memberId, key };
  await IdempotencyKey.destroy({
    where: { ...where, status: UNDER_WAY, createdAt: { [Op.lt]: secondsFromNow(-GIVEN_UP_SECONDS) } },
  });
  const [, made] = await IdempotencyKey.findOrCreate({
    where,
    defaults: { ...where, requestHash, status: UNDER_WAY, response: {}, createdAt: now() },
  });
  if (!made) {
    const known = await IdempotencyKey.findOne({ where });
    if (known && known.requestHash !== requestHash) {
      throw new AppError('bad-input', 'This Idempotency-Key was used for another request. Make a new one.');
    }
    if (known && known.status !== UNDER_WAY) return { status: known.status, body: known.response };
    throw new AppError('conflict', 'The same request is under way. Wait a moment and look again.');
  }
  try {
    const answer = await run();
    await IdempotencyKey.update({ status: answer.status, response: (answer.body ?? {}) as object }, { where });
    return answer;
  } catch (error) {
    await IdempotencyKey.destroy({ where });
    throw error;
  }
}
