/** How times are written: by the clock of a zone, or since the start where the trace knew only that. */
export interface TraceClock {
  /** IANA name, "Europe/Oslo"; null counts from the trace's start. */
  zone: string | null;
  /** Seconds at which the trace starts. */
  start: number;
}

const STEPS = [
  1, 2, 5, 10, 15, 30, 60, 120, 300, 600, 900, 1800, 3600, 7200, 10800, 21600, 43200, 86400, 172800, 604800, 1209600,
  2592000,
];
const MINUTE = 60;
const HOUR = 3600;
const DAY = 86400;
const MONTHS = ['Jan', 'Feb', 'Mar', 'Apr', 'May', 'Jun', 'Jul', 'Aug', 'Sep', 'Oct', 'Nov', 'Dec'];

const two = (value: number) => String(value).padStart(2, '0');

const parts = new Map<string, Intl.DateTimeFormat>();

/** Seconds to add to UTC for the zone's clock at this moment. */
function offsetOf(seconds: number, zone: string): number {
  let format = parts.get(zone);
  if (!format) {
    format = new Intl.DateTimeFormat('en-GB', { timeZone: zone, timeZoneName: 'longOffset' });
    parts.set(zone, format);
  }
  const name = format.formatToParts(seconds * 1000).find((part) => part.type === 'timeZoneName')?.value ?? '';
  const [, sign, hours = '0', minutes = '0'] = /GMT([+-])(\d+):?(\d+)?/.exec(name) ?? [];
  return (sign === '-' ? -1 : 1) * (Number(hours) * HOUR + Number(minutes) * MINUTE);
}

/** A round step of time such that at most `most` of them fit. */
export function roundStep(seconds: number, most: number): number {
  return STEPS.find((step) => seconds / step <= most) ?? DAY * 30;
}

/** Round moments of the zone's clock (or since the start) inside a window. */
export function timeTicks(from: number, to: number, most: number, clock: TraceClock): { at: number[]; step: number } {
  const step = roundStep(to - from, most);
  const offset = clock.zone === null ? -clock.start : offsetOf(from, clock.zone);
  const at: number[] = [];
  for (let tick = Math.ceil((from + offset) / step) * step - offset; tick <= to; tick += step) at.push(tick);
  return { at, step };
}

/** A tick's label: the day where the clock passes midnight or steps are days, otherwise the time. */
export function tickLabel(seconds: number, step: number, clock: TraceClock): string {
  if (clock.zone === null) return elapsed(seconds - clock.start, step);
  const local = new Date((seconds + offsetOf(seconds, clock.zone)) * 1000);
  const midnight = local.getUTCHours() === 0 && local.getUTCMinutes() === 0 && local.getUTCSeconds() === 0;
  if (step >= DAY || midnight) return `${local.getUTCDate()} ${MONTHS[local.getUTCMonth()]}`;
  const time = `${two(local.getUTCHours())}:${two(local.getUTCMinutes())}`;
  return step < MINUTE ? `${time}:${two(local.getUTCSeconds())}` : time;
}

/** A moment in full: "14 Oct 18:02", or "2 d 03:15" since the start; with seconds where they matter. */
export function moment(seconds: number, clock: TraceClock, withSeconds: boolean): string {
  if (clock.zone === null) return elapsed(seconds - clock.start, withSeconds ? 1 : MINUTE);
  const local = new Date((seconds + offsetOf(seconds, clock.zone)) * 1000);
  const time = `${two(local.getUTCHours())}:${two(local.getUTCMinutes())}`;
  const tail = withSeconds ? `:${two(local.getUTCSeconds())}` : '';
  return `${local.getUTCDate()} ${MONTHS[local.getUTCMonth()]} ${time}${tail}`;
}

function elapsed(seconds: number, step: number): string {
  const whole = Math.round(seconds);
  const days = Math.floor(whole / DAY);
  const rest = whole - days * DAY;
  const time = `${two(Math.floor(rest / HOUR))}:${two(Math.floor((rest % HOUR) / MINUTE))}`;
  const tail = step < MINUTE ? `:${two(rest % MINUTE)}` : '';
  if (days === 0) return time + tail;
  return rest === 0 && step >= HOUR ? `${days} d` : `${days} d ${time}${tail}`;
}

/** A length of time in words for a button: "5 min". */
export function stepWords(seconds: number): string {
  if (seconds >= DAY) return `${seconds / DAY} d`;
  if (seconds >= HOUR) return `${seconds / HOUR} h`;
  return seconds >= MINUTE ? `${seconds / MINUTE} min` : `${seconds} s`;
}
