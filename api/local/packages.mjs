// Installs the project's packages when they are missing or the lock has changed. Plain Node.
import { spawnSync } from 'node:child_process';
import { createHash } from 'node:crypto';
import { existsSync, readFileSync, statSync, writeFileSync } from 'node:fs';
import path from 'node:path';

const OLDEST_NODE = [20, 19];

/** Says why this Node cannot be used, or null. @returns {string | null} */
export function wrongNode() {
  const [major = 0, minor = 0] = process.versions.node.split('.').map(Number);
  const [wantedMajor = 0, wantedMinor = 0] = OLDEST_NODE;
  const fits = major > wantedMajor || (major === wantedMajor && minor >= wantedMinor);
  return fits ? null : `Node ${OLDEST_NODE.join('.')} or newer is needed; this is ${process.versions.node}.`;
}

/**
 * @param {string} root
 * @param {() => void} [onInstall] called before anything is installed: it takes a while
 * @returns {boolean} whether packages were installed now
 */
export function installNodePackages(root, onInstall) {
  const lock = path.join(root, 'package-lock.json');
  const installed = path.join(root, 'node_modules/.package-lock.json');
  const mark = path.join(root, 'node_modules/.roundelay-lock');
  const hash = createHash('sha256').update(readFileSync(lock)).digest('hex');
  if (existsSync(mark) && readFileSync(mark, 'utf8') === hash) return false;
  // Somebody who installed by hand after the lock was written has done it already.
  const byHand = !existsSync(mark) && existsSync(installed) && statSync(installed).mtimeMs >= statSync(lock).mtimeMs;
  if (!byHand) {
    onInstall?.();
    const done = spawnSync('npm', ['ci', '--no-audit', '--no-fund', '--loglevel=error'], {
      cwd: root,
      stdio: ['ignore', 'ignore', 'inherit'],
    });
    if (done.status !== 0) throw new Error('the packages could not be installed (npm ci)');
  }
  writeFileSync(mark, hash);
  return !byHand;
}
