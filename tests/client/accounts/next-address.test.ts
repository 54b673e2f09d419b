import { describe, expect, it } from 'vitest';
import { readNext } from '#client/features/accounts/next-address.ts';
import { credentialFaults } from '#client/features/accounts/use-credentials.ts';

describe('the page to return to after signing in', () => {
  it.each([
    ['/review?state=mine', '/review?state=mine'],
    ['/contribute/K7Q-4MD-2', '/contribute/K7Q-4MD-2'],
    [null, '/search'],
    ['', '/search'],
    ['search', '/search'],
    ['https://elsewhere.example/', '/search'],
    ['//elsewhere.example', '/search'],
    ['/\\elsewhere.example', '/search'],
    ['/\t/elsewhere.example', '/search'],
    ['/sign-in?next=/review', '/search'],
  ])('%j leads to %s', (next, expected) => {
    expect(readNext(next)).toBe(expected);
  });
});

describe('what is missing before a sign-in is sent', () => {
  it.each([
    [{ email: '', password: '' }, ['email', 'password']],
    [{ email: 'reader', password: 'x' }, ['email']],
    [{ email: 'a@b c', password: 'x' }, ['email']],
    [{ email: ' reader@demo.sillstone.example ', password: '' }, ['password']],
    [{ email: 'reader@demo.sillstone.example', password: 'x' }, []],
  ])('%j: %j', (credentials, missing) => {
    expect(Object.keys(credentialFaults(credentials))).toEqual(missing);
  });
});
