import { fileURLToPath } from 'node:url';
import tailwindcss from '@tailwindcss/vite';
import react from '@vitejs/plugin-react';
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

export default defineConfig({
  root: 'web',
  plugins: [react(), tailwindcss()],
  build: {
    outDir: '../dist/web',
    emptyOutDir: true,
    manifest: true,
    rolldownOptions: { input: { app: here('web/index.html'), watch: here('web/watch/main.tsx') } },
  },
  test: {
    root: '.',
    projects: KINDS.map(project),
  },
});
