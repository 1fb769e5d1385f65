import { expect } from '@playwright/test';
import { lookRound } from './look-round';
import { openPage } from './open-page';
import { test } from './watched-test';

test.describe('someone who is not signed in', () => {
  test.use({ storageState: { cookies: [], origins: [] }, statuses: [401] });

  test('is led to the sign-in page, and from there on to where they wanted to go', async ({ page }) => {
    await openPage(page, '/streams/n-epi-on-p?gauge=Gauge+1');
    await expect(page.getByRole('heading', { level: 1 })).toHaveText('Sign in to see the line');
    await expect(page.getByRole('navigation', { name: 'Places' })).toHaveCount(0);
    await page.getByRole('button', { name: 'As shift lead' }).click();
    await page.waitForURL('**/streams/n-epi-on-p?gauge=Gauge+1');
    await expect(page.getByRole('link', { name: 'Your account: shift lead' })).toBeVisible();
  });

  test('is told in words when address and password do not belong together', async ({ page }) => {
    await openPage(page, '/sign-in');
    const form = page.getByRole('form', { name: 'Sign in' });
    await form.getByLabel('E-mail address').fill('nobody@plant.example');
    await form.getByLabel('Password').fill('four copper kettles');
    await form.getByRole('button', { name: 'Sign in' }).click();
    await expect(form.getByRole('status')).toContainText('This address and password do not belong together.');
    await expect(form.getByLabel('E-mail address')).toHaveValue('nobody@plant.example');
  });

  test('is not led to another site by the address of the sign-in page', async ({ page, baseURL }) => {
    await openPage(page, '/sign-in?next=//elsewhere.example/board');
    await page.getByRole('button', { name: 'As viewer' }).click();
    await page.waitForURL(`${baseURL}/`);
  });

  test('has no file and no answer from any route', async ({ request }) => {
    const answer = await request.get('/api/board');
    expect(answer.status()).toBe(401);
    expect(answer.headers()['www-authenticate']).toContain('Bearer');
  });
});

test.describe('a viewer', () => {
  test.use({ storageState: { cookies: [], origins: [] }, statuses: [403] });

  test.beforeEach(async ({ page, baseURL }) => {
    await lookRound(page.request, baseURL ?? '', 'viewer');
  });

  test('is told which roles a page is for that theirs do not reach', async ({ page }) => {
    const response = await openPage(page, '/setup/streams/new');
    expect(response?.status()).toBe(403);
    await expect(page.getByRole('main')).toContainText('Your roles do not reach this page');
    await expect(page.getByRole('main')).toContainText('It is for process owners.');
  });

  test('sees their account, and nothing any more once signed out', async ({ page }) => {
    await openPage(page, '/account');
    await expect(page.getByRole('heading', { level: 1 })).toHaveText(
      'You are signed in as viewer (demonstration)',
    );
    await expect(page.getByRole('main')).toContainText('Your roles: viewer.');
    await expect(page.getByRole('table', { name: 'Your sessions' })).toContainText('this one');
    const cookies = await page.context().cookies();
    await page.getByRole('button', { name: 'Sign out', exact: true }).click();
    await page.waitForURL('**/sign-in');
    await page.context().addCookies(cookies);
    await page.goto('/account');
    await expect(page).toHaveURL(/sign-in/);
  });
});

test.describe('a form', () => {
  test('whose session ended meanwhile says so and keeps what was typed', async ({ page, baseURL }) => {
    await page.context().clearCookies();
    await lookRound(page.request, baseURL ?? '', 'process-owner');
    await openPage(page, '/setup/streams/n-epi-on-p/events');
    const form = page.getByRole('form', { name: 'Record an event' });
    await form.getByLabel('In words').fill('Gas bottle changed');
    await page.context().clearCookies();
    await form.getByRole('button', { name: 'Record' }).click();
    await expect(form.getByRole('status')).toContainText('You are signed out.');
    await expect(form.getByLabel('In words')).toHaveValue('Gas bottle changed');
  });
});
