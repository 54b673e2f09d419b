import { describe, expect, it } from 'vitest';
import { readEnvironment } from '#server/env.ts';

const good = {
  DATABASE_URL: 'postgres://sillstone_app:x@db.example/sillstone', DATABASE_OWNER_URL: 'postgres://sillstone_owner:x@db.example/sillstone',
  SESSION_SECRET: 'q7Zp2mX9rT4vB6nK1cW8yL5sD3fH0gJa',
};

describe('the environment', () => {
  it('has defaults for a real deployment on loopback', () => {
    expect(readEnvironment(good)).toMatchObject({ port: 4200, host: '127.0.0.1', demonstration: false, clientDir: 'dist/client', logLevel: 'info', publicUrl: undefined });
  });

  it.each([
    ['no database', { DATABASE_URL: undefined }, /DATABASE_URL/],
    ['a short secret', { SESSION_SECRET: 'short' }, /SESSION_SECRET.*32/],
    ['a placeholder for a secret', { SESSION_SECRET: 'a'.repeat(40) }, /placeholder/],
    ['a port that is none', { PORT: '99999' }, /PORT/],
    ['the same role for owner and application', { DATABASE_OWNER_URL: good.DATABASE_URL }, /same role/],
    ['the demonstration open to the network', { SILLSTONE_DEMO: '1', HOST: '0.0.0.0' }, /loopback only/],
    ['a word where 0 or 1 belongs', { SILLSTONE_DEMO: 'yes' }, /SILLSTONE_DEMO/],
    ['an address that is none', { PUBLIC_URL: 'sillstone' }, /PUBLIC_URL/],
  ])('refuses %s, and says which', (_what, change, message) => {
    expect(() => readEnvironment({ ...good, ...change })).toThrow(message);
  });

  it('names every fault at once', () => {
    expect(() => readEnvironment({ PORT: 'x', SESSION_SECRET: 'short' })).toThrow(/PORT[\s\S]*DATABASE_URL|DATABASE_URL[\s\S]*PORT/);
  });

  it('lets the demonstration be forced open', () => {
    expect(readEnvironment({ ...good, SILLSTONE_DEMO: '1', SILLSTONE_DEMO_FORCE: '1', HOST: '0.0.0.0' }).demonstration).toBe(true);
  });
});
