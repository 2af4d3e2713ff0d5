import { describe, expect, it } from 'vitest';
import { readEnv } from '@/src/env';
import { errorIdOf } from '@/src/error-id';

describe('the environment', () => {
  it('needs nothing: a local file, the demo on, the real time, port 3000', () => {
    expect(readEnv({})).toMatchObject({
      databaseUrl: 'file:.data/antiphon.db',
      isLocalFile: true,
      isDemo: true,
      startInstantMs: null,
      port: 3000,
      isCookieSecure: false,
      trustsProxy: false,
    });
  });

  it('has no demo on a remote database', () => {
    expect(readEnv({ DATABASE_URL: 'libsql://db.example' })).toMatchObject({
      isLocalFile: false,
      isDemo: false,
    });
  });

  it.each([
    [
      'the demo on a remote database',
      { DATABASE_URL: 'libsql://db.example', ANTIPHON_DEMO: '1' },
      'local file only',
    ],
    [
      'a set time without the demo',
      { ANTIPHON_DEMO: '0', ANTIPHON_NOW: '2027-02-10T14:32:00Z' },
      'runs on the real time',
    ],
    [
      'a set time that is none',
      { ANTIPHON_NOW: 'tomorrow' },
      'ANTIPHON_NOW is "tomorrow": must be an instant',
    ],
    ['a port that is none', { PORT: '99999' }, 'PORT is "99999"'],
    [
      'an address of no database',
      { DATABASE_URL: '.data/a.db' },
      'DATABASE_URL is ".data/a.db": must start with file:',
    ],
    ['a switch that is none', { COOKIE_SECURE: 'maybe' }, 'COOKIE_SECURE is "maybe"'],
  ])('is refused with a sentence for %s', (_, given, sentence) => {
    expect(() => readEnv(given)).toThrow(sentence);
  });

  it('takes an empty value for an absent one', () => {
    expect(readEnv({ PORT: '', ANTIPHON_NOW: '' })).toMatchObject({ port: 3000, startInstantMs: null });
  });
});

it('an error’s id is 4 + 4 letters, the same for the same digest and another for another', () => {
  expect(errorIdOf('1234567890')).toMatch(/^[0-9A-HJKMNP-TV-Z]{4}-[0-9A-HJKMNP-TV-Z]{4}$/);
  expect(errorIdOf('1234567890')).toBe(errorIdOf('1234567890'));
  const ids = new Set(Array.from({ length: 5000 }, (_, n) => errorIdOf(String(n))));
  expect(ids.size).toBe(5000);
});
