import { afterAll, beforeAll } from 'vitest';
import { buildApp, type TestApp } from '../../support/app.ts';
import { buildHouse, type Household } from '../../support/builders.ts';
import { talkTo } from './talk.ts';

/** What the tests of a file ask, and the people who do. There from the first test on. */
export interface Home {
  readonly server: TestApp;
  /** A studio with an owner, a creator and an editor. */
  readonly house: Household;
  readonly call: ReturnType<typeof talkTo>;
}

/** A server on a database of its own and a studio in it, brought up before the tests of a file and taken down after. */
export function settleIn(): Home {
  let server: TestApp;
  let house: Household;
  beforeAll(async () => {
    server = await buildApp();
    house = await buildHouse(server.db);
  });
  afterAll(() => server.close());
  return {
    get server() {
      return server;
    },
    get house() {
      return house;
    },
    call: (...args) => talkTo(server)(...args),
  };
}
