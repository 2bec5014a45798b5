import clsx from 'clsx';

interface SkeletonProps {
  /** Lines of the same height as what will stand here, so that nothing moves when it comes. */
  lines?: number;
  /** What is being fetched, for those who don't see the lines. */
  label: string;
  className?: string;
}

export function Skeleton({ lines = 3, label, className }: SkeletonProps) {
  return (
    <div role="status" className={clsx('py-2', className)}>
      <span className="sr-only">{label}</span>
      {Array.from({ length: lines }, (_, line) => (
        <div key={line} aria-hidden="true" className="flex h-10 items-center border-b border-rule">
          <div className="h-2.5 w-1/3 rounded bg-rule motion-safe:animate-pulse" />
        </div>
      ))}
    </div>
  );
}
