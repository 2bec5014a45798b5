'use client';

import { type DragEvent, type ReactNode, useRef, useState } from 'react';
import clsx from 'clsx';
import { FieldError, type FieldWords, Hint, describedBy } from './field';

interface FileDropProps extends Omit<FieldWords, 'hint'> {
  name: string;
  /** Says types and sizes before anyone chooses: "CSV or text, up to 20 MB". */
  hint: ReactNode;
  /** For the browser's chooser alone; what arrives is checked by the caller. */
  accept?: string;
  multiple?: boolean;
  onFiles: (files: File[]) => void;
  /** What was chosen, its progress, and its remove and replace buttons. */
  children?: ReactNode;
}

/** A native file button, and an area to drop files on for those who can; the button does everything alone. */
export function FileDrop({
  name,
  label,
  hint,
  error,
  optional,
  accept,
  multiple = false,
  onFiles,
  children,
}: FileDropProps) {
  const input = useRef<HTMLInputElement>(null);
  const [over, setOver] = useState(false);

  function take(list: FileList | null) {
    const files = Array.from(list ?? []);
    if (files.length > 0) onFiles(files);
    // The same file can be chosen again after a failure.
    if (input.current) input.current.value = '';
  }

  function drop(event: DragEvent) {
    event.preventDefault();
    setOver(false);
    take(event.dataTransfer.files);
  }

  return (
    <div
      className={clsx('my-5', error && 'border-l-3 border-rust pl-4')}
      onDragOver={(event) => {
        event.preventDefault();
        setOver(true);
      }}
      onDragLeave={() => setOver(false)}
      onDrop={drop}
    >
      <label htmlFor={name} className="block font-semibold">
        {label}
        {optional && <span className="font-normal text-muted"> (optional)</span>}
      </label>
      <Hint id={name}>{hint}</Hint>
      {error && <FieldError id={name}>{error}</FieldError>}
      <div
        className={clsx(
          'mt-1.5 flex flex-wrap items-center gap-x-4 gap-y-2 rounded border border-dashed px-4 py-4',
          over ? 'border-lichen bg-lichen-fill/20' : 'border-muted',
        )}
      >
        <input
          ref={input}
          id={name}
          name={name}
          type="file"
          accept={accept}
          multiple={multiple}
          aria-describedby={describedBy(name, { hint, error })}
          aria-invalid={error ? true : undefined}
          onChange={(event) => take(event.target.files)}
          // The browser's own words for "none chosen" would contradict the list of files below.
          className="w-34 rounded text-transparent file:target file:rounded file:border file:border-solid file:border-ink file:bg-transparent file:px-4 file:text-note file:font-semibold file:text-ink hover:file:bg-ink hover:file:text-paper"
        />
        <span className="text-caption text-muted">or drop {multiple ? 'them' : 'it'} here</span>
      </div>
      {children}
    </div>
  );
}
