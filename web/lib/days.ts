const DAY = new Intl.DateTimeFormat('en-GB', { day: 'numeric', month: 'long' });
const DAY_AND_YEAR = new Intl.DateTimeFormat('en-GB', { day: 'numeric', month: 'long', year: 'numeric' });
const CLOCK = new Intl.DateTimeFormat('en-GB', { hour: '2-digit', minute: '2-digit' });

const dayNumber = (date: Date) => Math.floor((date.getTime() - date.getTimezoneOffset() * 60_000) / 86_400_000);

/** A day as people write it: `21 March`, with the year when it is another one. */
export function formatDay(iso: string, now = new Date()): string {
  const date = new Date(iso);
  return (date.getFullYear() === now.getFullYear() ? DAY : DAY_AND_YEAR).format(date);
}

/** How long ago something was, as a ledger says it: `just now`, `12 min ago`, `today 10:42`, `yesterday 23:10`, `12 March`. */
export function formatRecent(iso: string, now = new Date()): string {
  const date = new Date(iso);
  const minutes = Math.floor((now.getTime() - date.getTime()) / 60_000);
  if (minutes < 2) return 'just now';
  if (minutes < 60) return `${minutes} min ago`;
  const days = dayNumber(now) - dayNumber(date);
  if (days === 0) return `today ${CLOCK.format(date)}`;
  return days === 1 ? `yesterday ${CLOCK.format(date)}` : formatDay(iso, now);
}
