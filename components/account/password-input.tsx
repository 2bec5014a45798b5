'use client';

import { useState, type ComponentProps } from 'react';
import { TextInput } from '@/components/ui/inputs';

/** Masked, with a button that shows it; paste and password managers work as anywhere. */
export function PasswordInput(props: ComponentProps<typeof TextInput>) {
  const [shown, setShown] = useState(false);
  return (
    <div className="relative">
      <TextInput {...props} type={shown ? 'text' : 'password'} spellCheck={false} autoCapitalize="none" />
      <button
        type="button"
        aria-pressed={shown}
        onClick={() => setShown(!shown)}
        className="absolute top-0 right-0 min-h-6 text-caption text-lichen underline underline-offset-4 pointer-coarse:min-h-11"
      >
        {shown ? 'Hide password' : 'Show password'}
      </button>
    </div>
  );
}
