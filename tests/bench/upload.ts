import { spawn, type ChildProcess } from 'node:child_process';
import { createHash, randomBytes } from 'node:crypto';
import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { Agent, request as httpRequest } from 'node:http';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { pathToFileURL } from 'node:url';
import { createSession, SESSION_COOKIE } from '../../api/http/session.ts';
import { anyFreePort } from '../../api/local/ports.mjs';
import { createDatabase, databaseUrl, openCluster, removeCluster, startCluster } from '../../api/local/postgres.mjs';
import { readEnv } from '../../api/env.ts';
import { openDatabase } from '../../api/platform/database.ts';
import { openLog } from '../../api/platform/log.ts';
import { migrate } from '../../api/platform/migrations.ts';
import { PROJECT_ROOT } from '../../api/platform/project-root.ts';
import { openStorage } from '../../api/platform/storage.ts';
import { addMember, buildHouse, buildPattern, buildPerson, buildRecording } from '../support/builders.ts';
import { clipFactsOf, filmClip, padFilm, partOf, sha256 } from '../support/clips.ts';

/**
 * How fast a clip goes up through the API, against the bare S3 client in the same run, and how much memory the server
 * takes while three people send at once. Run by hand: `npm run bench`, or `node --import tsx tests/bench/upload.ts`.
 */

const MEGABYTE = 1_000_000;
const BYTES = 500 * MEGABYTE;
const AT_ONCE = 3;
const KEYS = { accessKey: 'bench-key', secretKey: 'bench-secret-key' };

export interface BenchRow {
  readonly what: string;
  readonly measured: string;
  readonly goal: string;
  readonly isMet: boolean;
}

function startProcess(file: string, env: Record<string, string>, more: readonly string[] = []): ChildProcess {
  const args = ['--openssl-legacy-provider', '--import', 'tsx', path.join(PROJECT_ROOT, file), ...more];
  return spawn(process.execPath, args, {
    cwd: PROJECT_ROOT,
    env: { ...process.env, ...env },
    stdio: ['ignore', 'ignore', 'inherit'],
  });
}

async function waitFor(url: string): Promise<void> {
  for (let tries = 0; tries < 200; tries += 1) {
    if (
      await fetch(url).then(
        () => true,
        () => false,
      )
    )
      return;
    await new Promise((wait) => setTimeout(wait, 100));
  }
  throw new Error(`${url} does not answer`);
}

const residentMb = (pid: number) =>
  Number(/VmRSS:\s+(\d+)/.exec(readFileSync(`/proc/${pid}/status`, 'utf8'))?.[1] ?? 0) / 1_000;

/** Processor time a process has used, in seconds; the system counts in hundredths. */
function processorSeconds(pid: number): number {
  const fields = readFileSync(`/proc/${pid}/stat`, 'utf8').split(') ')[1]?.split(' ') ?? [];
  return (Number(fields[11]) + Number(fields[12])) / 100;
}

/** Does every piece of work, so many at a time. */
async function inParallel(count: number, atOnce: number, work: (n: number) => Promise<void>): Promise<void> {
  let next = 1;
  const worker = async () => {
    while (next <= count) {
      const n = next;
      next += 1;
      await work(n);
    }
  };
  await Promise.all(Array.from({ length: atOnce }, worker));
}

interface Sender {
  readonly cookie: string;
  readonly recordingId: string;
  readonly agent: Agent;
}

/** One request over a kept connection, as cheap as it can be: what is measured is the server, not its caller. */
function call(
  base: string,
  sender: Sender,
  method: string,
  url: string,
  body: readonly Buffer[],
  type = 'application/json',
): Promise<Record<string, unknown>> {
  return new Promise((resolve, reject) => {
    const length = body.reduce((sum, chunk) => sum + chunk.length, 0);
    const headers = {
      Cookie: sender.cookie,
      'Sec-Fetch-Site': 'same-origin',
      'Content-Type': type,
      'Content-Length': length,
    };
    const asked = httpRequest(`${base}${url}`, { method, headers, agent: sender.agent }, (answer) => {
      const chunks: Buffer[] = [];
      answer.on('data', (chunk: Buffer) => chunks.push(chunk));
      answer.on('end', () => {
        const text = Buffer.concat(chunks).toString();
        if ((answer.statusCode ?? 500) >= 300) reject(new Error(`${method} ${url}: ${answer.statusCode ?? 0} ${text}`));
        else resolve(JSON.parse(text) as Record<string, unknown>);
      });
    });
    asked.on('error', reject);
    for (const chunk of body) asked.write(chunk);
    asked.end();
  });
}

/** The way up that a browser takes, without the digests, which it works out on its own machine. */
async function sendClip(base: string, sender: Sender, file: Buffer, name: string, digests: Map<number, string>) {
  const facts = Buffer.from(JSON.stringify(clipFactsOf(file, name)));
  const started = await call(base, sender, 'POST', `/api/recordings/${sender.recordingId}/clip`, [facts]);
  const { uploadId, partSize } = started as { uploadId: string; partSize: number };
  const field = (disposition: string) => `--bench\r\nContent-Disposition: form-data; ${disposition}\r\n\r\n`;
  await inParallel(Math.ceil(file.length / partSize), AT_ONCE, async (n) => {
    const bytes = partOf(file, n, partSize);
    if (!digests.has(n)) digests.set(n, sha256(bytes));
    const head = `${field('name="sha256"')}${digests.get(n)!}\r\n${field('name="part"; filename="part"')}`;
    const form = [Buffer.from(head), bytes, Buffer.from('\r\n--bench--\r\n')];
    const type = 'multipart/form-data; boundary=bench';
    await call(base, sender, 'PUT', `/api/uploads/${uploadId}/parts/${n}`, form, type);
  });
  return { uploadId, partSize };
}

