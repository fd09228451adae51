import { connect, createServer, type AddressInfo, type Socket } from 'node:net';

export interface CuttingProxy {
  readonly port: number;
  /** How often a connection was cut. */
  readonly cuts: number;
  close(): Promise<void>;
}

/**
 * Stands between a browser and the server, and cuts one connection in the middle of what it sends up: with a reset,
 * as a line that breaks does. Everything else goes through as it is.
 * @param cutAfter bytes sent up over all connections together, at which the one that is sending is cut
 */
export async function startCuttingProxy(target: number, cutAfter: number): Promise<CuttingProxy> {
  let sent = 0;
  let cuts = 0;
  const open = new Set<Socket>();
  const server = createServer((near) => {
    const far = connect(target, '127.0.0.1');
    for (const [socket, other] of [
      [near, far],
      [far, near],
    ] as const) {
      open.add(socket);
      socket.on('error', () => other.destroy());
      socket.on('close', () => {
        open.delete(socket);
        other.destroy();
      });
    }
    far.pipe(near);
    near.on('data', (chunk) => {
      sent += chunk.length;
      if (cuts === 0 && sent >= cutAfter) {
        cuts += 1;
        near.resetAndDestroy();
        far.destroy();
        return;
      }
      if (!far.write(chunk)) {
        near.pause();
        far.once('drain', () => near.resume());
      }
    });
  });
  await new Promise<void>((ready) => server.listen(0, '127.0.0.1', ready));
  return {
    port: (server.address() as AddressInfo).port,
    get cuts() {
      return cuts;
    },
    async close() {
      for (const socket of open) socket.destroy();
      await new Promise<void>((closed) => server.close(() => closed()));
    },
  };
}
