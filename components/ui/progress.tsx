interface ProgressProps {
  label: string;
  /** 0 to 1; left out while the length isn't known. */
  value?: number;
  /** In words beside the label: "2 of 3 files". Read out as it changes. */
  status?: string;
}

export function Progress({ label, value, status }: ProgressProps) {
  return (
    <div className="my-3">
      <div className="flex justify-between gap-4 text-caption">
        <span>{label}</span>
        <span role="status" className="font-mono text-muted">
          {status}
        </span>
      </div>
      <progress
        aria-label={label}
        value={value}
        max={1}
        className="mt-1 block h-2 w-full appearance-none overflow-hidden rounded border border-muted bg-sheet [&::-moz-progress-bar]:bg-ink [&::-webkit-progress-bar]:bg-sheet [&::-webkit-progress-value]:bg-ink"
      />
    </div>
  );
}
