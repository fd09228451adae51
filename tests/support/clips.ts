import { execFileSync } from 'node:child_process';
import { createHash, randomBytes, randomUUID } from 'node:crypto';
import { mkdirSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';

/** Kinds of film that `filmClip` makes: what browsers play, and what some do not. */
export type Film = 'mp4' | 'mov' | 'webm' | 'hevc' | 'ten-bit' | 'mkv';

const FILMS: Readonly<Record<Film, { ending: string; args: readonly string[] }>> = {
  mp4: { ending: 'mp4', args: ['-c:v', 'libx264', '-preset', 'ultrafast', '-pix_fmt', 'yuv420p', '-c:a', 'aac'] },
  mov: { ending: 'mov', args: ['-c:v', 'libx264', '-preset', 'ultrafast', '-pix_fmt', 'yuv420p', '-c:a', 'aac'] },
  webm: { ending: 'webm', args: ['-c:v', 'libvpx-vp9', '-deadline', 'realtime', '-cpu-used', '8', '-c:a', 'libopus'] },
  hevc: {
    ending: 'mp4',
    args: ['-c:v', 'libx265', '-preset', 'ultrafast', '-x265-params', 'log-level=none', '-tag:v', 'hvc1', '-an'],
  },
  'ten-bit': { ending: 'mp4', args: ['-c:v', 'libx264', '-preset', 'ultrafast', '-pix_fmt', 'yuv422p10le', '-an'] },
  mkv: { ending: 'mkv', args: ['-c:v', 'libx264', '-preset', 'ultrafast', '-pix_fmt', 'yuv420p', '-c:a', 'aac'] },
};

/** A film of some seconds, made by ffmpeg: moving test card and a tone. */
export function filmClip(film: Film, seconds = 2): Buffer {
  const dir = path.join(tmpdir(), `roundelay-clip-${randomUUID()}`);
  mkdirSync(dir);
  try {
    const { ending, args } = FILMS[film];
    const file = path.join(dir, `clip.${ending}`);
    execFileSync('ffmpeg', [
      ...['-v', 'error', '-y', '-f', 'lavfi', '-i', `testsrc=size=320x180:rate=15:duration=${seconds}`],
      ...['-f', 'lavfi', '-i', `sine=440:duration=${seconds}`, ...args, file],
    ]);
    return readFileSync(file);
  } finally {
    rmSync(dir, { recursive: true, force: true });
  }
}

const BOX_HEAD = 8;

/**
 * Makes an MP4 or MOV larger without changing the film: a box that players pass over, of random bytes, behind it.
 * @param bytes what the whole shall have
 */
export function padFilm(film: Buffer, bytes: number): Buffer {
  const free = bytes - film.length;
  if (free < BOX_HEAD) throw new Error('the film is larger than that already');
  const box = randomBytes(free);
  box.writeUInt32BE(free, 0);
  box.write('free', 4, 'latin1');
  return Buffer.concat([film, box]);
}

export const sha256 = (bytes: Uint8Array): string => createHash('sha256').update(bytes).digest('hex');

/** The four facts that say "the same file", as a browser tells them. */
export const clipFactsOf = (file: Buffer, name = 'harvest-mouse.mp4', lastModified = 1_764_000_000_000) => ({
  name,
  size: file.length,
  lastModified,
  firstMiBSha256: sha256(file.subarray(0, 1_048_576)),
});

/** Part `n` of a file, counted from 1. */
export const partOf = (file: Buffer, n: number, partSize: number): Buffer =>
  file.subarray((n - 1) * partSize, n * partSize);
