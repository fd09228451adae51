import { spawnSync } from 'node:child_process';
import { readdirSync } from 'node:fs';
import path from 'node:path';

/**
 * `npm run bench [-- NAME…]`: runs the benchmarks beside this file one after the other, each in a process of its own,
 * so that none warms the next one up. Figures are for a person to read; nothing is asserted.
 */
const here = import.meta.dirname;
const asked = process.argv.slice(2);
const all = readdirSync(here)
  .filter((file) => file.endsWith('.ts') && !['run.ts', 'storage-process.ts'].includes(file))
  .map((file) => path.basename(file, '.ts'))
  .sort();
const unknown = asked.filter((name) => !all.includes(name));
if (unknown.length > 0) {
  console.error(`There is no benchmark ${unknown.join(', ')}. There are: ${all.join(', ')}.`);
  process.exit(2);
}
for (const name of asked.length > 0 ? asked : all) {
  console.log(`\n${name}`);
  const run = spawnSync(process.execPath, ['--import', 'tsx', path.join(here, `${name}.ts`)], { stdio: 'inherit' });
  if (run.status !== 0) process.exitCode = 1;
}
