import { describe, expect, it } from 'vitest';
import { ConfigError, readConfig } from './config.ts';
import { cookieIsSecure } from '../http/cookie-is-secure.ts';

const DATABASES = {
  DATABASE_URL: 'postgres://a@127.0.0.1/x',
  DATABASE_OWNER_URL: 'postgres://b@127.0.0.1/x',
  DATABASE_JOBS_URL: 'postgres://c@127.0.0.1/x',
};

describe('the settings', () => {
  it('have defaults for everything but the database', () => {
    const config = readConfig({ ...DATABASES, PORT: '' });
    expect(config).toMatchObject({
      environment: 'local',
      port: 4600,
      host: '127.0.0.1',
      publicUrl: 'http://127.0.0.1:4600',
      trustProxy: 0,
      demo: true,
      bucket: undefined,
    });
    expect(config.uploads).toBe(`${config.data}/uploads`);
    expect(config.secrets).toBe(`${config.data}/secrets`);
  });

  it('are all named where several cannot be used', () => {
    const read = () =>
      readConfig({ DATABASE_URL: 'mysql://x', PORT: 'eighty', PUBLIC_URL: 'redshank.example' });
    expect(read).toThrow(ConfigError);
    for (const line of [
      /PORT must be a number/,
      /DATABASE_URL must be a postgres/,
      /DATABASE_OWNER_URL is not set/,
      /PUBLIC_URL must be an address/,
    ]) {
      expect(read).toThrow(line);
    }
  });

  it('make no demo in production unless asked', () => {
    expect(readConfig({ ...DATABASES, NODE_ENV: 'production' }).demo).toBe(false);
    expect(readConfig({ ...DATABASES, NODE_ENV: 'production', REDSHANK_DEMO: '1' }).demo).toBe(
      true,
    );
    expect(readConfig({ ...DATABASES, REDSHANK_DEMO: '0' }).demo).toBe(false);
  });

  it('keep the public address without a slash at its end', () => {
    expect(readConfig({ ...DATABASES, PUBLIC_URL: 'https://a.example/' }).publicUrl).toBe(
      'https://a.example',
    );
  });
});

describe('the session cookie', () => {
  it('is Secure everywhere but on plain http of the machine itself', () => {
    expect(cookieIsSecure('http://127.0.0.1:4600')).toBe(false);
    expect(cookieIsSecure('http://localhost:4600')).toBe(false);
    expect(cookieIsSecure('http://[::1]:4600')).toBe(false);
    expect(cookieIsSecure('https://a.example')).toBe(true);
    expect(cookieIsSecure('http://192.0.2.1:4600')).toBe(true);
  });
});
