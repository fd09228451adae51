import { existsSync, mkdirSync, readdirSync, rmSync } from 'node:fs';
import path from 'node:path';
import type { TestProject } from 'vitest/node';
import { readEnv } from '../../api/env.ts';
import { startMailbox } from '../../api/local/mailbox.ts';
import { anyFreePort } from '../../api/local/ports.mjs';
import {
  createDatabase,
  databaseUrl,
  openCluster,
  removeCluster,
  startCluster,
  type Cluster,
} from '../../api/local/postgres.mjs';
import { openLog } from '../../api/platform/log.ts';
import { migrate } from '../../api/platform/migrations.ts';
import { PROJECT_ROOT } from '../../api/platform/project-root.ts';
import { startStorageFake } from '../../storage-fake/server.ts';

/** Where the services of this test run are; every test file gets it by `inject('house')`. */
export interface HouseAddress {
  readonly cluster: Cluster;
  /** Migrated and empty; cloned for each test file. */
  readonly template: string;
  readonly s3: { readonly endpoint: string; readonly accessKey: string; readonly secretKey: string };
  readonly smtpUrl: string;
  readonly mailboxUrl: string;
}

declare module 'vitest' {
  export interface ProvidedContext {
    house: HouseAddress;
  }
}

interface House {
  readonly address: HouseAddress;
  close(): Promise<void>;
}

const HOUSES = path.join(PROJECT_ROOT, '.test');
const clusterIn = (house: string) => ({ dir: path.join(house, 'pg') });

/** A run that was killed leaves its cluster running; nobody else knows of it. */
function clearAbandoned(): void {
  for (const pid of existsSync(HOUSES) ? readdirSync(HOUSES) : []) {
    if (!/^\d+$/.test(pid) || existsSync(`/proc/${pid}`)) continue;
    removeCluster(clusterIn(path.join(HOUSES, pid)));
    rmSync(path.join(HOUSES, pid), { recursive: true, force: true });
  }
}

async function openHouse(): Promise<House> {
  clearAbandoned();
  const dir = path.join(HOUSES, String(process.pid));
  mkdirSync(dir, { recursive: true });
  const cluster = openCluster({ ...clusterIn(dir), port: await anyFreePort(), test: true });
  startCluster(cluster);
  const template = 'empty_house';
  createDatabase(cluster, template);
  await migrate({ url: databaseUrl(cluster, template), pool: 4 }, openLog({ logLevel: 'error' }));

  const keys = { accessKey: 'test-key', secretKey: 'test-secret-key' };
  const storage = await startStorageFake({ port: 0, dir: path.join(dir, 's3'), ...keys });
  const mailbox = await startMailbox({ smtp: 0, page: 0 });
  return {
    address: {
      cluster,
      template,
      s3: { endpoint: `http://127.0.0.1:${storage.port}`, ...keys },
      smtpUrl: `smtp://127.0.0.1:${mailbox.smtpPort}`,
      mailboxUrl: `http://127.0.0.1:${mailbox.pagePort}`,
    },
    async close() {
      await mailbox.close();
      await storage.close();
      removeCluster(clusterIn(dir));
      rmSync(dir, { recursive: true, force: true });
    },
  };
}

/** Vitest loads this file once for each project; the house is one for all of them. */
const shared = globalThis as { roundelayHouse?: { opened: Promise<House>; guests: number } };

/** Global setup of every project that needs a database: own cluster, storage and mailbox, on ports of their own. */
export default async function setup(project: TestProject): Promise<() => Promise<void>> {
  readEnv();
  const house = (shared.roundelayHouse ??= { opened: openHouse(), guests: 0 });
  house.guests += 1;
  const opened = await house.opened;
  project.provide('house', opened.address);
  return async () => {
    house.guests -= 1;
    if (house.guests > 0) return;
    delete shared.roundelayHouse;
    await opened.close();
  };
}
