/** "12:46" from milliseconds; "2 · 12:46" in a second recording. */
export function momentText({ recordingNumber, startMs }: { recordingNumber: number; startMs: number }): string {
  const s = Math.floor(startMs / 1000);
  const two = (n: number) => String(n).padStart(2, '0');
  const hours = Math.floor(s / 3600);
  const time = `${hours > 0 ? `${hours}:` : ''}${two(Math.floor(s / 60) % 60)}:${two(s % 60)}`;
  return recordingNumber === 1 ? time : `${recordingNumber} · ${time}`;
}
