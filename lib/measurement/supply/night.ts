const DAY_HOURS = 24;

/**
 * How much of a window of the day lies in the night. Both may reach over midnight; one that begins where it ends is the
 * whole day.
 *
 * @param window when something draws, hours of the day 0 to 24; null for all day.
 * @param night likewise.
 * @returns a share, 0 to 1.
 * @example nightShare({ fromHour: 22, toHour: 2 }, { fromHour: 18, toHour: 24 }) // 0.5
 */
export function nightShare(
  window: { fromHour: number; toHour: number } | null,
  night: { fromHour: number; toHour: number },
): number {
  const drawn = window ? pieces(window) : [{ from: 0, to: DAY_HOURS }];
  const dark = pieces(night);
  const length = drawn.reduce((sum, { from, to }) => sum + to - from, 0);
  const shared = drawn.flatMap((a) => dark.map((b) => Math.max(0, Math.min(a.to, b.to) - Math.max(a.from, b.from))));
  return shared.reduce((sum, hours) => sum + hours, 0) / length;
}

function pieces({ fromHour, toHour }: { fromHour: number; toHour: number }): { from: number; to: number }[] {
  const [from, to] = [fromHour % DAY_HOURS, toHour % DAY_HOURS];
  if (from < to) return [{ from, to }];
  return [
    { from, to: DAY_HOURS },
    { from: 0, to },
  ];
}
