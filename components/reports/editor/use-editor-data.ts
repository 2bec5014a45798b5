'use client';

import { useQuery } from '@tanstack/react-query';
import { z } from 'zod';
import { category, publicDevice } from '@/lib/catalogue/schema';
import { callApi } from '@/lib/platform/http/call-api';
import { instrument, traceSummary } from '@/lib/reports/schema';

const categories = z.object({ categories: z.array(category.omit({ id: true, revisionId: true })) });
const devices = z.object({ devices: z.array(publicDevice) });
const instruments = z.object({ instruments: z.array(instrument) });
const methods = z.object({
  methods: z.array(
    z.object({
      code: z.string(),
      name: z.string(),
      summary: z.string(),
      minimumSeconds: z.number(),
      minimumCycles: z.number(),
      caution: z.string(),
      needsConfirmation: z.boolean(),
    }),
  ),
});

export type EditorCategory = z.infer<typeof categories>['categories'][number];
export type EditorDevice = z.infer<typeof publicDevice>;
export type EditorMethod = z.infer<typeof methods>['methods'][number];
export type TraceSummary = z.infer<typeof traceSummary>;

/** What the editor offers to choose from; kept for the visit, since it hardly changes at the bench. */
export function useEditorData() {
  const kept = { staleTime: 5 * 60_000 };
  return {
    categories: useQuery({
      ...kept,
      queryKey: ['categories'],
      queryFn: () => callApi('/api/v1/categories', { answer: categories }),
    }),
    devices: useQuery({
      ...kept,
      queryKey: ['devices'],
      queryFn: () => callApi('/api/v1/devices', { answer: devices }),
    }),
    methods: useQuery({
      ...kept,
      queryKey: ['methods'],
      queryFn: () => callApi('/api/v1/methods', { answer: methods }),
    }),
    instruments: useQuery({
      queryKey: ['instruments'],
      queryFn: () => callApi('/api/v1/instruments', { answer: instruments }),
    }),
  };
}

export type EditorData = {
  categories: EditorCategory[];
  devices: EditorDevice[];
  methods: EditorMethod[];
  instruments: z.infer<typeof instruments>['instruments'];
};

export function readTraceSummary(publicId: string) {
  return callApi(`/api/v1/traces/${publicId}`, { answer: traceSummary });
}
