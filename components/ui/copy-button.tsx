'use client';

import { useState } from 'react';
import { Button } from './button';

interface CopyButtonProps {
  text: string;
  /** "Copy the citation". */
  label: string;
}

export function CopyButton({ text, label }: CopyButtonProps) {
  const [said, setSaid] = useState('');

  async function copy() {
    try {
      await navigator.clipboard.writeText(text);
      setSaid('Copied');
    } catch {
      setSaid('Your browser does not let us copy. Select the text and copy it yourself.');
    }
  }

  return (
    <span className="inline-flex flex-wrap items-center gap-2">
      <Button look="quiet" onClick={copy}>
        {label}
      </Button>
      <span role="status" className="text-caption text-muted">
        {said}
      </span>
    </span>
  );
}
