import { fileURLToPath } from 'node:url';
import tailwindcss from '@tailwindcss/vite';
import react from '@vitejs/plugin-react';
import { defineConfig } from 'vitest/config';

/** Absolute: building looks from the project's folder, developing from `web`. */
const here = (file: string) => fileURLToPath(new URL(file, import.meta.url));

/** Brings up the database, storage and mailbox that tests share. */
const HOUSE = ['tests/support/house.ts'];

/** One vitest project a kind of test; a test that hangs is cut, and none asserts speed. */
const project = (name: string, testTimeout: number, extra: Record<string, unknown> = {}) => ({
  extends: true as const,
  test: {
    name,
    root: '.',
    include: [`tests/${name}/**/*.test.{ts,tsx}`],
    testTimeout,
    hookTimeout: Math.max(testTimeout, 60_000),
    execArgv: ['--import', 'tsx'],
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
    projects: [
      project('crochet', 20_000),
      project('outside', 20_000),
      project('architecture', 30_000),
      project('web', 10_000, { environment: 'jsdom', setupFiles: ['tests/support/quiet-console.ts'] }),
      project('migrations', 60_000, { globalSetup: HOUSE }),
      project('api', 20_000, { globalSetup: HOUSE, maxWorkers: 2 }),
      project('browser', 120_000, {
        globalSetup: HOUSE,
        fileParallelism: false,
        expect: { poll: { timeout: 15_000 } },
      }),
    ],
  },
});
