import { expect } from '@playwright/test';
import { csvFile } from './csv-file';
import { lookRound } from './look-round';
import { openPage } from './open-page';
import { expectSound } from './sound-page';
import { test } from './watched-test';

test.describe('the audit trail', { tag: '@phone' }, () => {
  test('is reached from Setup, filtered in the address, and kept as a file', async ({ page, baseURL }) => {
    await lookRound(page.request, baseURL ?? '', 'administrator');
    await openPage(page, '/setup');
    await page.getByRole('link', { name: 'Audit trail' }).click();
    await expect(page.getByRole('heading', { level: 1 })).toContainText(/, \d{4}-\d\d-\d\d \d\d:\d\d$/);
    await expectSound(page, '/audit');
    await page.getByLabel('What').selectOption('approved limits');
    await page.getByLabel('Who').fill('process owner');
    await page.getByRole('button', { name: 'Show' }).click();
    await expect(page).toHaveURL(/action=approved\+limits/);
    const rows = page.getByRole('row').filter({ hasText: 'approved limits: revision' });
    await expect(rows.first()).toContainText('state: draft → approved');
    const shown = await rows.count();
    const href = await page.getByRole('link', { name: /as CSV/ }).getAttribute('href');
    const file = await csvFile(page.request, href ?? '');
    // Others may approve limits meanwhile.
    expect(file.rows.length).toBeGreaterThanOrEqual(shown);
    expect(new Set(file.rows.map(({ action }) => action))).toEqual(new Set(['approved limits']));
  });

  test('is not for a viewer', async ({ page, baseURL }) => {
    await lookRound(page.request, baseURL ?? '', 'viewer');
    expect((await page.request.get('/audit')).status()).toBe(403);
    await openPage(page, '/setup');
    await expect(page.getByRole('link', { name: 'Audit trail' })).toHaveCount(0);
  });
});
