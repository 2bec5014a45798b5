import type { ComponentProps } from 'react';
import Link from 'next/link';
import clsx from 'clsx';

/** `main` once a page or form; `plain` for what stands beside it; `quiet` inside rows; `warning` for what takes away. */
type Look = 'main' | 'plain' | 'quiet' | 'warning';

const looks: Record<Look, string> = {
  main: 'target border border-ink bg-ink px-4 font-semibold text-paper hover:bg-transparent hover:text-ink',
  plain: 'target border border-ink px-4 font-semibold hover:bg-ink hover:text-paper',
  quiet:
    'min-h-8 px-1 text-lichen underline decoration-1 underline-offset-4 hover:decoration-2 pointer-coarse:min-h-11',
  warning: 'target border border-rust px-4 font-semibold text-rust hover:bg-rust hover:text-paper',
};

const base =
  'inline-flex items-center justify-center gap-2 rounded text-note print:hidden aria-disabled:cursor-not-allowed aria-disabled:opacity-60';

interface ButtonProps extends Omit<ComponentProps<'button'>, 'disabled'> {
  look?: Look;
  /** At work: stays where it is and keeps the focus, says so, and takes no second press. */
  busy?: boolean;
  /** Always with its reason in words nearby; the button keeps its place in the tab order. */
  unavailable?: boolean;
}

export function Button({
  look = 'plain',
  busy,
  unavailable,
  type = 'button',
  className,
  onClick,
  ...rest
}: ButtonProps) {
  const idle = busy || unavailable;
  return (
    <button
      {...rest}
      type={idle && type === 'submit' ? 'button' : type}
      aria-disabled={idle || undefined}
      aria-busy={busy || undefined}
      onClick={idle ? undefined : onClick}
      className={clsx(base, looks[look], className)}
    />
  );
}

interface LinkButtonProps extends ComponentProps<typeof Link> {
  look?: Look;
}

/** Looks like a button, goes somewhere: a link. */
export function LinkButton({ look = 'plain', className, ...rest }: LinkButtonProps) {
  return <Link {...rest} className={clsx(base, looks[look], className)} />;
}
