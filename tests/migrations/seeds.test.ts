import { expect, test } from 'vitest';
import { seed } from '../../seeds/index.ts';
import { buildApp, type TestApp } from '../support/app.ts';

async function counts({ db, deps }: TestApp): Promise<Record<string, number>> {
  const tables = await db.raw<{ rows: { name: string }[] }>(
    `select table_name as name from information_schema.tables where table_schema = 'public' order by 1`,
  );
  const found: Record<string, number> = {};
  for (const { name } of tables.rows) {
    found[name] = (await db(name).count<{ n: number }[]>('* as n'))[0]?.n ?? 0;
  }
  const keys: string[] = [];
  for await (const { key } of deps.storage.list()) keys.push(key);
  return { ...found, 'objects in the store': keys.length };
}

test('the demo put in twice is the demo put in once', async () => {
  const house = await buildApp();
  await seed(house.deps);
  await house.workAll();
  const once = await counts(house);
  expect(once.patterns).toBeGreaterThan(3);
  await seed(house.deps);
  await house.workAll();
  expect(await counts(house)).toEqual(once);
  await house.close();
});
