import { describe, expect, test } from 'vitest';
import { EnvError, readEnv } from '../../../api/env.ts';

const PRODUCTION = {
  NODE_ENV: 'production',
  ROUNDELAY_PUBLIC_URL: 'https://roundelay.example/',
  ROUNDELAY_SECRET: 'x'.repeat(40),
  DATABASE_URL: 'postgres://u:p@db.example/roundelay',
  S3_ENDPOINT: 'https://s3.example',
  S3_ACCESS_KEY: 'a',
  S3_SECRET_KEY: 'b',
  SMTP_URL: 'smtps://u:p@mail.example',
  MAIL_FROM: 'Roundelay <post@roundelay.example>',
};

describe('the settings', () => {
  test('work on loopback without any variable', () => {
    const env = readEnv({});
    expect(env.mode).toBe('development');
    const urls = [env.publicUrl, env.database.url, env.s3.endpoint, env.mail.url];
    expect(urls.map((url) => new URL(url).hostname)).toEqual(Array(4).fill('127.0.0.1'));
  });

  test('are read from a full environment, an empty variable counting as none', () => {
    const env = readEnv({ ...PRODUCTION, ROUNDELAY_PORT: '', ROUNDELAY_WORKER: '0', OTHER: 'x' });
    expect(env).toMatchObject({ publicUrl: 'https://roundelay.example', worker: false, port: 4300 });
  });

  test.each(Object.keys(PRODUCTION).filter((name) => name !== 'NODE_ENV'))('stop production without %s', (name) => {
    expect(() => readEnv({ ...PRODUCTION, [name]: undefined })).toThrow(`${name}: must be set in production`);
  });

  test('stop production that keeps the example secret', () => {
    const { secret } = readEnv({});
    expect(() => readEnv({ ...PRODUCTION, ROUNDELAY_SECRET: secret })).toThrow(/ROUNDELAY_SECRET: is the example/);
  });

  test('name every variable that is wrong, at once', () => {
    const read = () => readEnv({ ROUNDELAY_PORT: 'many', DATABASE_URL: 'mysql://x', ROUNDELAY_SECRET: 'short' });
    expect(read).toThrow(EnvError);
    expect(read).toThrow(/ROUNDELAY_PORT[^]*ROUNDELAY_SECRET[^]*DATABASE_URL/);
  });
});
