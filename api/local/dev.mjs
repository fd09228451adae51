// What `npm run dev` adds: Vite's hot reload in front, and a new server when its sources change.
import { watch } from 'node:fs';
import { createServer } from 'node:http';
import path from 'node:path';
import { buildServer, ROOT } from './build.mjs';

const QUIET_MS = 150;

/**
 * Vite serves the pages on `webPort` and hands everything else on to the server. It is put into a server of our own,
 * since its own ends the whole process at the first SIGTERM.
 * @param {{ webPort: number, apiPort: number }} ports
 */
export async function startVite({ webPort, apiPort }) {
  const vite = await import('vite');
  const front = createServer();
  const toServer = { target: `http://127.0.0.1:${apiPort}`, changeOrigin: false };
  const pages = await vite.createServer({
    configFile: path.join(ROOT, 'vite.config.ts'),
    logLevel: 'warn',
    server: {
      middlewareMode: true,
      hmr: { server: front },
      proxy: { '/api': toServer, '/health': toServer, '^/w/': toServer },
    },
  });
  front.on('request', pages.middlewares);
  await new Promise((resolve) => front.listen(webPort, '127.0.0.1', () => resolve(undefined)));
  return {
    async close() {
      await pages.close();
      front.close();
      front.closeAllConnections();
    },
  };
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
