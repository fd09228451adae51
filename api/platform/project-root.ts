import { existsSync } from 'node:fs';
import path from 'node:path';
import { fileURLToPath } from 'node:url';

function findRoot(from: string): string {
  if (existsSync(path.join(from, 'package.json'))) return from;
  const up = path.dirname(from);
  if (up === from) throw new Error('there is no package.json above this file');
  return findRoot(up);
}

/** The project's folder, the same from the sources and from a bundle in `dist/`. */
export const PROJECT_ROOT = findRoot(path.dirname(fileURLToPath(import.meta.url)));
