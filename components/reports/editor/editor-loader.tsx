'use client';

import { useQuery } from '@tanstack/react-query';
import { useSearchParams } from 'next/navigation';
import { useState } from 'react';
import { z } from 'zod';
import { Notice } from '@/components/layout/notices';
import { Button } from '@/components/ui/button';
import { Skeleton } from '@/components/ui/skeleton';
import { callApi } from '@/lib/platform/http/call-api';
import { emptyValues, type EditorValues } from './editor-values';
import { ReportEditor } from './report-editor';
import { keptHere } from './draft-saver';
import { useEditorData } from './use-editor-data';

const draft = z.object({ publicId: z.string(), version: z.int(), content: z.record(z.string(), z.unknown()) });

/** Fetches what the editor needs, and the draft or the device that the address names. */
export function EditorLoader() {
  const parameters = useSearchParams();
  // The address changes when a draft begins; the editor that is open must not be made anew by that.
  const [draftId] = useState(parameters.get('draft'));
  const [deviceId] = useState(parameters.get('device'));
  // Looked at once: the editor itself keeps its text there as one types.
  const [kept] = useState(() => keptHere(draftId));
  const [usesKept, setUsesKept] = useState<boolean | null>(null);
  const { categories, devices, methods, instruments } = useEditorData();
  const saved = useQuery({
    enabled: draftId !== null,
    queryKey: ['draft', draftId],
    queryFn: () => callApi(`/api/v1/drafts/${draftId}`, { answer: draft }),
    staleTime: Infinity,
    gcTime: 0,
  });
  const failed = [categories, devices, methods, instruments, saved].find((query) => query.isError);
  if (failed) {
    return (
      <Notice tone="warning" role="alert" title="The editor could not be loaded">
        {failed.error?.message}
      </Notice>
    );
  }
  const waiting = draftId !== null && saved.isPending;
  if (!categories.data || !devices.data || !methods.data || !instruments.data || waiting) {
    return <Skeleton label="Loading the editor" lines={6} />;
  }
  // Typed over the version that is saved: it only goes on. Typed over another one, or for another device: ask.
  const goesOn = kept !== null && draftId !== null && kept.version === saved.data?.version;
  if (kept && !goesOn && usesKept === null) {
    return (
      <Notice tone="warning" title="This browser kept something that was never saved">
        <p>It holds {kept.values.deviceName || 'a report without a device'}, as you left it. Go on with it?</p>
        <p className="mt-2 flex flex-wrap gap-4">
          <Button look="main" onClick={() => setUsesKept(true)}>
            Go on with it
          </Button>
          <Button onClick={() => setUsesKept(false)}>Leave it</Button>
        </p>
      </Notice>
    );
  }
  const device = devices.data.devices.find((known) => known.publicId === deviceId);
  const begun: EditorValues = {
    ...emptyValues(),
    ...(device ? { devicePublicId: device.publicId, deviceName: device.name } : {}),
    ...(saved.data?.content ?? {}),
  };
  return (
    <ReportEditor
      data={{ ...categories.data, ...devices.data, ...methods.data, ...instruments.data }}
      initial={{
        publicId: draftId,
        version: saved.data?.version ?? 0,
        values: kept && (goesOn || usesKept) ? kept.values : begun,
      }}
      amendsPublicId={null}
    />
  );
}
