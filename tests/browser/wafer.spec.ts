import { expect, type APIRequestContext } from '@playwright/test';
import { csvFile } from './csv-file';
import { openPage } from './open-page';
import { test } from './watched-test';

/** The address of the newest wafer of a stream of the demonstration line. */
async function newestWafer(request: APIRequestContext, slug: string): Promise<string> {
  const board = await (await request.get(`/?find=${slug}`)).text();
  const found = /href="(\/wafers\/\d+)"/.exec(board)?.[1];
  if (found === undefined) throw new Error(`The board names no wafer of ${slug}`);
  return found;
}

test.describe('the page of a wafer', () => {
  test('shows its map in four ways, each at its own address', async ({ page, request }) => {
    const wafer = await newestWafer(request, 'boron-implant-2');
    await openPage(page, wafer);
    const tabs = page.getByRole('navigation', { name: 'What the map shows' });
    const map = page.getByRole('region', { name: 'Map' });
    for (const [name, view, words] of [
      ['Against the mean', 'mean', 'Percent from the area mean'],
      ['Against expected', 'expected', 'Percent from expected'],
      ['Against the usual map', 'usual', 'Usual is the mean of'],
      ['Value', null, 'Readings at 23 °C'],
    ] as const) {
      await tabs.getByRole('link', { name, exact: true }).click();
      await page.waitForURL((url) => url.searchParams.get('map') === view);
      await expect(tabs.getByRole('link', { name, exact: true })).toHaveAttribute('aria-current', 'page');
      await expect(map).toContainText(words);
      const label = view === null ? 'sheet resistance' : name.toLowerCase();
      await expect(map.getByRole('img')).toHaveAccessibleName(
        new RegExp(`^Wafer .*, ${label}: \\d+ good sites`),
      );
    }
    await openPage(page, `${wafer}?map=sideways`);
    await expect(tabs.getByRole('link', { name: 'Value' })).toHaveAttribute('aria-current', 'page');
  });

  test('gives all its readings as a file', async ({ request }) => {
    const { header, rows } = await csvFile(
      request,
      `/api${await newestWafer(request, 'boron-implant-2')}/readings.csv`,
    );
    expect(header.slice(0, 4)).toEqual(['site', 'x_mm', 'y_mm', 'sheet_resistance_ohm_sq_as_sent']);
    expect(rows).toHaveLength(121);
    expect(rows.every((row) => Number(row['sheet_resistance_ohm_sq_as_sent']) > 0)).toBe(true);
  });

  test('lets a reading be taken out with a reason and put back, and keeps who and why', async ({
    page,
    request,
  }) => {
    await openPage(page, `${await newestWafer(request, 'phosphorus-crystal')}?map=mean`);
    const figures = page.getByRole('region', { name: 'Figures' });
    const readings = page.getByRole('region', { name: 'Readings', exact: true });
    const whole = await figures.innerText();
    expect(whole).toContain('9 of 9 sites count');
    await expect(readings).toContainText('Every reading counts.');

    await readings.getByText('All 9 readings as a table').click();
    await readings.getByRole('link', { name: 'take out site 4' }).click();
    await page.waitForURL(/map=mean&site=out-3#decide$/);
    const form = page.getByRole('form', { name: 'Take a reading out, or put one back' });
    await expect(form.getByLabel('Reading', { exact: true })).toHaveValue('out-3');
    await form.getByRole('button', { name: 'Record the decision' }).click();
    await expect(form.getByLabel('Reason')).toHaveAttribute('aria-invalid', 'true');
    await expect(form.getByLabel('Reason')).toBeFocused();
    await form.getByLabel('Reason').fill('Probe slipped <b>twice</b>');
    await form.getByRole('button', { name: 'Record the decision' }).click();
    await expect(readings).toContainText('Site 4 was taken out; the wafer was measured and judged again.');
    await expect(readings).toContainText('1 reading is kept and shown');
    await expect(readings.getByRole('listitem').first()).toContainText(
      'process owner (demonstration): Probe slipped <b>twice</b>',
    );
    await expect(figures).toContainText('8 of 9 sites count');
    expect(await figures.innerText()).not.toBe(whole);
    await expect(page.getByRole('region', { name: 'Map' }).getByRole('img')).toHaveAccessibleName(
      /8 good sites/,
    );

    await readings.getByRole('link', { name: 'Put back…' }).click();
    await page.waitForURL(/site=in-3#decide$/);
    await expect(form.getByLabel('Reading', { exact: true })).toHaveValue('in-3');
    await form.getByLabel('Reason').fill('Read again: it was right');
    await form.getByRole('button', { name: 'Record the decision' }).click();
    await expect(readings).toContainText('Every reading counts.');
    await expect(figures).toContainText('9 of 9 sites count');
    expect(await figures.innerText()).toBe(whole);
    const log = readings.getByRole('list').getByRole('listitem');
    await expect(log.first()).toContainText(
      /Site 4 put back by process owner \(demonstration\), .*: Read again: it was right/,
    );
    await expect(log.nth(1)).toContainText(
      /Site 4 taken out by process owner \(demonstration\), .*: Probe slipped/,
    );
  });

  test.describe('that is none', () => {
    test.use({ statuses: [404] });

    test('answers 404 to every silly number, on the page and for the file', async ({ page, request }) => {
      const silly = [
        '0',
        '-1',
        '1e3',
        'abc',
        '1.5',
        '999999999999999999',
        '99999999999999999999',
        '%27',
        '1%00',
      ];
      for (const id of silly) {
        expect((await request.get(`/wafers/${id}`)).status(), id).toBe(404);
        expect((await request.get(`/api/wafers/${id}/readings.csv`)).status(), id).toBe(404);
      }
      await openPage(page, '/wafers/abc');
      await expect(page.getByRole('heading', { level: 1 })).toBeVisible();
    });
  });
});
