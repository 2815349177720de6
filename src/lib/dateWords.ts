const MINUTE = 60_000;
const HOUR = 60 * MINUTE;
const DAY = 24 * HOUR;

/**
 * How long ago something happened, as short as a desk needs it: "just now", "40 min", "2 h", "1 d 3 h", then the day.
 * @param at ISO time; @param now milliseconds since the epoch.
 */
export function ago(at: string, now: number): string {
  const passed = now - Date.parse(at);
  if (passed < MINUTE) return 'just now';
  if (passed < HOUR) return `${Math.floor(passed / MINUTE)} min`;
  if (passed < DAY) return `${Math.floor(passed / HOUR)} h`;
  if (passed < 7 * DAY) {
    const hours = Math.floor((passed % DAY) / HOUR);
    return `${Math.floor(passed / DAY)} d${hours > 0 ? ` ${hours} h` : ''}`;
  }
  return day(at, now);
}

/** The day something happened: "5 Dec", with the year when it is not this one. */
export function day(at: string, now: number): string {
  const date = new Date(at);
  const sameYear = date.getFullYear() === new Date(now).getFullYear();
  return date.toLocaleDateString('en-GB', { day: 'numeric', month: 'short', year: sameYear ? undefined : 'numeric' });
}

/** Date and time in full, for titles and screen readers: "1 December 2026 at 14:05". */
export function inFull(at: string): string {
  const date = new Date(at);
  const clock = date.toLocaleTimeString('en-GB', { hour: '2-digit', minute: '2-digit' });
  return `${date.toLocaleDateString('en-GB', { day: 'numeric', month: 'long', year: 'numeric' })} at ${clock}`;
}
