// `npm start` and `npm run dev`: everything Roundelay needs, on this machine alone. Plain Node until the packages are in.
import { existsSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { buildServer, buildWeb, hashOf, ROOT } from './build.mjs';
import { startVite, watchServer } from './dev.mjs';
import { installNodePackages, wrongNode } from './packages.mjs';
import { nextFreePort } from './ports.mjs';
import {
  createDatabase,
  databaseUrl,
  findPrograms,
  installPackages,
  openCluster,
  runningPort,
  startCluster,
  stopCluster,
} from './postgres.mjs';
import { runProcess, startProcess, stopProcess } from './processes.mjs';
import { markRunning, runningStart, unmarkRunning } from './running.mjs';

const DEV = process.argv.includes('--dev');
const DATA = path.join(ROOT, '.data');
const LOGS = path.join(DATA, 'log');
const SEEDED = path.join(DATA, 'seeded.json');
const WANTED = {
  web: Number(process.env.ROUNDELAY_PORT ?? 4300),
  database: 54_320,
  storage: 4568,
  smtp: 2525,
  mailbox: 8025,
  api: 4390,
};
/** The server's own forced end comes first. */
const SERVER_ENDS_MS = 70_000;
const ENDS_MS = 5_000;

const begun = performance.now();
const seconds = (from) => `${((performance.now() - from) / 1_000).toFixed(1)} s`;

/** Does one step and says how long it took, and what came of it. */
async function step(what, work) {
  const from = performance.now();
  const result = await work();
  console.log(`  ${what.padEnd(12)}${seconds(from).padStart(7)}  ${typeof result === 'string' ? result : ''}`);
}

/** What has to be undone at the end, the last first. */
const undo = [];
let ending;

function end(code) {
  ending ??= (async () => {
    console.log('\nStopping …');
    for (const { name, run } of undo.reverse()) {
      try {
        await run();
      } catch (err) {
        console.error(`  ${name}: ${err instanceof Error ? err.message : err}`);
        code = 1;
      }
    }
    console.log('Stopped. Your data are kept in .data/.');
    process.exit(code);
  })();
  return ending;
}

const ports = {};
/** The wanted port or the next free one; a port that is not the wanted one is said. */
async function choosePort(name) {
  const port = await nextFreePort(WANTED[name], new Set(Object.values(ports)));
  ports[name] = port;
  return port;
}
const told = (name, port) => `port ${port}${port === WANTED[name] ? '' : ` (${WANTED[name]} is taken)`}`;

const settings = {};
const child = (name, args) => ({
  name,
  args,
  cwd: ROOT,
  logDir: LOGS,
  env: { ...process.env, ...settings, AWS_SDK_JS_NODE_VERSION_SUPPORT_WARNING_DISABLED: 'true' },
});
const built = (name) => `dist/server/${name}.js`;

/** Starts a process that is there until the end; should it end by itself, everything does. */
async function keep(name, args, withinMs = ENDS_MS) {
  const kept = { running: await startProcess(child(name, args)), restarting: false };
  undo.push({ name, run: () => stopProcess(kept.running, withinMs) });
  const attend = ({ ended }) =>
    void ended.then((code) => {
      if (ending || kept.restarting) return;
      console.error(`\n${name} ended by itself (${code}); see .data/log/${name}.log`);
      void end(1);
    });
  attend(kept.running);
  return async () => {
    kept.restarting = true;
    await stopProcess(kept.running, withinMs);
    kept.running = await startProcess(child(name, args));
    kept.restarting = false;
    attend(kept.running);
  };
}

async function startDatabase() {
  const at = { dir: path.join(DATA, 'pg') };
  const before = runningPort(at);
  const port = before ?? (await choosePort('database'));
  ports.database = port;
  const cluster = openCluster({ ...at, port });
  if (before === null) startCluster(cluster);
  undo.push({ name: 'database', run: () => Promise.resolve(stopCluster(cluster)) });
  createDatabase(cluster, 'roundelay');
  settings.DATABASE_URL = databaseUrl(cluster, 'roundelay');
  return before === null ? told('database', port) : `port ${port}, was running already`;
}

async function startStorage() {
  settings.S3_ENDPOINT = `http://127.0.0.1:${ports.storage}`;
  await keep('storage-fake', [built('storage-fake'), path.join(DATA, 's3')]);
  return told('storage', ports.storage);
}

async function startMailbox() {
  settings.SMTP_URL = `smtp://127.0.0.1:${ports.smtp}`;
  await keep('mailbox', [built('mailbox'), String(ports.smtp), String(ports.mailbox)]);
  return told('mailbox', ports.mailbox);
}

async function migrateTables() {
  await runProcess(child('migrate', [built('migrate'), path.join(ROOT, 'dist/migrations')]));
  return 'up to date';
}

const seeded = () => (existsSync(SEEDED) ? JSON.parse(readFileSync(SEEDED, 'utf8')) : null);

/** The demo goes in once, and again when it was changed itself; it never undoes what people did with it. */
async function seedOnce() {
  const hash = hashOf(['seeds']);
  if (seeded()?.hash === hash) return 'was put in before';
  const sent = await runProcess(child('seed', [built('seed')]));
  const signIns = sent.flatMap((message) => message?.signIns ?? []);
  writeFileSync(SEEDED, JSON.stringify({ hash, signIns }));
  return 'put in';
}

async function startServer() {
  const web = await choosePort('web');
  const address = `http://127.0.0.1:${web}`;
  settings.ROUNDELAY_PUBLIC_URL = address;
  settings.ROUNDELAY_PORT = String(DEV ? await choosePort('api') : web);
  if (DEV) settings.ROUNDELAY_WEB = 'vite';
  markRunning(DATA, address);
  undo.push({ name: 'mark of the start', run: () => Promise.resolve(unmarkRunning(DATA)) });
  const restart = await keep('server', [built('server')], SERVER_ENDS_MS);
  if (DEV) {
    const vite = await startVite({ webPort: web, apiPort: ports.api });
    undo.push({ name: 'vite', run: () => vite.close() });
    const watcher = watchServer(restart);
    undo.push({ name: 'watcher', run: () => Promise.resolve(watcher.close()) });
  }
  return told('web', web);
}

function farewell() {
  const signIns = (seeded()?.signIns ?? []).map(
    ({ name, role, email, password }) => `    ${email}  ${password}   ${name}, ${role}`,
  );
  const lines = [
    '',
    `Roundelay is at    http://127.0.0.1:${ports.web}   (${seconds(begun)})`,
    `Its mail lands at  http://127.0.0.1:${ports.mailbox}`,
    ...(signIns.length > 0 ? ['Sign in to the demo as', ...signIns] : []),
    `Logs are in        .data/log/`,
    'Ctrl-C stops everything; `npm run reset` empties the data.',
    '',
  ];
  console.log(lines.join('\n'));
}

async function main() {
  const wrong = wrongNode();
  if (wrong) throw new Error(wrong);
  const other = runningStart(DATA);
  if (other) throw new Error(`Roundelay is running already, at ${other}`);
  mkdirSync(LOGS, { recursive: true });
  console.log('Starting Roundelay');
  const installing = () => console.log('  packages             installing; this takes a minute or so, once');
  await step('packages', () => (installNodePackages(ROOT, installing) ? 'installed' : 'in place'));
  await step('postgresql', () => {
    if (findPrograms() === null && !installPackages(['postgresql'], (line) => console.log(`  ${line}`))) {
      throw new Error('PostgreSQL is needed');
    }
    return findPrograms() ?? '';
  });
  await step('server', async () => ((await buildServer()) ? 'built' : 'unchanged'));
  if (!DEV) await step('pages', async () => ((await buildWeb()) ? 'built' : 'unchanged'));
  await step('database', startDatabase);
  for (const name of ['storage', 'smtp', 'mailbox']) await choosePort(name);
  await Promise.all([step('storage', startStorage), step('mailbox', startMailbox), step('tables', migrateTables)]);
  await step('demo', seedOnce);
  await step('roundelay', startServer);
  farewell();
}

process.on('SIGINT', () => void end(0));
process.on('SIGTERM', () => void end(0));
try {
  await main();
} catch (err) {
  console.error(`\n${err instanceof Error ? err.message : err}`);
  await end(1);
}
