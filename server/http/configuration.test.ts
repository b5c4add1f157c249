import { expect, it } from 'vitest';

import { readConfiguration } from './configuration.ts';

const GOOD = { DATABASE_URL: 'mysql://a:b@127.0.0.1:3306/c', AUTH_SECRET: '0123456789abcdef0123456789abcdef' };

it('what is left out takes its default', () => {
  expect(readConfiguration(GOOD)).toMatchObject({
    configuration: { host: '127.0.0.1', port: 4310, publicUrl: 'http://127.0.0.1:4310', mode: 'production' },
  });
});

it('the report names every setting that is wrong, and never what it was set to', () => {
  const read = readConfiguration({ DATABASE_URL: 'postgres://u:topsecret@h/d', PORT: '99999', SMTP_URL: 'mail' });
  if (!('report' in read)) throw new Error('it was let through');
  for (const name of ['DATABASE_URL', 'AUTH_SECRET', 'PORT', 'SMTP_URL']) expect(read.report).toContain(`  ${name} `);
  expect(read.report).not.toContain('topsecret');
});

it.each([
  ['a secret that others know', { AUTH_SECRET: 'change-me-change-me-change-me-change-me' }],
  ['a short secret', { AUTH_SECRET: 'short' }],
  ['a mailbox beside a real mail service', { SMTP_URL: 'smtp://h', MAILBOX: '/m' }],
])('the server does not start with %s', (_what, more) => {
  expect(readConfiguration({ ...GOOD, ...more })).toHaveProperty('report');
});
