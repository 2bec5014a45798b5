/** Turns local times of one IANA zone into UTC, quickly for rows in order: offsets are kept for each hour. */
export class ZoneClock {
  private readonly format: Intl.DateTimeFormat;
  private readonly offsets = new Map<number, number>();

  /** @throws {RangeError} where there is no such zone. */
  constructor(zone: string) {
    this.format = new Intl.DateTimeFormat('en-GB', {
      timeZone: zone,
      hourCycle: 'h23',
      year: 'numeric',
      month: 'numeric',
      day: 'numeric',
      hour: 'numeric',
      minute: 'numeric',
      second: 'numeric',
    });
  }

  /**
   * The UTC times that a local time may mean: one, two in the hour that comes twice, or, in the hour that is skipped,
   * the one an unset clock would show.
   *
   * @param localSeconds the local time read as if it were UTC, in seconds since 1970.
   */
  candidates(localSeconds: number): number[] {
    const early = localSeconds - this.offsetAt(localSeconds - 86_400);
    const late = localSeconds - this.offsetAt(localSeconds + 86_400);
    const fitting = [...new Set([early, late])].filter((utc) => utc + this.offsetAt(utc) === localSeconds);
    return fitting.length > 0 ? fitting.sort((a, b) => a - b) : [early];
  }

  private offsetAt(utcSeconds: number): number {
    const hour = Math.floor(utcSeconds / 900);
    const known = this.offsets.get(hour);
    if (known !== undefined) return known;
    const parts = Object.fromEntries(
      this.format.formatToParts(new Date(hour * 900_000)).map((part) => [part.type, Number(part.value)]),
    ) as Record<'year' | 'month' | 'day' | 'hour' | 'minute' | 'second', number>;
    const local = Date.UTC(parts.year, parts.month - 1, parts.day, parts.hour, parts.minute, parts.second) / 1000;
    const offset = local - hour * 900;
    this.offsets.set(hour, offset);
    return offset;
  }
}