const seconds = async (work: () => Promise<unknown>): Promise<number> => {
  const from = performance.now();
  await work();
  return (performance.now() - from) / 1_000;
};

/** Brings up a house of its own, measures, and takes it down again. */
export async function benchUpload(): Promise<readonly BenchRow[]> {
  const dir = mkdtempSync(path.join(tmpdir(), 'roundelay-bench-'));
  const [clusterPort, storagePort, apiPort] = [await anyFreePort(), await anyFreePort(), await anyFreePort()];
  const cluster = openCluster({ dir: path.join(dir, 'pg'), port: clusterPort, test: true });
  startCluster(cluster);
  createDatabase(cluster, 'bench');
  const url = databaseUrl(cluster, 'bench');
  const variables = {
    NODE_ENV: 'test',
    DATABASE_URL: url,
    S3_ENDPOINT: `http://127.0.0.1:${storagePort}`,
    S3_ACCESS_KEY: KEYS.accessKey,
    S3_SECRET_KEY: KEYS.secretKey,
    S3_BUCKET: 'bench',
    ROUNDELAY_PORT: String(apiPort),
    ROUNDELAY_LOG_LEVEL: 'error',
    ROUNDELAY_WORKER: '0',
  };
  const env = readEnv(variables);
  await migrate(env.database, openLog({ logLevel: 'error' }));
  const storageFake = startProcess('storage-fake/run.ts', variables, [path.join(dir, 's3')]);
  const db = openDatabase(env.database);
  const storage = openStorage(env.s3);
  let api: ChildProcess | undefined;
  try {
    await waitFor(`http://127.0.0.1:${storagePort}/`);
    await storage.prepare();
    api = startProcess('api/server.ts', variables);
    const base = `http://127.0.0.1:${apiPort}`;
    await waitFor(`${base}/health/live`);

    const house = await buildHouse(db);
    const pattern = await buildPattern(db, { studio_id: house.studio.id });
    const senders: Sender[] = [];
    for (let n = 0; n < 3; n += 1) {
      const person = await buildPerson(db);
      await addMember(db, house.studio.id, person.id, 'creator');
      const token = await createSession({ db, clock: { now: () => new Date() } }, person.id);
      const { id } = await buildRecording(db, { pattern_id: pattern.id });
      const agent = new Agent({ keepAlive: true, maxSockets: AT_ONCE });
      senders.push({ cookie: `${SESSION_COOKIE}=${token}`, recordingId: id, agent });
    }

    const file = padFilm(filmClip('mp4', 5), BYTES);
    const digests = new Map<number, string>();
    // Once before measuring: compiled code, open connections, warm disk.
    const warm = padFilm(filmClip('mp4', 2), 60 * MEGABYTE);
    const { partSize } = await sendClip(base, senders[0]!, warm, 'warm.mp4', new Map());
    for (let n = 1; n <= Math.ceil(BYTES / partSize); n += 1) digests.set(n, sha256(partOf(file, n, partSize)));

    const bareOnce = async (key: string) => {
      const uploadId = await storage.createMultipart(key, 'video/mp4');
      await inParallel(Math.ceil(BYTES / partSize), AT_ONCE, async (n) => {
        await storage.putPart(key, uploadId, n, partOf(file, n, partSize));
      });
    };
    const pid = api.pid ?? 0;
    const usedBefore = processorSeconds(pid);
    const bare: number[] = [];
    const through: number[] = [];
    for (const n of [1, 2]) {
      bare.push(await seconds(() => bareOnce(createHash('sha256').update(randomBytes(8)).digest('hex'))));
      through.push(await seconds(() => sendClip(base, senders[0]!, file, `clip-${n}.mp4`, digests)));
    }
    const [bareBest, throughBest] = [Math.min(...bare), Math.min(...through)];

    const used = (processorSeconds(pid) - usedBefore) / through.length;
    const before = residentMb(pid);
    let peak = before;
    const watch = setInterval(() => (peak = Math.max(peak, residentMb(pid))), 50);
    await Promise.all(senders.map((sender, n) => sendClip(base, sender, file, `three-${n}.mp4`, digests)));
    clearInterval(watch);

    const ratio = bareBest / throughBest;
    const mb = (s: number) => `${(BYTES / MEGABYTE / s).toFixed(0)} MB/s`;
    return [
      {
        what: '500 MB through the API against the bare S3 client',
        measured: `${ratio.toFixed(2)} (${mb(throughBest)} against ${mb(bareBest)}, parts of ${(partSize / 1_048_576).toFixed(0)} MiB, ${used.toFixed(1)} s of the server’s processor)`,
        goal: 'at least 0.80',
        isMet: ratio >= 0.8,
      },
      {
        what: 'more memory of the server with three people uploading',
        measured: `${(peak - before).toFixed(0)} MB (from ${before.toFixed(0)} to ${peak.toFixed(0)} MB)`,
        goal: 'at most 150 MB',
        isMet: peak - before <= 150,
      },
    ];
  } finally {
    storage.close();
    await db.destroy();
    api?.kill('SIGTERM');
    storageFake.kill('SIGTERM');
    removeCluster(cluster);
    rmSync(dir, { recursive: true, force: true });
  }
}

if (import.meta.url === pathToFileURL(process.argv[1] ?? '').href) {
  for (const row of await benchUpload()) {
    console.log(`${row.isMet ? 'met' : 'NOT MET'}  ${row.what}: ${row.measured}; goal ${row.goal}`);
  }
}
