import { createHash } from 'node:crypto';
import { readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import tailwindcss from '@tailwindcss/vite';
import react from '@vitejs/plugin-react';
import { type Plugin } from 'vite';
import { defineConfig } from 'vitest/config';

/** Absolute: building looks from the project's folder, developing from `web`. */
const here = (file: string) => fileURLToPath(new URL(file, import.meta.url));

/** Brings up the database, storage and mailbox that tests share. */
const HOUSE = ['tests/support/house.ts'];

type Kind = readonly [name: string, testTimeoutMs: number, extra?: Readonly<Record<string, unknown>>];

const KINDS: readonly Kind[] = [
  ['crochet', 20_000],
  ['outside', 20_000],
  ['architecture', 30_000],
  ['web', 10_000, { environment: 'jsdom', setupFiles: ['tests/support/quiet-console.ts'] }],
  ['migrations', 60_000, { globalSetup: HOUSE }],
  ['api', 20_000, { globalSetup: HOUSE }],
  ['browser', 120_000, { globalSetup: HOUSE, fileParallelism: false, expect: { poll: { timeout: 15_000 } } }],
];

/**
 * One vitest project a kind of test; a test that hangs is cut, and none asserts speed. They run one after the other in
 * this order, so that browsers do not compete with databases.
 */
const project = ([name, testTimeout, extra = {}]: Kind, groupOrder: number) => ({
  extends: true as const,
  test: {
    name,
    root: '.',
    include: [`tests/${name}/**/*.test.{ts,tsx}`],
    testTimeout,
    hookTimeout: Math.max(testTimeout, 60_000),
    execArgv: ['--import', 'tsx'],
    sequence: { groupOrder },
    ...extra,
  },
});

const OFFLINE = 'count-offline.js';
/** Files of `web/public` that the count page names. */
const PUBLIC_FILES = ['light.js', 'mark.svg'];

/**
 * Tells the count page's service worker which files the page is made of: everything that the page names, and what those
 * files name in turn. Its hash is that of their contents, so that a change of any is a new version.
 */
const countFiles = (): Plugin => ({
  name: 'count-files',
  apply: 'build',
  enforce: 'post',
  generateBundle: {
    order: 'post',
    handler(_options, bundle) {
      const worker = bundle[OFFLINE];
      const page = bundle['count.html'];
      if (worker?.type !== 'chunk' || page?.type !== 'asset') throw new Error('the count page is not in the build');
      const sourceOf = (name: string) => {
        const file = bundle[name]!;
        return Buffer.from(file.type === 'chunk' ? file.code : file.source);
      };
      const files = new Set(['count.html']);
      for (const name of files) {
        const source = sourceOf(name).toString('latin1');
        for (const other of Object.keys(bundle)) {
          if (other.startsWith('assets/') && source.includes(other.slice('assets/'.length))) files.add(other);
        }
      }
      const hash = createHash('sha256');
      for (const name of [...files].sort()) hash.update(name).update(sourceOf(name));
      for (const name of PUBLIC_FILES) hash.update(readFileSync(here(`web/public/${name}`)));
      const names = [...files, ...PUBLIC_FILES].map((name) => (name === 'count.html' ? '/count' : `/${name}`));
      worker.code = worker.code
        .replace('__COUNT_FILES__', names.join(' '))
        .replace('__COUNT_HASH__', hash.digest('hex').slice(0, 16));
    },
  },
});

export default defineConfig({
  root: 'web',
  plugins: [react(), tailwindcss(), countFiles()],
  build: {
    outDir: '../dist/web',
    emptyOutDir: true,
    manifest: true,
    rolldownOptions: {
      input: {
        app: here('web/index.html'),
        watch: here('web/watch/main.tsx'),
        count: here('web/count.html'),
        'count-offline': here('web/count/offline/count-offline.ts'),
      },
      output: {
        // A service worker is known by its address, which must stay.
        entryFileNames: (chunk) => (chunk.name === 'count-offline' ? OFFLINE : 'assets/[name]-[hash].js'),
      },
    },
  },
  test: {
    root: '.',
    projects: KINDS.map(project),
  },
});
