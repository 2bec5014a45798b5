import 'server-only';
import { now } from '@/lib/platform/clock';
import { recordEvent } from '@/lib/platform/database/record-event';
import type { Work } from '@/lib/platform/database/transaction';
import { publicId } from '@/lib/platform/ids';
import type { Claim } from './schema';

/** What a claim says, as it is recorded: a claim without what the database adds. */
export interface ClaimContent extends Omit<
  Claim,
  'publicId' | 'revision' | 'variant' | 'state' | 'mode' | 'contradictsMode'
> {
  deviceId: number;
  variantId: number | null;
  modeId: number | null;
  contradictsMode: string | null;
  authorId: number | null;
}

/** Records a claim with its first revision; readers see it at once, since the device's pages are dropped. */
export async function recordClaim(work: Work, content: ClaimContent): Promise<string> {
  const { Claim: ClaimModel, ClaimRevision } = work.models;
  const { transaction } = work;
  const { deviceId, variantId, authorId, source, ...said } = content;
  const row = await ClaimModel.create(
    { publicId: publicId(), deviceId, variantId, state: 'in-force', createdAt: now() },
    { transaction },
  );
  const revision = await ClaimRevision.create(
    {
      ...said,
      claimId: row.id,
      n: 1,
      authorId,
      sourceTitle: source.title,
      sourceAddress: source.address,
      sourcePage: source.page,
      readOn: source.readOn,
      createdAt: now(),
    },
    { transaction },
  );
  await row.update({ currentRevisionId: revision.id }, { transaction });
  await recordEvent(work, {
    actorId: authorId,
    action: 'claim.recorded',
    subject: { kind: 'claim', id: row.id },
    after: { deviceId, kind: said.kind },
  });
  work.dropTag(`device:${deviceId}`);
  return row.publicId;
}
