// Child processes of the starter: each with its log, each stopped in order. Plain Node.
import { spawn } from 'node:child_process';
import { closeSync, existsSync, openSync, renameSync, rmSync } from 'node:fs';
import path from 'node:path';

/**
 * @typedef {{ name: string, child: import('node:child_process').ChildProcess, ended: Promise<number> }} Running
 */

/**
 * Starts a process in a group of its own, so that Ctrl-C reaches only the starter, and waits until it says that it
 * listens. It ends by itself when the starter is gone. Its output goes to a log file; the last start's is kept.
 * @param {{ name: string, args: string[], env: Record<string, string | undefined>, cwd: string, logDir: string }} what
 * @returns {Promise<Running>}
 */
export async function startProcess({ name, args, env, cwd, logDir }) {
  const logFile = path.join(logDir, `${name}.log`);
  if (existsSync(logFile)) renameSync(logFile, `${logFile}.old`);
  const log = openSync(logFile, 'a');
  const child = spawn(process.execPath, args, { cwd, env, detached: true, stdio: ['ignore', log, log, 'ipc'] });
  closeSync(log);
  const ended = new Promise((resolve) => {
    child.once('exit', (code, signal) => resolve(code ?? (signal ? 128 : 1)));
    child.once('error', () => resolve(1));
  });
  const listening = new Promise((resolve) => {
    child.on('message', (message) => {
      if (message === 'listening') resolve(true);
    });
  });
  const started = await Promise.race([listening, ended.then(() => false)]);
  if (!started) throw new Error(`${name} did not start; see ${logFile}`);
  return { name, child, ended };
}

/**
 * Runs a process to its end.
 * @param {{ name: string, args: string[], env: Record<string, string | undefined>, cwd: string, logDir: string }} what
 * @returns {Promise<unknown[]>} what it sent
 */
export async function runProcess({ name, args, env, cwd, logDir }) {
  const logFile = path.join(logDir, `${name}.log`);
  rmSync(logFile, { force: true });
  const log = openSync(logFile, 'a');
  const child = spawn(process.execPath, args, { cwd, env, stdio: ['ignore', log, log, 'ipc'] });
  closeSync(log);
  /** @type {unknown[]} */
  const sent = [];
  child.on('message', (message) => sent.push(message));
  const code = await new Promise((resolve) => child.once('exit', (exit) => resolve(exit ?? 1)));
  if (code !== 0) throw new Error(`${name} failed; see ${logFile}`);
  return sent;
}

/**
 * Asks a process to end and waits; one that does not end in `withinMs` is ended by force.
 * @param {Running} running
 * @param {number} withinMs
 */
export async function stopProcess({ child, ended }, withinMs) {
  if (child.exitCode === null && child.signalCode === null) child.kill('SIGTERM');
  const timer = setTimeout(() => child.kill('SIGKILL'), withinMs);
  await ended;
  clearTimeout(timer);
}
