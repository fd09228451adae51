/**
 * Reads a clock time as people and programs write it in front of text: `1:04`, `01:02:03`, `00:01:04,500`, `1:04.5`.
 * @returns milliseconds, or null where it is none (`1:75`, `12`).
 */
export function readClockTime(text: string): number | null {
  const parts = /^(?:(\d{1,3}):)?(\d{1,3}):(\d{1,2})(?:[.,](\d{1,6}))?$/.exec(text.trim());
  if (!parts) return null;
  const [, hours, minutes, seconds, fraction] = parts;
  if (Number(seconds) > 59 || (hours !== undefined && Number(minutes) > 59)) return null;
  const whole = (Number(hours ?? 0) * 60 + Number(minutes)) * 60 + Number(seconds);
  return whole * 1000 + Math.round(Number(`0.${fraction ?? '0'}`) * 1000);
}

/** Prints milliseconds as `h:mm:ss` or `m:ss`, for a sentence. */
export function printClockTime(ms: number): string {
  const seconds = Math.floor(ms / 1000);
  const pad = (n: number) => String(n).padStart(2, '0');
  const hours = Math.floor(seconds / 3600);
  const minutes = Math.floor(seconds / 60) % 60;
  return hours > 0 ? `${hours}:${pad(minutes)}:${pad(seconds % 60)}` : `${minutes}:${pad(seconds % 60)}`;
}
