import 'server-only';
import { now } from '../clock';
import { currentContext } from '../context';
import type { Work } from './transaction';

/** What is kept of a change; before and after hold ids and states, never a person's details. */
export interface EventDraft {
  actorId: number | null;
  action: string;
  subject: { kind: string; id: number };
  before?: object;
  after?: object;
}

/** Records an event in the unit of work; figures that move in the same transaction name it as their cause. */
export async function recordEvent(work: Work, draft: EventDraft): Promise<void> {
  const row = await work.models.Event.create(
    {
      at: now(),
      actorId: draft.actorId,
      action: draft.action,
      subjectKind: draft.subject.kind,
      subjectId: draft.subject.id,
      before: draft.before ?? null,
      after: draft.after ?? null,
      requestId: currentContext()?.requestId ?? null,
    },
    { transaction: work.transaction },
  );
  work.eventId = String(row.id);
}
