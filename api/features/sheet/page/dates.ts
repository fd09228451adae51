const MONTHS = [
  'January',
  'February',
  'March',
  'April',
  'May',
  'June',
  'July',
  'August',
  'September',
  'October',
  'November',
  'December',
] as const;

/** "21 March 2026", in UTC, from an ISO date. */
export function longDate(iso: string): string {
  const date = new Date(iso);
  return `${date.getUTCDate()} ${MONTHS[date.getUTCMonth()]} ${date.getUTCFullYear()}`;
}

/** "02:14" from milliseconds; "1:02:14" from an hour on. */
export function clockTime(ms: number): string {
  const s = Math.floor(ms / 1000);
  const two = (n: number) => String(n).padStart(2, '0');
  const minutes = `${two(Math.floor(s / 60) % 60)}:${two(s % 60)}`;
  return s >= 3600 ? `${Math.floor(s / 3600)}:${minutes}` : minutes;
}
