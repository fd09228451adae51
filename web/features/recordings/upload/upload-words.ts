import { formatBytes } from '../../../lib/time.ts';
import { progressOf, type UploadState } from './upload-state.ts';

/** "about 4 minutes", "less than a minute". */
export function aboutTime(seconds: number): string {
  if (seconds < 50) return 'less than a minute';
  const minutes = Math.round(seconds / 60);
  if (minutes < 60) return minutes <= 1 ? 'about a minute' : `about ${minutes} minutes`;
  const hours = Math.round(seconds / 3_600);
  return hours === 1 ? 'about an hour' : `about ${hours} hours`;
}

/** "1.84 of 2.96 GB": the unit once where both have it. */
export function ofBytes(done: number, all: number): string {
  const [a, b] = [formatBytes(done), formatBytes(all)];
  const unit = b.slice(b.indexOf(' '));
  return a.endsWith(unit) ? `${a.slice(0, -unit.length)} of ${b}` : `${a} of ${b}`;
}

/** How an upload stands, in one line. */
export function uploadWords(state: UploadState): string {
  const { share, bytesPerSecond, secondsLeft } = progressOf(state);
  const percent = `${Math.floor(share * 100)}% up`;
  switch (state.phase) {
    case 'looking':
      return 'Looking at the file; nothing is sent yet.';
    case 'starting':
      return 'Asking what has arrived already.';
    case 'sending':
      return bytesPerSecond === null || secondsLeft === null
        ? percent
        : `${percent}, ${aboutTime(secondsLeft)} left, ${formatBytes(bytesPerSecond)}/s`;
    case 'paused':
      return `Paused. ${percent} and kept.`;
    case 'waiting':
      return state.reason ?? `The connection was lost. ${percent} and kept; it goes on by itself.`;
    case 'finishing':
      return 'All of it has arrived. It is being looked at.';
    case 'ready':
      return 'The clip is here.';
    case 'refused':
      return state.reason ?? 'This clip was not taken.';
    case 'cancelled':
      return 'Cancelled. Nothing of it is kept.';
  }
}
