import { readEnv } from '../api/env.ts';
import { startStorageFake } from './server.ts';

/** The storage fake as a process of its own: `run <folder>`; the address and the keys are those of the settings. */
const [, , dir] = process.argv;
if (dir === undefined) throw new Error('say which folder the objects are kept in');
const { s3 } = readEnv();
const fake = await startStorageFake({
  port: Number(new URL(s3.endpoint).port),
  dir,
  accessKey: s3.accessKey,
  secretKey: s3.secretKey,
});
const stop = () => void fake.close().then(() => process.exit(0));
process.on('SIGTERM', stop);
process.on('SIGINT', stop);
// The one who started it is gone.
process.on('disconnect', stop);
process.send?.('listening');
