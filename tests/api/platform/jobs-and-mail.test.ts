import { spawn, type ChildProcess } from 'node:child_process';
import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, inject, test } from 'vitest';
import type { Mailbox } from '../../../api/local/mailbox.ts';
import { addJob, releaseDeadWorkers, startJobs, TRIES } from '../../../api/platform/jobs.ts';
import { mailTasks, queueMail } from '../../../api/platform/mail.ts';
import type { Letter } from '../../../api/platform/letter.ts';
import { buildApp, type TestApp } from '../../support/app.ts';

const letter = (over: Partial<Letter> = {}): Letter => ({
  subject: 'Über your pattern – and ½ a round',
  greeting: 'Dear Ismay,',
  paragraphs: ['A line of more than seventy-six letters, which has to be folded on its way, and = signs = too.'],
  link: { label: 'Go on here', url: `https://roundelay.example/reset?token=${'a'.repeat(43)}&x=1` },
  reason: 'You get this because somebody asked for it.',
  ...over,
});

describe('jobs and mail', () => {
  let house: TestApp;
  beforeAll(async () => {
    house = await buildApp();
  });
  afterAll(() => house.close());

  const jobs = () =>
    house.db('graphile_worker._private_jobs').select<{ payload: unknown; locked_by: string | null }[]>('*');
  const mailsTo = async (to: string) => {
    const all = (await (await fetch(`${inject('house').mailboxUrl}/mails.json`)).json()) as Mailbox['mails'];
    return all.filter((mail) => mail.to === to);
  };
  const runner = (tasks: Parameters<typeof startJobs>[0]['tasks']) =>
    startJobs({ databaseUrl: house.url, db: house.db, tasks, timetable: {}, log: house.deps.log });

  test('a mail and the change that asks for it are rolled back together', async () => {
    await expect(
      house.db.transaction(async (trx) => {
        await queueMail(trx, 'confirm', 'nobody@mail.example', letter());
        throw new Error('changed my mind');
      }),
    ).rejects.toThrow('changed my mind');
    expect(await house.db('mails')).toEqual([]);
    expect(await jobs()).toEqual([]);
  });

  test('a mail arrives once, as it was written, and what it said is forgotten here', async () => {
    const to = `${randomUUID()}@mail.example`;
    await house.db.transaction((trx) => queueMail(trx, 'reset', to, letter()));
    await house.workAll();
    const [mail, ...more] = await mailsTo(to);
    expect(more).toEqual([]);
    expect(mail).toMatchObject({ subject: letter().subject, from: 'Roundelay <post@roundelay.example>' });
    for (const part of [letter().greeting, letter().paragraphs[0], letter().link?.url, letter().reason]) {
      expect(mail?.text).toContain(part);
    }
    const row = await house.db('mails').where({ to_email: to }).first();
    expect(row).toMatchObject({ state: 'sent', tries: 1, payload: {} });
    expect(mail?.messageId).toBe(row.message_id);
    await house.work('send-mail', { mailId: row.id });
    expect(await mailsTo(to)).toHaveLength(1);
  });

  test('a name with a line break makes no header of its own', async () => {
    const to = `${randomUUID()}@mail.example`;
    const subject = 'Hello\r\nBcc: everybody@mail.example';
    await house.db.transaction((trx) => queueMail(trx, 'invite', to, letter({ subject, greeting: '<b>Hi</b>' })));
    await house.workAll();
    expect((await mailsTo(to))[0]?.subject).toBe('Hello Bcc: everybody@mail.example');
    expect(await mailsTo('everybody@mail.example')).toEqual([]);
  });

  test('a mail that cannot leave waits, and stands as failed after the last try', async () => {
    const to = `${randomUUID()}@mail.example`;
    await house.db.transaction((trx) => queueMail(trx, 'confirm', to, letter()));
    const row = await house.db('mails').where({ to_email: to }).first();
    const broken = mailTasks({
      ...house.deps,
      mail: { send: () => Promise.reject(new Error('no route')), close: () => undefined },
    });
    const attempt = (n: number) => broken['send-mail']?.({ mailId: row.id }, { attempt: n, signal: undefined });
    await expect(attempt(1)).rejects.toThrow('no route');
    expect(await house.db('mails').where({ id: row.id }).first()).toMatchObject({
      state: 'queued',
      last_error: 'no route',
    });
    await expect(attempt(TRIES)).rejects.toThrow('no route');
    expect(await house.db('mails').where({ id: row.id }).first()).toMatchObject({ state: 'failed', tries: TRIES });
    await house.db('graphile_worker._private_jobs').delete();
  });

  test('a hundred jobs between two workers are done once each', async () => {
    const done: number[] = [];
    const tasks = { count: (payload: unknown) => Promise.resolve(void done.push((payload as { n: number }).n)) };
    const workers = [await runner(tasks), await runner(tasks)];
    await house.db.transaction(async (trx) => {
      for (let n = 0; n < 100; n += 1) await addJob(trx, 'count', { n });
    });
    await expect.poll(() => done.length, { timeout: 10_000 }).toBe(100);
    await Promise.all(workers.map((worker) => worker.stop()));
    expect(done.toSorted((a, b) => a - b)).toEqual(Array.from({ length: 100 }, (_each, n) => n));
    expect(await house.db('workers')).toEqual([]);
  });

  test('jobs of one key that wait are one', async () => {
    for (const n of [1, 2]) {
      await house.db.transaction((trx) => addJob(trx, 'later', { n }, { key: 'one', runAt: new Date('2999-01-01') }));
    }
    const waiting = await jobs();
    expect(waiting.map(({ payload }) => payload)).toEqual([{ n: 2 }]);
    await house.db('graphile_worker._private_jobs').delete();
  });

  test('a job whose worker was killed goes to another', async () => {
    await house.db.transaction((trx) => addJob(trx, 'stuck', {}));
    const script = `
      import { openDatabase } from './api/platform/database.ts';
      import { startJobs } from './api/platform/jobs.ts';
      import { openLog } from './api/platform/log.ts';
      const url = process.env.DATABASE_URL;
      const tasks = { stuck: () => new Promise((resolve) => setTimeout(resolve, 600_000)) };
      await startJobs({ databaseUrl: url, db: openDatabase({ url, pool: 2 }), tasks, timetable: {}, log: openLog({ logLevel: 'error' }) });`;
    const victim: ChildProcess = spawn(process.execPath, ['--import', 'tsx', '--input-type=module', '-e', script], {
      env: { ...process.env, DATABASE_URL: house.url },
      stdio: 'inherit',
    });
    await expect.poll(async () => (await jobs())[0]?.locked_by, { timeout: 15_000 }).toEqual(expect.any(String));
    await expect.poll(async () => (await house.db('workers')).length, { timeout: 15_000 }).toBe(1);
    victim.kill('SIGKILL');
    expect(await releaseDeadWorkers(house.db, new Date(Date.now() + 30_000))).toBe(0);
    expect(await releaseDeadWorkers(house.db, new Date(Date.now() + 41_000))).toBe(1);
    let done = 0;
    const rescuer = await runner({ stuck: () => Promise.resolve(void (done += 1)) });
    await expect.poll(() => done, { timeout: 10_000 }).toBe(1);
    await rescuer.stop();
  });

  test('a job that takes long stays with its worker while that lives', async () => {
    let end: (() => void) | undefined;
    const slow = await runner({ patient: () => new Promise<void>((resolve) => (end = resolve)) });
    await house.db.transaction((trx) => addJob(trx, 'patient', {}));
    await expect.poll(() => end, { timeout: 10_000 }).toEqual(expect.any(Function));
    const later = new Date(Date.now() + 3_600_000);
    await house.db('workers').update({ seen_at: later });
    expect(await releaseDeadWorkers(house.db, later)).toBe(0);
    expect((await jobs())[0]?.locked_by).toEqual(expect.any(String));
    end?.();
    await slow.stop();
  });

  test('a job longer than the wait of an ending worker is handed back, not lost', async () => {
    let begun = false;
    const slow = await runner({
      long: async (_payload, { signal }) => {
        begun = true;
        await new Promise((_resolve, reject) =>
          signal?.addEventListener('abort', () => reject(new Error('told to stop'))),
        );
      },
    });
    await house.db.transaction((trx) => addJob(trx, 'long', {}));
    await expect.poll(() => begun, { timeout: 10_000 }).toBe(true);
    await slow.stop();
    const [job] = await jobs();
    expect(job).toMatchObject({ locked_by: null, attempts: 1 });
  });
});
