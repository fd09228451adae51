// What `npm run dev` adds: Vite's hot reload in front, and a new server when its sources change.
import { watch } from 'node:fs';
import path from 'node:path';
import { buildServer, ROOT } from './build.mjs';

const QUIET_MS = 150;

/**
 * Vite serves the pages on `webPort` and hands everything else on to the server.
 * @param {{ webPort: number, apiPort: number }} ports
 */
export async function startVite({ webPort, apiPort }) {
  const { createServer } = await import('vite');
  const toServer = { target: `http://127.0.0.1:${apiPort}`, changeOrigin: false };
  const vite = await createServer({
    configFile: path.join(ROOT, 'vite.config.ts'),
    logLevel: 'warn',
    server: {
      host: '127.0.0.1',
      port: webPort,
      strictPort: true,
      proxy: { '/api': toServer, '/health': toServer, '^/w/': toServer },
    },
  });
  await vite.listen();
  return vite;
}

/**
 * Builds the server anew after a change under api/ and has it started again; a build that fails leaves the old one.
 * @param {() => Promise<void>} restart
 */
export function watchServer(restart) {
  let timer;
  let busy = Promise.resolve();
  const again = async () => {
    try {
      if (await buildServer()) await restart();
    } catch (err) {
      console.error(err instanceof Error ? err.message : err);
    }
  };
  return watch(path.join(ROOT, 'api'), { recursive: true }, () => {
    clearTimeout(timer);
    timer = setTimeout(() => (busy = busy.then(again)), QUIET_MS);
  });
}
