'use client';

import { useEffect, useState } from 'react';
import { DraftSaver, type SaveState } from './draft-saver';

/** One saver for as long as the editor is open, with the state to show; it tries again when the connection is back. */
export function useDraft(initial: { publicId: string | null; version: number }) {
  const [state, setState] = useState<SaveState>({ kind: 'untouched' });
  const [saver] = useState(() => new DraftSaver({ publicId: initial.publicId, version: initial.version }, setState));
  useEffect(() => {
    const online = () => void saver.push();
    window.addEventListener('online', online);
    return () => window.removeEventListener('online', online);
  }, [saver]);
  return { state, saver };
}
