'use client';

import { Notice } from '@/components/layout/notices';
import { Button } from '@/components/ui/button';
import type { EditorValues } from './editor-values';
import type { SaveState } from './draft-saver';

interface SaveNoteProps {
  state: SaveState;
  mine: () => EditorValues;
  onSettle: (version: number, values: EditorValues) => void;
}

const WORDS = { untouched: '', saving: 'saving …', saved: 'saved' } as const;

/** Where the draft is: saved, being saved, or in this browser only; and both texts where it was changed elsewhere. */
export function SaveNote({ state, mine, onSettle }: SaveNoteProps) {
  if (state.kind === 'conflict') {
    return (
      <Notice tone="warning" role="alert" title="This draft was changed in another window">
        <p>
          There it has {state.theirs.typed.length} readings, {state.theirs.traces.length} traces and{' '}
          {state.theirs.notes.length} characters of notes; here {mine().typed.length}, {mine().traces.length} and{' '}
          {mine().notes.length}. Choose which one stays; the other is overwritten.
        </p>
        <p className="mt-2 flex flex-wrap gap-4">
          <Button onClick={() => onSettle(state.version, mine())}>Keep what is here</Button>
          <Button onClick={() => onSettle(state.version, state.theirs)}>Take the other one</Button>
        </p>
      </Notice>
    );
  }
  if (state.kind === 'here-only') {
    return (
      <p role="status" className="text-note font-semibold text-rust">
        Saved in this browser only. {state.reason}
      </p>
    );
  }
  return (
    <p role="status" className="min-h-6 text-note text-muted">
      {WORDS[state.kind]}
    </p>
  );
}
