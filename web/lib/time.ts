const two = (n: number) => String(n).padStart(2, '0');

/** A moment in a recording, as it stands everywhere: `12:46`, from an hour on `1:02:14`. Whole seconds, cut not rounded. */
export function formatMoment(ms: number): string {
  const all = Math.max(0, Math.floor(ms / 1000));
  const hours = Math.floor(all / 3600);
  const tail = `${two(Math.floor(all / 60) % 60)}:${two(all % 60)}`;
  return hours > 0 ? `${hours}:${tail}` : tail;
}

/** To the tenth, only where a moment is being moved: `12:46.2`. */
export function formatTenths(ms: number): string {
  const tenths = Math.max(0, Math.round(ms / 100));
  return `${formatMoment(Math.floor(tenths / 10) * 1000)}.${tenths % 10}`;
}

/** Reads `46`, `12:46`, `1:02:14` or `12:46.2`. @returns milliseconds, or null when it is none of these. */
export function parseMoment(text: string): number | null {
  const match = /^(?:(?:(\d+):)?(\d{1,3}):)?(\d{1,2})(?:[.,](\d{1,3}))?$/.exec(text.trim());
  if (!match) return null;
  const [, hours = '0', minutes = '0', seconds = '0', part = ''] = match;
  const ms = Number(part.padEnd(3, '0'));
  return ((Number(hours) * 60 + Number(minutes)) * 60 + Number(seconds)) * 1000 + ms;
}

/** How a screen reader should say a moment: `12 minutes 46 seconds`. */
export function speakMoment(ms: number): string {
  const all = Math.max(0, Math.floor(ms / 1000));
  const say = (n: number, unit: string) => (n === 0 ? [] : [`${n} ${unit}${n === 1 ? '' : 's'}`]);
  const parts = [
    ...say(Math.floor(all / 3600), 'hour'),
    ...say(Math.floor(all / 60) % 60, 'minute'),
    ...say(all % 60, 'second'),
  ];
  return parts.join(' ') || '0 seconds';
}

/** The clock on the wall: `10:42`. */
export function formatClock(when: Date | string): string {
  const date = new Date(when);
  return `${two(date.getHours())}:${two(date.getMinutes())}`;
}

/** When something was touched: `today 10:42`, `yesterday`, `12 March`, `12 March 2025`. */
export function formatTouched(when: Date | string, now: Date = new Date()): string {
  const date = new Date(when);
  const midnight = (d: Date) => new Date(d.getFullYear(), d.getMonth(), d.getDate()).getTime();
  const days = Math.round((midnight(now) - midnight(date)) / 86_400_000);
  if (days === 0) return `today ${formatClock(date)}`;
  if (days === 1) return 'yesterday';
  const year = date.getFullYear() === now.getFullYear() ? {} : { year: 'numeric' as const };
  return date.toLocaleDateString('en-GB', { day: 'numeric', month: 'long', ...year });
}

/** A size as file managers give it: `640 kB`, `2.96 GB`. */
export function formatBytes(bytes: number): string {
  const units = ['bytes', 'kB', 'MB', 'GB', 'TB'];
  const step = Math.min(units.length - 1, bytes < 1000 ? 0 : Math.floor(Math.log10(bytes) / 3));
  const value = bytes / 1000 ** step;
  return `${step > 0 && value < 10 ? value.toFixed(2) : Math.round(value)} ${units[step] ?? ''}`;
}
