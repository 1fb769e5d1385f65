import { expect, test } from 'vitest';
import { auditAddress } from '@/app/(line)/audit/audit-address';
import { auditQuery } from '@/lib/access/schema';

const zone = 'Europe/Berlin';
const nothing = { who: null, stream: null, action: null, from: null, to: null, page: 1 };

test('an address of the audit trail asks for what its page was asked for', () => {
  const asked = {
    who: 'Ada & Bo',
    stream: 'n-epi',
    action: 'approved limits',
    from: '2031-07-05T06:07',
    to: '2031-07-06T06:07',
    page: '3',
  };
  const query = auditQuery(zone).parse(asked);
  expect(query.from?.toISOString()).toBe('2031-07-05T04:07:00.000Z');
  const address = auditAddress('/audit', query, zone);
  expect(Object.fromEntries(new URL(address, 'http://plant').searchParams)).toEqual(asked);
});

test('what makes no sense in its address is as if it were not there', () => {
  const odd = { who: ['a', 'b'], stream: '../x', action: 'dropped tables', from: 'noon', to: '', page: '-1' };
  expect(auditQuery(zone).parse(odd)).toEqual(nothing);
  expect(auditQuery(zone).parse({ who: '\0 ' })).toEqual(nothing);
  expect(auditAddress('/audit', nothing, zone)).toBe('/audit');
});
