// Builds what changed: the server with esbuild, the pages with Vite. Also run by itself: `npm run build`.
import { spawnSync } from 'node:child_process';
import { createHash } from 'node:crypto';
import { existsSync, mkdirSync, readdirSync, readFileSync, rmSync, statSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { fileURLToPath, pathToFileURL } from 'node:url';

export const ROOT = path.resolve(path.dirname(fileURLToPath(import.meta.url)), '../..');
const DIST = path.join(ROOT, 'dist');

/** Entry points of the server's processes. */
const ENTRIES = {
  server: 'api/server.ts',
  worker: 'api/worker.ts',
  migrate: 'migrations/run.ts',
  seed: 'seeds/run.ts',
  'storage-fake': 'storage-fake/run.ts',
  mailbox: 'api/local/run-mailbox.ts',
};

function* filesIn(place) {
  const full = path.join(ROOT, place);
  if (!existsSync(full)) return;
  if (statSync(full).isFile()) yield place;
  else for (const name of readdirSync(full).sort()) yield* filesIn(path.join(place, name));
}

/** @param {string[]} places files and folders of the project @returns {string} a hash of all that is in them */
export function hashOf(places) {
  const hash = createHash('sha256');
  for (const place of places) {
    for (const file of filesIn(place)) hash.update(`${file}\n`).update(readFileSync(path.join(ROOT, file)));
  }
  return hash.digest('hex');
}

/** Runs `work` unless what is in `places` was built already. @returns {Promise<boolean>} whether there was work */
async function unlessBuilt(name, places, work) {
  const mark = path.join(DIST, `${name}.hash`);
  const hash = hashOf([...places, 'package-lock.json', 'tsconfig.base.json', 'api/local/build.mjs']);
  if (existsSync(mark) && readFileSync(mark, 'utf8') === hash) return false;
  rmSync(mark, { force: true });
  await work();
  mkdirSync(DIST, { recursive: true });
  writeFileSync(mark, hash);
  return true;
}

/** @returns {Promise<boolean>} whether anything was built */
export function buildServer() {
  return unlessBuilt('server', ['api', 'migrations', 'seeds', 'storage-fake'], async () => {
    const { build, stop } = await import('esbuild');
    const options = {
      bundle: true,
      platform: 'node',
      target: 'node20',
      format: 'esm',
      packages: 'external',
      absWorkingDir: ROOT,
      sourcemap: true,
      logLevel: 'warning',
    };
    rmSync(path.join(DIST, 'server'), { recursive: true, force: true });
    rmSync(path.join(DIST, 'migrations'), { recursive: true, force: true });
    await build({ ...options, entryPoints: ENTRIES, splitting: true, outdir: 'dist/server' });
    const migrations = readdirSync(path.join(ROOT, 'migrations')).filter((file) => /^\d{14}_.*\.ts$/.test(file));
    await build({ ...options, entryPoints: migrations.map((file) => `migrations/${file}`), outdir: 'dist/migrations' });
    await stop();
  });
}

/** @returns {Promise<boolean>} whether anything was built */
export function buildWeb() {
  return unlessBuilt('web', ['web', 'api/crochet', 'api/contract', 'vite.config.ts', 'package.json'], () => {
    const vite = path.join(ROOT, 'node_modules/vite/bin/vite.js');
    const done = spawnSync(process.execPath, [vite, 'build'], { cwd: ROOT, encoding: 'utf8' });
    if (done.status !== 0) throw new Error(`the pages could not be built\n${done.stdout}\n${done.stderr}`);
  });
}

if (import.meta.url === pathToFileURL(process.argv[1] ?? '').href) {
  console.log((await buildServer()) ? 'server built' : 'server unchanged');
  console.log((await buildWeb()) ? 'pages built' : 'pages unchanged');
}
