import { expect, type Page } from '@playwright/test';
import { csvFile } from './csv-file';
import { openPage } from './open-page';
import {
  drawUpPlan,
  ownSlug,
  readings,
  recordFile,
  setUpStream,
  steadyWafers,
  waferMapFile,
} from './own-line';
import { test } from './watched-test';

const SLUG = ownSlug('cases');
const NAME = `Cases of a bench ${SLUG}`;

test.describe('an excursion', () => {
  test('is opened by a signal, answered by people, and closed with its cause once', async ({
    page,
    context,
    request,
  }) => {
    await test.step('a wafer far from the others opens it', async () => {
      await drawUpPlan(page, `Nine for ${SLUG}`);
      await setUpStream(page, { slug: SLUG, name: NAME, plan: `Nine for ${SLUG}` });
      const steady = steadyWafers(25);
      const stray = { wafer: 'W26', measuredAt: '2026-01-07T00:00:00Z', values: readings(5.2) };
      await recordFile(page, 'cases.csv', waferMapFile(SLUG, [...steady, stray]));
      await page
        .getByRole('table', { name: 'Recorded, by stream' })
        .getByRole('link', { name: /^\d+$/ })
        .click();
      await page.waitForURL(`**/excursions?stream=${SLUG}`);
    });
    const table = page.getByRole('table', { name: /^Excursions/ });
    await expect(page.getByRole('heading', { level: 1 })).toContainText(`${NAME}: `);
    await table
      .getByRole('row', { name: /beyond the upper limit/ })
      .filter({ hasNotText: 'change from one' })
      .getByRole('link', { name: /^case \d+$/ })
      .click();
    await page.waitForURL('**/excursions/*');
    const address = new URL(page.url()).pathname;
    await expect(page.getByRole('heading', { level: 1 })).toContainText(`${NAME}: beyond the upper limit`);
    await expect(page.getByRole('complementary')).toContainText('qualified staff');

    const late = await context.newPage();
    await openPage(late, address);

    await test.step('someone takes it on, and writes down what was seen', async () => {
      const form = page.getByRole('form', { name: 'Answer this excursion' });
      await form.getByLabel('Note').fill('Looking at it\nwith the process owner');
      await form.getByRole('button', { name: 'Acknowledge' }).click();
      await expect(page.getByText('Acknowledged.', { exact: true })).toBeVisible();
      await expect(log(page)).toContainText('Looking at it');
      await expect(page.getByText(/acknowledged by process owner \(demonstration\)/)).toBeVisible();
      await form.getByRole('button', { name: 'Add the note' }).click();
      await expect(form.getByLabel('Note')).toHaveAttribute('aria-invalid', 'true');
      await form.getByLabel('Note').fill('The map is whole');
      await form.getByRole('button', { name: 'Add the note' }).click();
      await expect(log(page)).toContainText('The map is whole');
    });

    await test.step('whoever was slower is told so in words, and keeps what was typed', async () => {
      const form = late.getByRole('form', { name: 'Answer this excursion' });
      await form.getByLabel('Note').fill('Mine as well');
      await form.getByRole('button', { name: 'Acknowledge' }).click();
      await expect(form.getByRole('status')).toContainText('This excursion is acknowledged already.');
      await expect(form.getByLabel('Note')).toHaveValue('Mine as well');
    });

    await test.step('it is closed with its cause, and not without', async () => {
      await page.getByText('Close with its cause').click();
      const form = page.getByRole('form', { name: 'Close this excursion' });
      await form.getByRole('button', { name: 'Close the excursion' }).click();
      await expect(form.getByLabel('Cause')).toHaveAttribute('aria-invalid', 'true');
      await form.getByLabel('Cause').fill('=Wrong gas bottle');
      await form.getByRole('button', { name: 'Close the excursion' }).click();
      await expect(page.getByText(/closed by process owner \(demonstration\)/)).toBeVisible();
      await expect(log(page)).toContainText('=Wrong gas bottle');
      await expect(page.getByRole('form', { name: 'Close this excursion' })).toHaveCount(0);

      await late.getByText('Close with its cause').click();
      const again = late.getByRole('form', { name: 'Close this excursion' });
      await again.getByLabel('Cause').fill('Another');
      await again.getByRole('button', { name: 'Close the excursion' }).click();
      await expect(again.getByRole('status')).toContainText('This excursion is closed already.');
    });

    await test.step('the list and its file know it as closed', async () => {
      await openPage(page, '/excursions');
      await page.getByLabel('Stream', { exact: true }).selectOption(NAME);
      await page.getByRole('button', { name: 'Show' }).click();
      await page.waitForURL(`**/excursions?stream=${SLUG}`);
      const own = page.getByRole('link', { name: `case ${address.split('/').at(-1)}`, exact: true });
      await expect(own).toHaveCount(0);
      await page
        .getByRole('navigation', { name: 'By state' })
        .getByRole('link', { name: /^closed \d+$/ })
        .click();
      await page.waitForURL(/state=closed&stream=/);
      await expect(own).toHaveCount(1);
      const { header, rows } = await csvFile(request, `/api/excursions/csv?state=closed&stream=${SLUG}`);
      expect(header.slice(0, 4)).toEqual(['excursion', 'stream', 'stream_name', 'state']);
      expect(rows).toHaveLength(1);
      expect(rows[0]).toMatchObject({
        state: 'closed',
        closed_by: 'process owner (demonstration)',
        cause: "'=Wrong gas bottle",
      });
      const entries = await csvFile(request, `/api${address}/log`);
      expect(entries.rows.map((row) => row['what'])).toEqual(['opened', 'acknowledged', 'noted', 'closed']);
    });
  });

  test('is found by its state in the address; an address that makes no sense shows those not closed', async ({
    page,
  }) => {
    await openPage(page, '/excursions?state=closed&stream=n-epi-on-p');
    const rows = page.getByRole('table', { name: /^Excursions/ }).getByRole('row');
    expect(await rows.count()).toBeGreaterThan(3);
    for (const row of (await rows.all()).slice(1)) await expect(row).toContainText('closed by');
    await openPage(page, '/excursions?state=lost&stream=%27&page=-4');
    const current = page
      .getByRole('navigation', { name: 'By state' })
      .getByRole('link', { name: /^not closed/ });
    await expect(current).toHaveAttribute('aria-current', 'page');
    await openPage(page, '/excursions?stream=no-such');
    await expect(page.getByText('No excursion is of this kind.')).toBeVisible();
  });
});

const log = (page: Page) => page.getByRole('table', { name: 'Log of this case' });
