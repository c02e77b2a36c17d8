import { describe, expect, it } from 'vitest';
import { readConfig } from './config.ts';

const complete = { DATABASE_APP_URL: 'postgres://app', DATABASE_AUTH_URL: 'postgres://auth', JWT_SECRET: 'x'.repeat(32) };

describe('the configuration', () => {
  it('takes defaults for where to listen', () => {
    expect(readConfig(complete)).toMatchObject({ port: 4200, host: '127.0.0.1', clientDir: null });
  });

  it('names everything that is missing or wrong at once', () => {
    const read = () => readConfig({ PORT: '99999', JWT_SECRET: 'short' });
    expect(read).toThrow(/PORT is "99999"[\s\S]*DATABASE_APP_URL is not set[\s\S]*DATABASE_AUTH_URL is not set[\s\S]*JWT_SECRET is too short/);
  });

  it('does not repeat secrets', () => {
    expect(() => readConfig({ JWT_SECRET: 'hunter2' })).toThrow(expect.not.objectContaining({ message: expect.stringContaining('hunter2') }));
  });
});
