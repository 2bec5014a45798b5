'use client';

import { useQuery } from '@tanstack/react-query';
import Link from 'next/link';
import { z } from 'zod';
import { Notice } from '@/components/layout/notices';
import { countWords, figureName, medianOf } from '@/components/figures/figure-words';
import { figure } from '@/lib/figures/schema';
import { callApi } from '@/lib/platform/http/call-api';
import { VERDICTS, type VerdictResult } from '@/lib/review/schema';

interface FigureEffectProps {
  result: VerdictResult;
  deviceName: string;
  deviceSlug: string;
}

const answer = z.object({ figures: z.array(figure) });

/** What a verdict did: told after it, never before. */
export function FigureEffect({ result, deviceName, deviceSlug }: FigureEffectProps) {
  const { data } = useQuery({
    enabled: result.verdict === 'verified',
    queryKey: ['figures-of', result.devicePublicId, result.decidedAt],
    queryFn: () => callApi(`/api/v1/figures/devices/${result.devicePublicId}`, { answer }),
  });
  const headline = data?.figures.find((known) => known.isHeadline);
  return (
    <Notice role="status" title={`The report is ${VERDICTS[result.verdict]}`}>
      {result.verdict !== 'verified' && <p>The member hears it by mail, with your reason.</p>}
      {headline && (
        <p>
          {deviceName} now: {figureName(headline).toLowerCase()} {medianOf(headline).text}, median of{' '}
          {countWords(headline.n, 'contributor')}.
        </p>
      )}
      <p className="mt-1 flex flex-wrap gap-x-5">
        <Link href={`/devices/${deviceSlug}`} className="text-lichen underline underline-offset-4">
          See the device
        </Link>
        <Link href="/review" className="text-lichen underline underline-offset-4">
          Back to the queue
        </Link>
      </p>
    </Notice>
  );
}
