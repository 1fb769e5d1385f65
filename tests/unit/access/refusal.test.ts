import { expect, test } from 'vitest';
import { provenActor } from '@/lib/access/actor';
import { refusalOf, refuse } from '@/lib/access/refusal';

test('a refusal says what the roles do not allow', () => {
  expect(refusalOf('approve-limits')).toBe('Your roles do not allow this: approve limits.');
});

test('a process owner of one stream is refused on another', () => {
  const owner = provenActor({
    kind: 'person',
    id: 'p',
    name: 'Owner',
    grants: [{ role: 'process-owner', streamIds: ['7'] }],
  });
  expect(refuse(owner, 'approve-limits', '7')).toBeNull();
  expect(refuse(owner, 'approve-limits', '8')).toEqual({
    ok: false,
    reason: 'Your roles do not allow this: approve limits.',
  });
  expect(refuse(owner, 'create-stream')).not.toBeNull();
});

test('a token, which has no roles, reads what it does not allow', () => {
  const token = provenActor({
    kind: 'token',
    id: '1',
    name: 'Gauge 9',
    grants: [],
    token: { scope: 'intake', streamIds: null },
  });
  expect(refuse(token, 'see-line')).toEqual({
    ok: false,
    reason: 'This token does not allow this: see boards, charts, wafers and cases.',
  });
});
