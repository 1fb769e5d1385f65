import { expect, type Locator, type Page } from '@playwright/test';
import { csvFile } from './csv-file';
import { openPage } from './open-page';
import { test } from './watched-test';

const STREAM = '/streams/n-epi-on-p';

const cursorOf = (page: Page) => page.getByRole('slider', { name: /^Cursor along the points/ });
const atCursor = (page: Page) => page.getByRole('region', { name: 'At the cursor' });

/** Where the cursor's line stands in each of the charts, in pixels from their left. */
const lines = (page: Page) =>
  page
    .getByRole('figure')
    .evaluateAll((charts) =>
      charts.map((chart) => chart.querySelector<HTMLElement>('div > div[style*="left"]')?.style.left),
    );

test.describe('the page of a stream', () => {
  test('moves one cursor through all charts by pointer and by key, and says what stands there', async ({
    page,
  }) => {
    await openPage(page, STREAM);
    const cursor = cursorOf(page);
    const box = await boxOf(cursor);
    await page.mouse.move(box.x + box.width * 0.3, box.y + box.height * 0.2);
    const count = Number(await cursor.getAttribute('aria-valuemax'));
    await expect.poll(async () => Number(await cursor.getAttribute('aria-valuenow'))).toBeLessThan(count / 2);
    const hovered = await expectSaid(page);

    await page.mouse.click(box.x + box.width * 0.3, box.y + box.height * 0.8);
    await page.mouse.move(0, 0);
    await expect.poll(() => expectSaid(page)).toEqual(hovered);
    await cursor.focus();
    await page.keyboard.press('ArrowRight');
    const moved = await expectSaid(page);
    expect(moved.place).toBe(hovered.place + 1);
    expect(moved.words).not.toBe(hovered.words);
    expect(new Set(moved.lines).size).toBe(1);
    expect(moved.lines).toHaveLength(3);
    expect(moved.lines[0]).not.toBe(hovered.lines[0]);
    await page.keyboard.press('Home');
    expect((await expectSaid(page)).place).toBe(1);
    await page.keyboard.press('ArrowLeft');
    expect((await expectSaid(page)).place).toBe(1);
    await page.keyboard.press('End');
    expect((await expectSaid(page)).place).toBe(count);
  });

  test('keeps the stretch it shows in its address', async ({ page }) => {
    await openPage(page, STREAM);
    const cursor = cursorOf(page);
    const count = async () => Number(await cursor.getAttribute('aria-valuemax'));
    const whole = await count();
    await cursor.focus();
    await page.keyboard.press('+');
    await page.waitForURL(/\?from=[^&]+&to=/);
    await expect.poll(count).toBeLessThan(whole);
    const closer = await count();
    await page.reload();
    await expect.poll(count).toBe(closer);
    const late = page.url();
    await page.getByRole('button', { name: 'Earlier' }).click();
    await page.waitForURL((url) => url.href !== late);

    const box = await boxOf(cursor);
    const before = page.url();
    await page.mouse.move(box.x + box.width * 0.4, box.y + 40);
    await page.mouse.down();
    await page.mouse.move(box.x + box.width * 0.6, box.y + 60, { steps: 4 });
    await page.mouse.up();
    await page.waitForURL((url) => url.href !== before);
    await expect.poll(count).toBeLessThan(closer / 2);
    await page.getByRole('button', { name: 'Latest' }).click();
    await page.waitForURL((url) => url.search === '');
    await expect.poll(count).toBe(whole);
  });

  test('draws no limits where a filter leaves subgroups out, and says so', async ({ page, request }) => {
    await openPage(page, STREAM);
    const key = page.getByRole('list', { name: 'Key to the charts' });
    await expect(key).toContainText('limits and centre line');
    await page.getByText('Filter by gauge or lot').click();
    const filter = page.getByRole('form', { name: 'Filter' });
    await filter.getByLabel('Gauge').selectOption({ index: 1 });
    await filter.getByLabel('Lot').fill('M0009');
    await filter.getByRole('button', { name: 'Show these' }).click();
    await page.waitForURL(/gauge=Gauge\+2&lot=M0009/);
    await expect(page.getByRole('main')).toContainText('No limits and no rules are drawn');
    await expect(key).not.toContainText('limits');
    await expect(page.getByRole('figure').first()).not.toContainText('◆');

    const address = `/api${STREAM}/points.csv`;
    const all = await csvFile(request, address);
    const some = await csvFile(request, `${address}?gauge=Gauge+2&lot=M0009`);
    expect(all.rows.some((row) => row['centre_ohm_cm'] !== '')).toBe(true);
    expect(some.rows.length).toBeGreaterThan(0);
    expect(some.rows.length).toBeLessThan(all.rows.length);
    expect(
      some.rows.every((row) => row['centre_ohm_cm'] === '' && row['subgroup']?.startsWith('wafer M0009/')),
    ).toBe(true);
    await page.getByRole('link', { name: 'Show all' }).click();
    await page.waitForURL((url) => url.search === '');
  });

  test('holds its points as a table and as files', async ({ page, request }) => {
    await openPage(page, STREAM);
    await page.getByText('The points as a table').click();
    const table = page.getByRole('table', { name: 'The points of the charts, newest first' });
    const count = Number(await cursorOf(page).getAttribute('aria-valuemax'));
    await expect(table.getByRole('row')).toHaveCount(count + 1);
    const newest = await table.getByRole('rowheader').first().innerText();
    await expect(atCursor(page)).toContainText(newest);

    const hrefs = await page
      .getByRole('link', { name: /as CSV$/ })
      .evaluateAll((links) => links.map((link) => link.getAttribute('href') ?? ''));
    const points = await csvFile(request, hrefs.find((href) => href.includes('points.csv')) ?? '');
    expect(points.header.slice(0, 4)).toEqual(['subgroup', 'processed_at', 'state', 'wafers']);
    expect(points.rows).toHaveLength(count);
    const wafers = await csvFile(request, hrefs.find((href) => href.includes('wafers.csv')) ?? '');
    expect(wafers.header.slice(0, 5)).toEqual(['wafer', 'run_or_lot', 'lot', 'gauge', 'measured_at']);
    expect(wafers.rows).toHaveLength(count);
  });

  test('leaves aside what an address gets wrong, and says so', async ({ page }) => {
    await openPage(page, `${STREAM}?from=yesterday&at=x1`);
    await expect(page.getByText('“yesterday” is no time')).toBeVisible();
    await expect(page.getByText('“x1” is no subgroup')).toBeVisible();
    await expect(cursorOf(page)).toBeVisible();
    await openPage(page, `${STREAM}?from=2001-01-01&to=2001-02-01`);
    await expect(page.getByRole('main')).toContainText('No subgroup of this stream lies in this stretch');
    await page.getByRole('link', { name: 'Show the latest' }).click();
    await expect(cursorOf(page)).toBeVisible();
  });

  test('says at the point of a finger what stands there', { tag: '@phone' }, async ({ page, hasTouch }) => {
    await openPage(page, STREAM);
    const cursor = cursorOf(page);
    const before = await expectSaid(page);
    const box = await boxOf(cursor);
    const spot = { position: { x: box.width * 0.5, y: 30 } };
    await (hasTouch ? cursor.tap(spot) : cursor.click(spot));
    await expect.poll(async () => (await expectSaid(page)).place).not.toBe(before.place);
  });
});

/** Where the charts lie; asked again while a new stretch takes the place of the one before. */
async function boxOf(cursor: Locator) {
  const found: { box: Awaited<ReturnType<Locator['boundingBox']>> } = { box: null };
  await expect(async () => {
    found.box = await cursor.boundingBox();
    expect(found.box).not.toBeNull();
  }).toPass();
  if (found.box === null) throw new Error('The charts are not drawn');
  return found.box;
}

/** What the cursor says, held against the panel beside the charts. */
async function expectSaid(page: Page) {
  const cursor = cursorOf(page);
  const words = (await cursor.getAttribute('aria-valuetext')) ?? '';
  const [label = '', at = '', level = ''] = words.split(', ');
  await expect(atCursor(page)).toContainText(label);
  await expect(atCursor(page)).toContainText(at);
  await expect(atCursor(page)).toContainText(level);
  return { words, place: Number(await cursor.getAttribute('aria-valuenow')), lines: await lines(page) };
}
