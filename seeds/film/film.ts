/**
 * Films the demo's clips: a synthetic voice speaks each caption, drawn hands make the piece meanwhile, and the captions
 * are written out as the transcript with the very times at which they are heard.
 *
 * `node --import tsx seeds/film/film.ts [name …]` – needs espeak-ng, ffmpeg and Chromium; the films themselves are
 * committed, so this is only run when a story or a drawing changes.
 */
import { execFileSync, spawn } from 'node:child_process';
import { once } from 'node:events';
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { chromium, type Page } from 'playwright-core';
import { HARVEST_MOUSE } from './harvest-mouse.ts';
import { KETTLE_HOLDER } from './kettle-holder.ts';
import { drawFrame } from './scenes.ts';
import type { Story } from './story.ts';

const FRAMES_PER_SECOND = 4;
const SAMPLES_PER_SECOND = 22_050;
const WAV_HEADER = 44;
const LEAD_IN = 1.2; // seconds before the first word
const out = (file: string) => path.join(import.meta.dirname, '..', 'clips', file);

/** The face of the title card, inside the page: nothing is loaded from elsewhere. */
const FACES = (['600-normal', '400-italic'] as const)
  .map((cut) => {
    const file = createRequire(import.meta.url).resolve(`@fontsource/lora/files/lora-latin-${cut}.woff2`);
    const [weight, style] = cut.split('-');
    return `@font-face { font-family: Lora; font-weight: ${weight}; font-style: ${style}; src: url(data:font/woff2;base64,${readFileSync(file).toString('base64')}) }`;
  })
  .join('\n');

interface Timed {
  readonly startMs: number;
  readonly endMs: number;
  readonly untilMs: number; // the shot goes on until here
}

/** Drops the silence before the first and after the last sound, so that a caption's times are those of its words. */
function trimmed(voice: Buffer): Buffer {
  const loud = (sample: number) => Math.abs(voice.readInt16LE(2 * sample)) > 200;
  let first = 0;
  let last = voice.length / 2 - 1;
  while (first < last && !loud(first)) first += 1;
  while (last > first && !loud(last)) last -= 1;
  return voice.subarray(2 * first, 2 * (last + 1));
}

/** Speaks all captions into one sound track and says when each is heard. */
function speak(story: Story, folder: string): { wav: string; times: Timed[] } {
  const parts: Buffer[] = [Buffer.alloc(2 * Math.round(LEAD_IN * SAMPLES_PER_SECOND))];
  const times: Timed[] = [];
  let samples = Math.round(LEAD_IN * SAMPLES_PER_SECOND);
  const ms = () => Math.round((samples / SAMPLES_PER_SECOND) * 1000);
  for (const shot of story.shots) {
    const file = path.join(folder, 'say.wav');
    execFileSync('espeak-ng', ['-v', 'en-gb-x-rp+f4', '-s', '152', '-p', '48', '-g', '3', '-w', file, shot.say]);
    const voice = trimmed(readFileSync(file).subarray(WAV_HEADER));
    const startMs = ms();
    samples += voice.length / 2;
    const endMs = ms();
    const silence = Math.round((shot.pause ?? 0.8) * SAMPLES_PER_SECOND);
    samples += silence;
    parts.push(voice, Buffer.alloc(2 * silence));
    times.push({ startMs, endMs, untilMs: ms() });
  }
  const wav = path.join(folder, 'track.raw');
  writeFileSync(wav, Buffer.concat(parts));
  return { wav, times };
}

/** A clock time as WebVTT writes it. */
function vttTime(ms: number): string {
  const pad = (value: number, digits = 2) => String(value).padStart(digits, '0');
  return `${pad(Math.floor(ms / 3_600_000))}:${pad(Math.floor(ms / 60_000) % 60)}:${pad(Math.floor(ms / 1000) % 60)}.${pad(ms % 1000, 3)}`;
}

function writeTranscript(story: Story, times: readonly Timed[]): void {
  const cues = story.shots.map(
    (shot, i) => `${vttTime(times[i]!.startMs)} --> ${vttTime(times[i]!.endMs)}\n${shot.say}\n`,
  );
  writeFileSync(out(`${story.name}.vtt`), `WEBVTT\n\n${cues.join('\n')}`);
}

async function writeClip(page: Page, story: Story, times: readonly Timed[], wav: string): Promise<void> {
  const sound = ['-f', 's16le', '-ar', String(SAMPLES_PER_SECOND), '-ac', '1', '-i', wav];
  const picture = ['-f', 'image2pipe', '-framerate', String(FRAMES_PER_SECOND), '-c:v', 'png', '-i', '-'];
  const encode =
    '-c:v libx264 -preset veryslow -tune animation -crf 35 -g 40 -pix_fmt yuv420p -c:a aac -b:a 26k -movflags +faststart'.split(
      ' ',
    );
  const ffmpeg = spawn(
    'ffmpeg',
    ['-y', '-loglevel', 'error', ...picture, ...sound, ...encode, out(`${story.name}.mp4`)],
    {
      stdio: ['pipe', 'inherit', 'inherit'],
    },
  );
  const done = once(ffmpeg, 'close');
  const total = Math.ceil((times.at(-1)!.untilMs / 1000) * FRAMES_PER_SECOND);
  const drawn = new Map<string, Buffer>();
  for (let frame = 0; frame < total; frame += 1) {
    const at = (frame * 1000) / FRAMES_PER_SECOND;
    const index = Math.max(
      0,
      times.findIndex((t) => at < t.untilMs),
    );
    const shot = story.shots[index]!;
    const began = index === 0 ? 0 : times[index - 1]!.untilMs;
    const share = (at - began) / (times[index]!.untilMs - began);
    const svg = drawFrame(shot.view, share, frame % 4);
    let png = drawn.get(svg);
    if (!png) {
      await page.evaluate((body: string) => {
        document.body.innerHTML = body;
      }, svg);
      png = await page.screenshot();
      drawn.set(svg, png);
    }
    if (!ffmpeg.stdin.write(png)) await once(ffmpeg.stdin, 'drain');
  }
  ffmpeg.stdin.end();
  const [code] = (await done) as [number];
  if (code !== 0) throw new Error(`ffmpeg ended with ${code}`);
}

const names = process.argv.slice(2);
const stories = [HARVEST_MOUSE, KETTLE_HOLDER].filter((story) => names.length === 0 || names.includes(story.name));
const browser = await chromium.launch({ executablePath: '/usr/bin/chromium', args: ['--no-sandbox', '--disable-gpu'] });
const page = await browser.newPage({ viewport: { width: 640, height: 360 } });
await page.setContent(`<style>body { margin: 0 } ${FACES}</style>`);
const folder = mkdtempSync(path.join(tmpdir(), 'film-'));
for (const story of stories) {
  const { wav, times } = speak(story, folder);
  writeTranscript(story, times);
  await writeClip(page, story, times, wav);
}
rmSync(folder, { recursive: true });
await browser.close();
