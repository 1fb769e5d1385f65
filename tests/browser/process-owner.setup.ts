import { expect, test } from '@playwright/test';
import path from 'node:path';
import { lookRound } from './look-round';

test('the process owner of the demonstration line signs in', async ({ request, baseURL }) => {
  await lookRound(request, baseURL ?? '', 'process-owner');
  const state = await request.storageState({
    path: path.resolve(import.meta.dirname, '../../.results/process-owner.json'),
  });
  expect(state.cookies.map(({ name, httpOnly }) => ({ name, httpOnly }))).toEqual([
    { name: 'evenohm.session_token', httpOnly: true },
  ]);
});
