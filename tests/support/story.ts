import { spawn, type ChildProcess } from 'node:child_process';
import { randomUUID } from 'node:crypto';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { inject, vi } from 'vitest';
import { anyFreePort } from '../../api/local/ports.mjs';
import { PROJECT_ROOT } from '../../api/platform/project-root.ts';
import { testVariables } from './app.ts';
import { filmClip, padFilm } from './clips.ts';
import { cloneDatabase, type ScratchDatabase } from './database.ts';

export interface BuiltServer {
  readonly url: string;
  readonly db: ScratchDatabase['db'];
  close(): Promise<void>;
}

/** Starts the built application as a process of its own: server, pages and worker, on its own database and bucket. */
export async function startBuiltServer(): Promise<BuiltServer> {
  const scratch = await cloneDatabase();
  const port = await anyFreePort();
  const url = `http://127.0.0.1:${port}`;
  const more = { ROUNDELAY_PORT: String(port), ROUNDELAY_PUBLIC_URL: url, ROUNDELAY_LOG_LEVEL: 'warn' };
  const child: ChildProcess = spawn(process.execPath, ['dist/server/server.js'], {
    cwd: PROJECT_ROOT,
    env: { ...process.env, ...testVariables(scratch.url, `t-${randomUUID()}`, more) },
    stdio: ['ignore', 'inherit', 'inherit'],
  });
  const ended = new Promise<void>((resolve) => child.once('exit', () => resolve()));
  const isReady = () =>
    fetch(`${url}/health/ready`).then(
      (answer) => answer.ok,
      () => false,
    );
  await vi.waitUntil(isReady, { timeout: 30_000, interval: 200 });
  return {
    url,
    db: scratch.db,
    async close() {
      child.kill('SIGTERM');
      await ended;
      await scratch.drop();
    },
  };
}

interface ListedMail {
  readonly to: string | readonly string[];
  readonly text: string;
}

/** The first link in the newest letter to an address, once it has come. */
export async function linkFromLetter(address: string): Promise<string> {
  const { mailboxUrl } = inject('house');
  const look = async () => {
    const mails = (await (await fetch(`${mailboxUrl}/mails.json`)).json()) as ListedMail[];
    const letter = mails.findLast(({ to }) => String(to).includes(address));
    return letter && /https?:\/\/\S+/.exec(letter.text)?.[0];
  };
  return vi.waitUntil(look, { timeout: 20_000, interval: 200 });
}

export interface StoryFiles {
  /** A playable film of 90 seconds, `bytes` long. */
  readonly clip: string;
  readonly transcript: string;
  remove(): void;
}

/** Writes the two files that a maker would choose from their disk. */
export function writeStoryFiles(transcript: string, bytes: number): StoryFiles {
  const dir = mkdtempSync(path.join(tmpdir(), 'roundelay-story-'));
  const files = { clip: path.join(dir, 'seed-pear.mp4'), transcript: path.join(dir, 'seed-pear.srt') };
  writeFileSync(files.clip, padFilm(filmClip('mp4', 90), bytes));
  writeFileSync(files.transcript, transcript);
  return { ...files, remove: () => rmSync(dir, { recursive: true, force: true }) };
}
