import { readFileSync } from 'node:fs';
import { expect, it } from 'vitest';
import { SECURITY_HEADERS } from '../../tools/contentSecurityPolicy.mjs';

const README = readFileSync(new URL('../../README.md', import.meta.url), 'utf8');

it('shows the headers that the server sends', () => {
  for (const [name, value] of Object.entries(SECURITY_HEADERS)) expect(README).toContain(`${name}: ${value}`);
});

it('begins with the job in one paragraph, then the two commands', () => {
  expect(README).toMatch(/^# Basewright\n\n[^\n]{200,}\n\n```sh\nnpm ci && npm start .*\nnpm ci && npm test .*\n```\n/);
});
