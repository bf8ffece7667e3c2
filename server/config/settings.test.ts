import { describe, expect, it } from 'vitest';

import { readSettings } from './settings.ts';

const least = { DATABASE_URL: 'mysql://me@127.0.0.1:3306/bank', SESSION_SECRET: 's'.repeat(32) };

describe('the settings', () => {
  it('take their usual values when only what must be set is set', () => {
    expect(readSettings(least)).toMatchObject({
      environment: 'production',
      host: '127.0.0.1',
      port: 3000,
      secureCookies: false,
      trustProxy: false,
      staticFolder: null,
      sessionHours: 8,
    });
  });

  it('name everything that is missing or wrong', () => {
    expect(() => readSettings({ PORT: 'many' })).toThrow(/PORT.*DATABASE_URL.*SESSION_SECRET/);
  });

  it('refuse a short secret', () => {
    expect(() => readSettings({ ...least, SESSION_SECRET: 'short' })).toThrow(/at least 32 characters/);
  });

  it.each([
    ['https://bank.example', true, 1],
    ['http://bank.example', false, false],
  ])('for %s mark cookies as secure: %s, and trust proxies: %s', (origin, secureCookies, trustProxy) => {
    expect(readSettings({ ...least, PUBLIC_ORIGIN: origin })).toMatchObject({ secureCookies, trustProxy });
  });

  it.each([
    ['true', true],
    ['false', false],
    ['2', 2],
    ['loopback, 10.0.0.0/8', 'loopback, 10.0.0.0/8'],
  ])('read TRUST_PROXY %s as %s', (text, value) => {
    expect(readSettings({ ...least, TRUST_PROXY: text }).trustProxy).toBe(value);
  });

  it('take an empty variable as one that is not set, and mariadb:// for mysql://', () => {
    const settings = readSettings({ ...least, PORT: '', DATABASE_URL: 'mariadb://me@db/bank' });
    expect(settings.port).toBe(3000);
    expect(settings.databaseUrl).toBe('mysql://me@db/bank');
  });
});
