import { mkdir } from 'node:fs/promises';
import S3rver from 's3rver';
import accounts from 's3rver/lib/models/account.js';
import { readBody } from './body.ts';
import { operations } from './operations.ts';
import { checkSignature } from './signature.ts';
import { mendStore } from './store.ts';

/** After the logger and the writer of XML: what the fixes answer is written the same way. */
const BEFORE_ROUTES = 2;

export interface StorageFake {
  readonly port: number;
  close(): Promise<void>;
}

/**
 * Starts a stand-in for S3 on 127.0.0.1 that keeps its objects in a folder. It knows one key pair and refuses
 * everything that is not signed with it, so that a mistake in signing shows here and not first in production.
 * @param port 0 lets the system choose
 */
export async function startStorageFake(options: {
  readonly port: number;
  readonly dir: string;
  readonly accessKey: string;
  readonly secretKey: string;
}): Promise<StorageFake> {
  await mkdir(options.dir, { recursive: true });
  accounts.DUMMY_ACCOUNT.createKeyPair(options.accessKey, options.secretKey);
  const fake = new S3rver({
    address: '127.0.0.1',
    port: options.port,
    directory: options.dir,
    silent: true,
    vhostBuckets: false,
  });
  mendStore(fake.store);
  fake.middleware.splice(
    BEFORE_ROUTES,
    0,
    checkSignature(options.accessKey, options.secretKey),
    readBody,
    ...operations,
  );
  // Refusals and callers that go away are answered or dropped by themselves; Koa would print each of them.
  fake.on('error', () => undefined);
  const { port } = await fake.run();
  fake.httpServer.requestTimeout = 0;
  return {
    port,
    async close() {
      const closed = fake.close();
      fake.httpServer.closeAllConnections();
      await closed;
    },
  };
}
