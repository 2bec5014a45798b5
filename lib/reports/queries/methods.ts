import 'server-only';
import { database } from '@/lib/platform/database/connection';

export interface MethodInUse {
  code: string;
  name: string;
  summary: string;
  minimumSeconds: number;
  minimumCycles: number;
  caution: string;
  needsConfirmation: boolean;
}

/** The methods whose current revision counts, in the order they were made. */
export async function methodsInUse(): Promise<MethodInUse[]> {
  const { Method, MethodRevision } = database().models;
  const methods = await Method.findAll({ order: [['id', 'ASC']] });
  const revisions = await MethodRevision.findAll({
    where: { id: methods.flatMap((row) => row.currentRevisionId ?? []), counts: true },
  });
  return methods.flatMap((method) => {
    const revision = revisions.find((row) => row.id === method.currentRevisionId);
    if (!revision) return [];
    const { name, summary, minimumSeconds, minimumCycles, caution, needsConfirmation } = revision;
    return [{ code: method.code, name, summary, minimumSeconds, minimumCycles, caution, needsConfirmation }];
  });
}
