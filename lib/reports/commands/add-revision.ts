import 'server-only';
import type { Category } from '@/lib/catalogue/schema';
import { RULE_VERSION } from '@/lib/measurement/rule-version';
import { now } from '@/lib/platform/clock';
import type { Work } from '@/lib/platform/database/transaction';
import { sha256 } from '@/lib/platform/ids';
import type { Report } from '@/models/report';
import type { ReportFigureDraft } from '../rules/compute-figures';
import { canonicalJson } from '../rules/canonical-json';
import { SCHEMA_VERSION, type Phase, type Submission } from '../schema';
import type { Evidence } from './gather-evidence';

/**
 * Adds a revision to a report: its content, chained by hash to the one before, its phases, evidence and figures.
 * @param clientKey of an amendment; a report's first revision goes by the report's own.
 */
export async function addRevision(
  work: Work,
  report: Report,
  category: Category,
  { content }: Submission,
  evidence: Evidence,
  clientKey: string | null,
): Promise<number> {
  const { models, transaction } = work;
  const before = await models.ReportRevision.findOne({
    where: { reportId: report.id },
    order: [['n', 'DESC']],
    transaction,
  });
  const n = (before?.n ?? 0) + 1;
  const previousHash = before?.hash ?? null;
  const sealed = {
    report: report.publicId,
    n,
    content,
    previousHash,
    instrument: evidence.instrument.id,
    method: evidence.method.id,
  };
  const revision = await models.ReportRevision.create(
    {
      reportId: report.id,
      n,
      schemaVersion: SCHEMA_VERSION,
      content,
      categoryRevisionId: category.revisionId,
      methodRevisionId: evidence.method.id,
      instrumentRevisionId: evidence.instrument.id,
      supplyClass: content.supplyClass,
      measuringPoint: content.measuringPoint,
      ambientCelsius: content.ambientCelsius,
      licence: 'CC-BY-4.0',
      previousHash,
      hash: sha256(canonicalJson(sealed)),
      clientKey,
      createdAt: now(),
    },
    { transaction },
  );
  const modeIds = new Map(category.modes.map((mode) => [mode.code, mode.id]));
  await addPhases(work, revision.id, content.phases, modeIds, evidence);
  await addEvidence(work, revision.id, content, evidence);
  await addFigures(work, revision.id, content.supplyClass, evidence.computation.figures, modeIds);
  return revision.id;
}

async function addPhases(
  work: Work,
  reportRevisionId: number,
  phases: Phase[],
  modeIds: ReadonlyMap<string, number>,
  evidence: Evidence,
): Promise<void> {
  const { models, transaction } = work;
  for (const [i, phase] of phases.entries()) {
    const shared = {
      reportRevisionId,
      position: i + 1,
      modeId: modeIds.get(phase.modeCode) as number,
      note: phase.note,
    };
    if (phase.source === 'typed') {
      const { startsAt, durationSeconds, meanWatts, minimumWatts, maximumWatts, energyWattHours, uses } = phase;
      const starts = startsAt === null ? null : new Date(startsAt);
      const ends = starts && new Date(starts.getTime() + durationSeconds * 1000);
      await models.Phase.create(
        {
          ...shared,
          source: 'typed',
          startsAt: starts,
          endsAt: ends,
          durationSeconds,
          meanWatts,
          minimumWatts,
          maximumWatts,
          energyWattHours,
          uses,
        },
        { transaction },
      );
      continue;
    }
    const { fromSeconds, toSeconds, uses } = phase;
    const row = await models.Phase.create(
      {
        ...shared,
        source: 'trace',
        startsAt: new Date(fromSeconds * 1000),
        endsAt: new Date(toSeconds * 1000),
        durationSeconds: toSeconds - fromSeconds,
        uses,
      },
      { transaction },
    );
    const traceId = evidence.traces.get(phase.tracePublicId)?.id as number;
    await models.PhaseTrace.create({ phaseId: row.id, traceId, fromSeconds, toSeconds }, { transaction });
  }
}

async function addEvidence(
  work: Work,
  reportRevisionId: number,
  content: Submission['content'],
  evidence: Evidence,
): Promise<void> {
  const { models, transaction } = work;
  for (const trace of evidence.traces.values()) {
    await models.ReportRevisionTrace.create({ reportRevisionId, traceId: trace.id }, { transaction });
  }
  const photoIds = new Map(evidence.photos.map((photo) => [photo.publicId, photo.id]));
  for (const [i, photo] of content.photos.entries()) {
    await models.ReportRevisionAttachment.create(
      {
        reportRevisionId,
        attachmentId: photoIds.get(photo.publicId) as number,
        position: i + 1,
        kind: photo.kind,
        caption: photo.caption,
      },
      { transaction },
    );
  }
}

async function addFigures(
  work: Work,
  reportRevisionId: number,
  supplyClass: Submission['content']['supplyClass'],
  figures: readonly ReportFigureDraft[],
  modeIds: ReadonlyMap<string, number>,
): Promise<void> {
  // Cycles yield figures of their parts; a category that has no such modes has no place for them.
  const placed = figures.filter(({ modeCode }) => modeCode === null || modeIds.has(modeCode));
  await work.models.ReportFigure.bulkCreate(
    placed.map(({ modeCode, parts, ...figure }) => ({
      ...figure,
      ...parts,
      reportRevisionId,
      modeId: modeCode === null ? null : (modeIds.get(modeCode) ?? null),
      supplyClass,
      computationVersion: RULE_VERSION,
    })),
    { transaction: work.transaction },
  );
}
