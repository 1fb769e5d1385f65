import { expect, test } from 'vitest';
import { siteAddress } from '@/lib/access/requested-address';

test('an address of this site is gone on to, without what the router added', () => {
  expect(siteAddress('/streams/n-epi?from=2026-01-01')).toBe('/streams/n-epi?from=2026-01-01');
  expect(siteAddress('/streams/n-epi?_rsc=x1')).toBe('/streams/n-epi');
});

test.each([
  '//elsewhere.example/a',
  '/\\elsewhere.example',
  'https://elsewhere.example',
  'javascript:alert(1)',
  '/..//elsewhere.example',
  '/\t/elsewhere.example',
  '',
  null,
])('an address that leads away is the board instead: %s', (given) => {
  expect(siteAddress(given)).toBe('/');
});
