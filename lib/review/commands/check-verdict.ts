import 'server-only';
import type { Work } from '@/lib/platform/database/transaction';
import { AppError, type FieldProblem } from '@/lib/platform/errors';
import { checklistItem } from '@/lib/reports/schema';
import type { ReportRevision } from '@/models/report-revision';
import { pointsInto } from '../rules/json-pointer';
import { followsFrom, outcomeOf } from '../rules/outcome';
import type { VerdictInput } from '../schema';

const CONTRADICTIONS = {
  verified: 'No item failed, so the report is verified. Mark what is wrong as failed first.',
  'not-verified': 'An item failed, so the report can’t be verified. Request changes, or decline it.',
};

/**
 * Sees that the checklist is the method's, that the verdict follows from it by the published rule, and
 * that each remark is pinned to a field that the revision has.
 * @throws {AppError} bad-input with the fields concerned.
 */
export async function checkVerdict(work: Work, revision: ReportRevision, input: VerdictInput): Promise<void> {
  const method = await work.models.MethodRevision.findByPk(revision.methodRevisionId, {
    transaction: work.transaction,
    rejectOnEmpty: true,
  });
  const items = checklistItem.array().parse(method.checklist);
  const fields: FieldProblem[] = [];
  const keys = new Set(items.map((item) => item.key));
  const given = new Set(input.checklist.map(({ key }) => key));
  const outcome = outcomeOf(items, input.checklist);
  if (given.size < input.checklist.length || [...given].some((key) => !keys.has(key))) {
    fields.push({ pointer: '/checklist', message: 'Give each item of this method’s checklist one result.' });
  } else if (!followsFrom(outcome, input.verdict)) {
    fields.push(
      outcome === 'incomplete'
        ? { pointer: '/checklist', message: 'Some items have no result yet. Look at each of them.' }
        : { pointer: '/verdict', message: CONTRADICTIONS[outcome] },
    );
  }
  input.remarks.forEach(({ pointer }, i) => {
    if (pointsInto(revision.content, pointer)) return;
    fields.push({ pointer: `/remarks/${i}/pointer`, message: 'This field is not in the report. Choose another one.' });
  });
  if (fields.length > 0)
    throw new AppError('bad-input', 'The verdict can’t be saved as it is; each field says why.', { fields });
}
