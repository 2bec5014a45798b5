import 'server-only';
import { unstable_cache } from 'next/cache';
import { cache } from 'react';
import { AppError } from '@/lib/platform/errors';
import { ambientOfDevice, reportsOfDevice } from './queries/report-lists';
import { reportByPublicId } from './queries/reports';
import type { ReportListItem, ReportView } from './schema';

/** A published report, or why there is none to read. */
export type LoadedReport = { kind: 'found'; report: ReportView } | { kind: 'withdrawn' } | { kind: 'missing' };

export const loadPublishedReport = cache((publicId: string): Promise<LoadedReport> => {
  const load = unstable_cache(
    async (id: string): Promise<LoadedReport> => {
      try {
        return { kind: 'found', report: await reportByPublicId(null, id, 'published') };
      } catch (error) {
        if (!(error instanceof AppError)) throw error;
        return { kind: error.code === 'gone' ? 'withdrawn' : 'missing' };
      }
    },
    ['published-report', publicId],
    { tags: [`report:${publicId}`], revalidate: false },
  );
  return load(publicId);
});

export const loadReportsOfDevice = cache((deviceId: number): Promise<ReportListItem[]> => {
  const load = unstable_cache(reportsOfDevice, ['reports-of-device', String(deviceId)], {
    tags: [`device:${deviceId}`],
    revalidate: false,
  });
  return load(deviceId);
});

export const loadAmbientOfDevice = cache((deviceId: number): Promise<number | null> => {
  const load = unstable_cache(ambientOfDevice, ['ambient-of-device', String(deviceId)], {
    tags: [`device:${deviceId}`],
    revalidate: false,
  });
  return load(deviceId);
});
