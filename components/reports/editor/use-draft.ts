'use client';

import { useCallback, useEffect, useRef, useState } from 'react';
import { z } from 'zod';
import { ApiProblem, callApi } from '@/lib/platform/http/call-api';
import type { EditorValues } from './editor-values';

export type SaveState =
  | { kind: 'untouched' }
  | { kind: 'saving' }
  | { kind: 'saved' }
  /** No connection, or signed out: what was typed is in this browser. */
  | { kind: 'here-only'; reason: string }
  /** Changed elsewhere meanwhile: both texts are there. */
  | { kind: 'conflict'; version: number; theirs: EditorValues };

const saved = z.object({ publicId: z.string(), version: z.int() });
const LOCAL_KEY = 'wattcairn-draft';
const PAUSE_MS = 1000;
const RETRY_MS = 5000;

/** What this browser kept of a draft that never reached the server. */
export function keptHere(draftPublicId: string | null): EditorValues | null {
  try {
    const text = localStorage.getItem(`${LOCAL_KEY}-${draftPublicId ?? 'new'}`);
    return text ? (JSON.parse(text) as EditorValues) : null;
  } catch {
    return null;
  }
}

/**
 * Saves a draft as one types: in this browser at once, on the server after a short pause. Of two browsers on one draft
 * the later one is told, and nothing is overwritten unseen.
 */
export function useDraft(initial: { publicId: string | null; version: number }) {
  const [state, setState] = useState<SaveState>({ kind: 'untouched' });
  const draft = useRef(initial);
  const latest = useRef<EditorValues | null>(null);
  const timer = useRef<ReturnType<typeof setTimeout> | null>(null);
  const busy = useRef(false);

  const push = useCallback(async (): Promise<void> => {
    const values = latest.current;
    if (values === null || busy.current) return;
    busy.current = true;
    setState({ kind: 'saving' });
    const key = () => `${LOCAL_KEY}-${draft.current.publicId ?? 'new'}`;
    try {
      const { publicId, version } = draft.current;
      const answer =
        publicId === null
          ? await callApi('/api/v1/drafts', {
              method: 'POST',
              body: { content: values },
              answer: saved,
              idempotencyKey: values.clientKey,
            })
          : await callApi(`/api/v1/drafts/${publicId}`, {
              method: 'PUT',
              body: { content: values },
              answer: saved,
              ifMatch: version,
            });
      localStorage.removeItem(key());
      if (publicId === null) window.history.replaceState(null, '', `/reports/new?draft=${answer.publicId}`);
      draft.current = { publicId: answer.publicId, version: answer.version };
      busy.current = false;
      if (latest.current === values) setState({ kind: 'saved' });
      else await push();
    } catch (error) {
      busy.current = false;
      setState(stateAfter(error));
      if (error instanceof ApiProblem && (error.status === 0 || error.status >= 500)) {
        timer.current = setTimeout(() => void push(), RETRY_MS);
      }
    }
  }, []);

  const save = useCallback(
    (values: EditorValues) => {
      latest.current = values;
      try {
        localStorage.setItem(`${LOCAL_KEY}-${draft.current.publicId ?? 'new'}`, JSON.stringify(values));
      } catch {
        // A full or closed store of this browser: the server's copy has to do.
      }
      if (timer.current) clearTimeout(timer.current);
      timer.current = setTimeout(() => void push(), PAUSE_MS);
    },
    [push],
  );

  /** Keeps one's own text over what was saved elsewhere, or takes the other. */
  const settle = useCallback(
    (version: number, values: EditorValues) => {
      draft.current = { ...draft.current, version };
      latest.current = values;
      void push();
    },
    [push],
  );

  const forget = useCallback(() => {
    if (timer.current) clearTimeout(timer.current);
    latest.current = null;
    for (const name of ['new', draft.current.publicId]) localStorage.removeItem(`${LOCAL_KEY}-${name}`);
  }, []);

  useEffect(() => {
    const online = () => void push();
    window.addEventListener('online', online);
    return () => window.removeEventListener('online', online);
  }, [push]);

  return { state, save, settle, forget, draftPublicId: () => draft.current.publicId };
}

function stateAfter(error: unknown): SaveState {
  if (error instanceof ApiProblem) {
    if (error.code === 'version-changed') {
      return {
        kind: 'conflict',
        version: Number(error.facts.version),
        theirs: error.facts.content as EditorValues,
      };
    }
    if (error.status === 401) return { kind: 'here-only', reason: 'You are signed out. Sign in again in another tab.' };
    return { kind: 'here-only', reason: error.message };
  }
  return { kind: 'here-only', reason: 'The site does not answer as expected.' };
}
