// Which start uses the data of this folder. Plain Node.
import { existsSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import path from 'node:path';

const markIn = (data) => path.join(data, 'running.json');

/** @param {string} data @returns {string | null} the address of the start that is running, or null */
export function runningStart(data) {
  if (!existsSync(markIn(data))) return null;
  const { pid, address } = JSON.parse(readFileSync(markIn(data), 'utf8'));
  const command = `/proc/${pid}/cmdline`;
  return existsSync(command) && readFileSync(command, 'utf8').includes('start.mjs') ? address : null;
}

/** @param {string} data @param {string} address */
export function markRunning(data, address) {
  writeFileSync(markIn(data), JSON.stringify({ pid: process.pid, address }));
}

/** @param {string} data */
export function unmarkRunning(data) {
  rmSync(markIn(data), { force: true });
}
