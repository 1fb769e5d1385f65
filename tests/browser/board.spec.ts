import { expect } from '@playwright/test';
import { csvFile } from './csv-file';
import { openPage } from './open-page';
import { test } from './watched-test';

const NUMBERS = 'no one two three four five six seven eight nine ten eleven twelve'.split(' ');

test.describe('the board', () => {
  test('begins with a sentence that its rows bear out', async ({ page }) => {
    await openPage(page, '/?find=implanter');
    const rows = (group: string) =>
      page.getByRole('region', { name: group, exact: true }).getByRole('link', { name: /monitors/ });
    const [waiting, steady] = [await rows('Needs someone').count(), await rows('Steady').count()];
    expect([waiting, steady]).toEqual([1, 4]);
    await expect(page.getByRole('heading', { level: 1 })).toHaveText(
      'Five streams match “implanter”. One needs someone. Four are steady.',
    );

    await openPage(page, '/');
    await expect(page.getByRole('img', { name: /known to 0\.0\s%/ })).toHaveCount(0);
    const answer = (await page.getByRole('heading', { level: 1 }).innerText()).toLowerCase();
    for (const [group, verb] of [
      ['Needs someone', /(\w+) streams? needs? someone/],
      ['Steady', /(\w+) (is|are) steady/],
    ] as const) {
      const said = verb.exec(answer)?.[1] ?? '';
      const count = await page
        .getByRole('region', { name: group, exact: true })
        .getByRole('list')
        .locator('> li')
        .count();
      expect(NUMBERS.includes(said) ? NUMBERS.indexOf(said) : Number(said), answer).toBe(count);
    }
  });

  test('leads to a stream and its wafers and back by keys alone', async ({ page }) => {
    await openPage(page, '/');
    await page.keyboard.press('Tab');
    await expect(page.getByRole('link', { name: 'Skip to the content' })).toBeFocused();
    await page.getByRole('link', { name: 'N-epi on p, 300 mm' }).focus();
    await page.keyboard.press('Enter');
    await page.waitForURL('**/streams/n-epi-on-p-300');

    const cursor = page.getByRole('slider', { name: /^Cursor along the points/ });
    const last = Number(await cursor.getAttribute('aria-valuemax'));
    await expect(async () => {
      await page.keyboard.press('ArrowLeft');
      expect(Number(await cursor.getAttribute('aria-valuenow'))).toBeLessThan(last);
    }).toPass();
    await expect(cursor).toBeFocused();
    await page.keyboard.press('End');
    await page.keyboard.press('Enter');
    await page.waitForURL('**/wafers/*');
    const newest = page.url();

    await expect(page.getByRole('heading', { level: 1 })).toContainText(/^Wafer \d+ of L\d+: /);
    await page.keyboard.press('ArrowLeft');
    await page.waitForURL((url) => url.href !== newest);
    const before = page.url();
    await expect(
      page.getByRole('navigation', { name: 'Wafers beside this one' }).getByRole('link'),
    ).toHaveCount(2);
    await page.keyboard.press('ArrowRight');
    await page.waitForURL(newest);
    await page.keyboard.press('ArrowLeft');
    await page.waitForURL(before);

    await page.keyboard.press('Escape');
    await page.waitForURL('**/streams/n-epi-on-p-300');
    await page.keyboard.press('Escape');
    await page.waitForURL((url) => url.pathname === '/');
    await expect(page.getByRole('region', { name: 'Steady', exact: true })).toBeVisible();
  });

  test('finds streams by their words, and says when there is none', async ({ page, request }) => {
    await openPage(page, '/');
    const finder = page.getByRole('searchbox', { name: 'Find a stream' });
    await expect(async () => {
      await page.keyboard.press('/');
      await expect(finder).toBeFocused({ timeout: 200 });
    }).toPass();
    await page.keyboard.type('300 EPI');
    await page.keyboard.press('Enter');
    await page.waitForURL('**/?find=300+EPI');
    await expect(page.getByRole('heading', { level: 1 })).toContainText('One stream matches “300 EPI”.');
    await expect(page.getByRole('main').getByRole('listitem')).toHaveCount(1);
    const file = await csvFile(request, '/api/board?find=300+EPI');
    expect(file.header.slice(0, 7)).toEqual([
      'stream',
      'name',
      'tool',
      'chamber',
      'diameter_mm',
      'group',
      'state',
    ]);
    expect(file.rows.map((row) => row['stream'])).toEqual(['n-epi-on-p-300']);
    await page.keyboard.press('Escape');
    await page.waitForURL((url) => url.search === '');

    await openPage(page, `/?find=${encodeURIComponent('<b>nothing</b> like this')}`);
    await expect(page.getByRole('heading', { level: 1 })).toHaveText(
      'No stream matches “<b>nothing</b> like this”.',
    );
    await expect(page.getByRole('main')).toContainText('Try fewer words');
    await page.getByRole('link', { name: /^Show all \d+ streams$/ }).click();
    await page.waitForURL((url) => url.search === '');
  });

  test('shows its keys by ?, and lets single characters be switched off', async ({ page }) => {
    await openPage(page, '/methods');
    const dialog = page.getByRole('dialog', { name: 'Keys' });
    await expect(async () => {
      await page.keyboard.press('?');
      await expect(dialog).toBeVisible({ timeout: 200 });
    }).toPass();
    await expect(dialog).toContainText('go back to the page above');
    await dialog.getByRole('checkbox', { name: /^Single-character keys/ }).uncheck();
    await page.keyboard.press('Escape');
    await expect(dialog).toBeHidden();
    await expect(page).toHaveURL('/methods');

    const finder = page.getByRole('searchbox', { name: 'Find a stream' });
    await page.keyboard.press('/');
    await expect(finder).not.toBeFocused();
    await finder.focus();
    await page.keyboard.type('?');
    await expect(finder).toHaveValue('?');
    await expect(dialog).toBeHidden();
  });
});
