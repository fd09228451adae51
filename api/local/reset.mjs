// `npm run reset`: empties what `npm start` keeps, after asking.
import { existsSync, rmSync } from 'node:fs';
import path from 'node:path';
import { createInterface } from 'node:readline/promises';
import { ROOT } from './build.mjs';
import { removeCluster } from './postgres.mjs';
import { runningStart } from './running.mjs';

const DATA = path.join(ROOT, '.data');

async function isMeant() {
  if (process.argv.includes('--yes')) return true;
  const ask = createInterface({ input: process.stdin, output: process.stdout });
  const answer = await ask.question('Empty .data/: the database, every clip and the logs? Type "empty" to go on: ');
  ask.close();
  return answer.trim() === 'empty';
}

if (!existsSync(DATA)) console.log('There is nothing to empty.');
else if (runningStart(DATA)) {
  console.error('Roundelay is running. Stop it first (Ctrl-C where it was started).');
  process.exitCode = 1;
} else if (await isMeant()) {
  removeCluster({ dir: path.join(DATA, 'pg') });
  rmSync(DATA, { recursive: true, force: true });
  console.log('Emptied. The next `npm start` begins anew.');
} else console.log('Nothing was changed.');
