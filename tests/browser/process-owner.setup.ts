import { expect, test } from '@playwright/test';
import path from 'node:path';
import { lookRound } from './look-round';
import { openPage } from './open-page';
import { expectSound } from './sound-page';

test('the process owner of the demonstration line signs in', async ({ request, baseURL }) => {
  await lookRound(request, baseURL ?? '', 'process-owner');
  const state = await request.storageState({
    path: path.resolve(import.meta.dirname, '../../.results/process-owner.json'),
  });
  expect(state.cookies.map(({ name, httpOnly }) => ({ name, httpOnly }))).toEqual([
    { name: 'evenohm.session_token', httpOnly: true },
  ]);
});

/** Before any other test: once one of them has entered a person, the page is gone. */
for (const width of [1440, 390]) {
  test(`the page for the first administrator is sound in a window of ${width}`, async ({ page }) => {
    await page.setViewportSize({ width, height: 900 });
    const response = await openPage(page, '/first-administrator');
    expect(response?.status()).toBe(200);
    await expectSound(page, '/first-administrator');
  });
}
