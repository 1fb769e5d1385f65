import { expect, test as unwatched } from '@playwright/test';
import { csvFile } from './csv-file';
import { openPage } from './open-page';
import { drawUpPlan, ownSlug, recordFile, setUpStream, steadyWafers, waferMapFile } from './own-line';
import { expectSound } from './sound-page';
import { test } from './watched-test';

const SLUG = ownSlug('empty');
const NAME = `Bench without wafers ${SLUG}`;

test.describe('a stream without wafers', () => {
  test.describe.configure({ mode: 'serial' });

  test('says what will appear on its page, and is sound there and in its setup', async ({ page }) => {
    await drawUpPlan(page, `Nine for ${SLUG}`);
    await setUpStream(page, { slug: SLUG, name: NAME, plan: `Nine for ${SLUG}` });
    await openPage(page, `/streams/${SLUG}`);
    await expect(page.getByRole('heading', { level: 1 })).toHaveText(`${NAME}: no wafer yet`);
    await expect(page.getByRole('main')).toContainText('They begin with its first wafer map.');
    await expect(page.getByRole('link', { name: 'Send a wafer-map file' })).toHaveAttribute(
      'href',
      '/intake',
    );
    await expectSound(page, 'the page of an empty stream');
    await page.emulateMedia({ colorScheme: 'light' });
    await openPage(page, `/setup/streams/${SLUG}/limits`);
    await expectSound(page, 'the limits of an empty stream');
    await openPage(page, `/?find=${SLUG}`);
    await expect(page.getByRole('region', { name: 'Not judged yet' })).toContainText('no wafer yet');
  });

  test('lists a wafer without enough readings until it is measured again', async ({ page, request }) => {
    const [first, second] = steadyWafers(2);
    if (first === undefined || second === undefined) throw new Error('no wafers');
    const blind = { ...first, values: first.values.map((value, i) => (i < 5 ? 0 : value)) };
    await recordFile(page, 'blind.csv', waferMapFile(SLUG, [blind, second]));
    const [list, file] = [`/measure-again?stream=${SLUG}`, `/api/measure-again?stream=${SLUG}`];
    await openPage(page, `/?find=${SLUG}`);
    const lately = page.getByRole('region', { name: 'Recorded, not judged: measure again' });
    await expect(lately.getByRole('row')).toHaveCount(2);
    await lately.getByRole('link', { name: 'Those from before too' }).click();
    await page.waitForURL('**/measure-again');
    await page.getByLabel('Stream', { exact: true }).selectOption({ label: `${NAME} (1)` });
    await page.getByRole('button', { name: 'Show' }).click();
    await page.waitForURL(`**${list}`);
    await expect(page.getByRole('heading', { level: 1 })).toHaveText(
      `${NAME}: one wafer waits to be measured again.`,
    );
    const row = page.getByRole('table').getByRole('row').nth(1);
    await expect(row).toContainText('W01');
    await expect(row).toContainText('4 of 9');
    await expectSound(page, list);
    expect((await csvFile(request, file)).rows).toMatchObject([
      { wafer: 'W01', run_or_lot: 'L1', good_sites: '4' },
    ]);

    const again = { ...first, measuredAt: '2026-01-07T00:00:00Z' };
    await recordFile(page, 'again.csv', waferMapFile(SLUG, [again]));
    expect((await csvFile(request, file)).rows).toEqual([]);
    await openPage(page, list);
    await expect(page.getByRole('heading', { level: 1 })).toContainText(
      'no wafer waits to be measured again.',
    );
  });
});

test.describe('what is not there', () => {
  test.use({ statuses: [404] });

  test('is named, with the way to what there is', async ({ page }) => {
    for (const [address, words, link, href] of [
      [
        '/excursions/0',
        'There is no excursion of this number',
        'See the excursions there are',
        '/excursions',
      ],
      ['/intake/no-such', 'No file waits at this address', 'Go to the intake', '/intake'],
      ['/setup/streams/no-such', 'There is no stream by this name', 'Go to the setup', '/setup'],
      ['/setup/streams/no-such/limits', 'There is no stream by this name', 'Go to the setup', '/setup'],
      ['/streams/no-such', 'Nothing is kept at this address', 'Go to the board', '/'],
      ['/wafers/0', 'Nothing is kept at this address', 'Go to the board', '/'],
    ] as const) {
      await openPage(page, address);
      await expect(page.getByRole('heading', { level: 1 }), address).toHaveText(words);
      const way = page.getByRole('main').getByRole('link', { name: link });
      await expect(way, address).toHaveAttribute('href', href);
    }
    await page.getByRole('main').getByRole('link', { name: 'Go to the board' }).click();
    await page.waitForURL((url) => url.pathname === '/');
    await expect(page.getByRole('heading', { level: 1 })).toContainText(/stream/);
  });
});

/** Not watched: its fault is on the console, and meant to be. */
unwatched('a page that fails says so, is sound, and is drawn again once it can be', async ({ page }) => {
  await page.addInitScript(() => {
    const sound = window.ResizeObserver;
    const broken = function broken() {
      throw new Error('broken for a test');
    };
    Object.assign(window, { ResizeObserver: broken, mend: () => (window.ResizeObserver = sound) });
  });
  await page.goto('/streams/boron-implant-3');
  await expect(page.getByRole('heading', { level: 1 })).toHaveText('This page could not be made');
  await expect(page.getByRole('main')).toContainText('What is recorded is untouched.');
  await expect(page.getByRole('link', { name: 'go to the board' })).toHaveAttribute('href', '/');
  await expectSound(page, 'the page of an error');
  await page.evaluate('window.mend()');
  await page.getByRole('button', { name: 'Try again' }).click();
  await expect(page.getByRole('slider', { name: /^Cursor along the points/ })).toBeVisible();
  await expect(page.getByRole('heading', { level: 1 })).toContainText('Boron monitors');
});
