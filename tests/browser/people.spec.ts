import { expect, type Page } from '@playwright/test';
import { lookRound } from './look-round';
import { openPage } from './open-page';
import { ownSlug } from './own-line';
import { expectSound } from './sound-page';
import { test } from './watched-test';

const NAME = `Newcomer ${ownSlug('n')}`;
const EMAIL = `${ownSlug('newcomer')}@plant.example`;
const PASSWORD = 'eleven quiet furnaces';

test.describe('people and access', () => {
  test.beforeEach(async ({ page, baseURL }) => {
    await lookRound(page.request, baseURL ?? '', 'administrator');
  });

  test('a person who was added chooses a password by a link, works once, and ends when deactivated', async ({
    page,
    browser,
    baseURL,
  }) => {
    await openPage(page, '/setup');
    await page.getByRole('link', { name: 'People', exact: true }).click();
    const form = page.getByRole('form', { name: 'Add a person' });
    await form.getByRole('button', { name: 'Add this person' }).click();
    await expect(form.getByLabel('Name')).toHaveAttribute('aria-invalid', 'true');
    await form.getByLabel('Name').fill(NAME);
    await form.getByLabel('E-mail address').fill(EMAIL);
    await form.getByLabel('Shift lead').selectOption('yes, for chosen streams');
    await form.getByRole('group', { name: 'Streams as shift lead' }).getByRole('checkbox').first().check();
    await form.getByRole('button', { name: 'Add this person' }).click();
    const done = form.getByRole('status');
    await expect(done).toContainText('works once, within 3 days');
    const link = /http\S+/.exec((await done.textContent()) ?? '')?.[0] ?? '';
    const row = page.getByRole('row', { name: NAME });
    await expect(row).toContainText('shift lead for');
    await expect(row).toContainText('has no password yet');

    const theirs = await browser.newContext({
      baseURL: baseURL ?? '',
      storageState: { cookies: [], origins: [] },
    });
    const newcomer = await theirs.newPage();
    await choose(newcomer, link);
    await newcomer.waitForURL('**/sign-in');
    await newcomer.getByLabel('E-mail address').fill(EMAIL);
    await newcomer.getByLabel('Password').fill(PASSWORD);
    await newcomer.getByRole('button', { name: 'Sign in', exact: true }).click();
    await expect(newcomer.getByRole('link', { name: NAME })).toBeVisible();
    const again = await theirs.newPage();
    await choose(again, link);
    await expect(again.getByRole('status')).toContainText('This link was used already');

    await page.getByRole('link', { name: NAME }).click();
    await page.getByRole('form', { name: 'Deactivate' }).getByRole('button').click();
    await expect(page.getByRole('form', { name: 'Reactivate' })).toBeVisible();
    await newcomer.reload();
    await expect(newcomer.getByRole('heading', { level: 1 })).toHaveText('Sign in to see the line');
    await theirs.close();
  });

  test('a token is shown once, opens what it was made for, and nothing once it is revoked', async ({
    page,
    playwright,
    baseURL,
  }) => {
    await openPage(page, '/setup/tokens');
    const name = `Gauge ${ownSlug('g')}`;
    const form = page.getByRole('form', { name: 'Make a token' });
    await form.getByLabel('Name').fill(name);
    await form.getByLabel('For').selectOption('reading');
    await form.getByRole('button', { name: 'Make the token' }).click();
    await expect(form.getByRole('status')).toContainText('which is shown only now: ev_');
    const token = /ev_[\w-]{43}/.exec((await form.getByRole('status').textContent()) ?? '')?.[0] ?? '';
    const row = page.getByRole('row', { name });
    await expect(row).toContainText('reading');
    await expect(row).toContainText(`${token.slice(0, 7)}…`);

    const machine = await playwright.request.newContext({
      baseURL: baseURL ?? '',
      storageState: { cookies: [], origins: [] },
      extraHTTPHeaders: { authorization: `Bearer ${token}` },
    });
    const streams = await machine.get('/api/streams');
    expect(streams.status()).toBe(200);
    expect((await machine.post('/api/maps', { data: 'x' })).status()).toBe(403);
    await page.reload();
    await expect(page.getByRole('main')).not.toContainText(token);
    await row.getByRole('button', { name: 'Revoke' }).click();
    await expect(row).toContainText('revoked');
    expect((await machine.get('/api/streams')).status()).toBe(401);
    await machine.dispose();
  });

  for (const address of [
    '/setup/people',
    '/setup/people/demonstration-viewer',
    '/setup/tokens',
    '/setup/permissions',
    '/choose-password#x',
  ]) {
    test(`${address} is sound @phone`, async ({ page }) => {
      await openPage(page, address);
      await expectSound(page, address);
    });
  }

  test('the table of permissions is shown as it is asked', async ({ page }) => {
    await openPage(page, '/setup/permissions');
    const row = page.getByRole('row', { name: 'Approve limits' });
    await expect(row.getByRole('cell')).toHaveText(['—', '—', 'may', '—', '—', 'on those only', '—']);
  });
});

async function choose(page: Page, link: string): Promise<void> {
  await openPage(page, link);
  await page.getByRole('textbox', { name: 'Password' }).fill(PASSWORD);
  await page.getByRole('button', { name: 'Use this password' }).click();
}
