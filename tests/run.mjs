// `npm test` on a bare clone: installs what is missing, runs every check and every test, and closes with one line:
// `N passed, N failed`. Plain Node until the packages are in.
import { spawnSync } from 'node:child_process';
import { existsSync, mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { buildServer, buildWeb, ROOT } from '../api/local/build.mjs';
import { installNodePackages, wrongNode } from '../api/local/packages.mjs';
import { findPrograms, installPackages } from '../api/local/postgres.mjs';

/** Debian's package for each program that the tests use. */
const PROGRAMS = {
  '/usr/bin/chromium': 'chromium',
  '/usr/bin/ffmpeg': 'ffmpeg',
  '/usr/bin/pdftotext': 'poppler-utils',
  '/usr/bin/qpdf': 'qpdf',
  '/usr/bin/zbarimg': 'zbar-tools',
  '/usr/bin/espeak-ng': 'espeak-ng',
  '/usr/share/fonts/truetype/dejavu/DejaVuSans.ttf': 'fonts-dejavu-core',
};
/** What the static checks run; each counts as one. */
const CHECKS = { types: 'types', lint: 'lint', 'dead code': 'dead' };
/** An awkward zone: whoever takes local time for UTC is found out. */
const TEST_ENV = { ...process.env, TZ: 'Pacific/Apia', CI: '1', NODE_ENV: 'test' };

const seconds = (from) => `${((performance.now() - from) / 1_000).toFixed(0)} s`;
const tally = { passed: 0, failed: 0 };

function count(what, ok, from, output = '') {
  tally[ok ? 'passed' : 'failed'] += 1;
  console.log(`${ok ? '✓' : '✗'} ${what} (${seconds(from)})`);
  if (!ok && output) console.log(output);
}

/** Runs one check; it passes or fails as a whole. */
async function check(what, work) {
  const from = performance.now();
  try {
    await work();
    count(what, true, from);
    return true;
  } catch (err) {
    count(what, false, from, err instanceof Error ? err.message : String(err));
    return false;
  }
}

function runScript(script) {
  const done = spawnSync('npm', ['run', '--silent', script], { cwd: ROOT, env: TEST_ENV, encoding: 'utf8' });
  if (done.status !== 0) throw new Error(`${done.stdout}${done.stderr}`.trim());
}

function installPrograms() {
  const missing = Object.entries(PROGRAMS).flatMap(([file, name]) => (existsSync(file) ? [] : [name]));
  if (findPrograms() === null) missing.unshift('postgresql');
  if (missing.length === 0) return;
  if (!installPackages(missing, (line) => console.log(line))) throw new Error(`missing: ${missing.join(', ')}`);
}

/** Every test of every project; each counts as one, and so does a file that could not be read or set up. */
function runTests() {
  const from = performance.now();
  const dir = mkdtempSync(path.join(tmpdir(), 'roundelay-tests-'));
  const report = path.join(dir, 'report.json');
  const vitest = path.join(ROOT, 'node_modules/vitest/vitest.mjs');
  const args = [vitest, 'run', '--reporter=default', '--reporter=json', `--outputFile.json=${report}`];
  const done = spawnSync(process.execPath, args, { cwd: ROOT, env: TEST_ENV, stdio: ['ignore', 'inherit', 'inherit'] });
  const read = existsSync(report) ? JSON.parse(readFileSync(report, 'utf8')) : null;
  rmSync(dir, { recursive: true, force: true });
  if (read === null) {
    count('tests', false, from, 'the tests did not run to their end');
    return;
  }
  const broken = read.testResults.filter(
    (file) => file.status === 'failed' && !file.assertionResults.some((each) => each.status === 'failed'),
  );
  tally.passed += read.numPassedTests;
  tally.failed += read.numFailedTests + broken.length;
  // An unhandled rejection fails the run without failing any one test.
  const unsaid = done.status !== 0 && read.numFailedTests + broken.length === 0;
  count('tests run to their end without an unhandled error', !unsaid, from);
}

async function main() {
  const wrong = wrongNode();
  if (wrong) throw new Error(wrong);
  const ready =
    (await check('packages', () => installNodePackages(ROOT))) && (await check('programs', () => installPrograms()));
  if (!ready) return;
  const built = await check('build', async () => {
    await buildServer();
    await buildWeb();
  });
  for (const [what, script] of Object.entries(CHECKS)) await check(what, () => runScript(script));
  if (built) runTests();
}

const from = performance.now();
try {
  await main();
} catch (err) {
  count('start', false, from, err instanceof Error ? err.message : String(err));
}
console.log(`\n${seconds(from)}`);
console.log(`${tally.passed} passed, ${tally.failed} failed`);
process.exitCode = tally.failed > 0 ? 1 : 0;
