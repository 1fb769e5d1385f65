import { readFile } from 'node:fs/promises';
import { expect, type Page } from '@playwright/test';
import { csvFile } from './csv-file';
import { openPage } from './open-page';
import {
  drawUpPlan,
  OWN_SITES,
  ownSlug,
  sendFile,
  setUpStream,
  steadyWafers,
  waferMapFile,
} from './own-line';
import { test } from './watched-test';

const SLUG = ownSlug('intake');
const NAME = `Intake of a bench ${SLUG}`;

const answer = (page: Page) => page.getByRole('heading', { level: 1 });
const problems = (page: Page) => page.getByRole('table', { name: 'Problems' });

/** A file of one sound wafer of the test's own stream, its text changed by `spoil`. */
const spoilt = (wafer: string, spoil: (text: string) => string = (text) => text) =>
  spoil(waferMapFile(SLUG, [{ ...steadyWafers(1)[0]!, wafer, measuredAt: '2026-02-01T00:00:00Z' }]));

test.describe.serial('intake', () => {
  test.beforeAll(async ({ browser, baseURL }) => {
    const page = await browser.newPage({ baseURL: baseURL! });
    await drawUpPlan(page, `Nine for ${SLUG}`);
    await setUpStream(page, { slug: SLUG, name: NAME, plan: `Nine for ${SLUG}` });
    await page.close();
  });

  test('draws what a sound file holds, records it, and shows it on its stream', async ({ page }) => {
    await openPage(page, `/streams/${SLUG}`);
    await expect(answer(page)).toHaveText(`${NAME}: no wafer yet`);
    const text = waferMapFile(SLUG, steadyWafers(3));
    await sendFile(page, 'three wafers.csv', text);
    await expect(answer(page)).toHaveText('3 wafer maps in three wafers.csv can be recorded');
    const maps = page.getByRole('region', { name: NAME }).getByRole('listitem');
    await expect(maps).toHaveCount(3);
    await expect(maps.first().getByRole('img')).toHaveAccessibleName(/^W01 \(L1\): 9 good sites/);
    await page.getByRole('button', { name: 'Record 3 maps' }).click();
    await page.waitForURL('**/intake/batches/*');
    await expect(answer(page)).toHaveText('3 wafer maps were recorded');
    await page.getByRole('link', { name: NAME }).click();
    await page.waitForURL(`**/streams/${SLUG}`);
    const newest = page.getByRole('table', { name: 'The newest wafers of this stretch' });
    await expect(newest.getByRole('rowheader')).toHaveText([/^W03/, /^W02/, /^W01/]);

    await sendFile(page, 'three again.csv', text);
    await expect(answer(page)).toHaveText('three again.csv is on record already');
    await page.getByRole('button', { name: 'Discard the file' }).click();
    await page.waitForURL('**/intake');
    await openPage(page, `/streams/${SLUG}`);
    await expect(newest.getByRole('rowheader')).toHaveCount(3);

    await sendFile(page, 'other readings.csv', text.replace(/[\d.]+\n$/, '4.6\n'));
    await expect(problems(page)).toContainText('raw readings are never changed');
  });

  test('takes the sites as a wafer’s own file of readings gives them', async ({ page, request }) => {
    const board = await (await request.get('/?find=boron-implant-2')).text();
    const wafer = /href="\/wafers\/(\d+)"/.exec(board)?.[1];
    const { rows } = await csvFile(request, `/api/wafers/${wafer}/readings.csv`);
    const lines = rows.map((row) =>
      [row['x_mm'], row['y_mm'], row['sheet_resistance_ohm_sq_as_sent']].join(','),
    );
    await sendFile(page, 'bare.csv', `x_mm,y_mm,sheet_resistance_ohm_sq\n${lines.join('\n')}\n`);
    await expect(answer(page)).toHaveText('The map in bare.csv cannot be recorded');
    await expect(problems(page)).toContainText('no stream is named');
    const form = page.getByRole('form', { name: 'What the file does not say' });
    await form.getByLabel('Stream').selectOption('boron-implant-2');
    await form.getByLabel('Wafer', { exact: true }).fill(SLUG);
    await form.getByLabel('Lot', { exact: true }).fill('Bare');
    await form.getByLabel('Measured at').fill('2026-11-30T10:20');
    await form.getByRole('button', { name: 'Check again with these' }).click();
    await page.waitForURL(/stream=boron-implant-2/);
    await expect(answer(page)).toHaveText('1 wafer map in bare.csv can be recorded');
    await expect(form.getByLabel('Lot', { exact: true })).toHaveValue('Bare');
    await expect(page.getByRole('img', { name: /121 good sites/ })).toBeVisible();
    await page.getByRole('button', { name: 'Discard the file' }).click();
    await page.waitForURL('**/intake');
  });

  test('names every refusal with its line and column, and records nothing of it', async ({ page }) => {
    const faults: readonly [string, string | Buffer, RegExp][] = [
      ['binary.csv', Buffer.from([0x50, 0x4b, 3, 4, 0, 0, 1]), /binary file/],
      ['header only.csv', 'stream,wafer,x_mm,y_mm,resistivity_ohm_cm\n', /1\s+—\s+—\s+there are no readings/],
      ['no header.csv', '0,0,4.5\n1,1,4.6\n', /the header has no column x_mm/],
      [
        'two units.csv',
        spoilt('T', (text) => text.replace(/^.*$/m, '$&,sheet_resistance_ohm_sq')),
        /sheet_resistance_ohm_sq.*contradict each other/,
      ],
      [
        'elsewhere.csv',
        spoilt('E').replaceAll(SLUG, 'no-such-stream'),
        /2\s+stream\s.*there is no stream "no-such-stream"/,
      ],
      [
        'local time.csv',
        spoilt('O').replaceAll('2026-02-01T00:00:00Z', '2026-02-01T00:00:00'),
        /2\s+measured_at\s.*no offset from UTC/,
      ],
      ['outside.csv', spoilt('X').replace(',60,0,', ',90,0,'), /3\s+x_mm\s.*lies outside a wafer of 150 mm/],
      ['no site.csv', spoilt('S').replace(',60,0,', ',55,0,'), /3\s+x_mm\s.*is no site of the plan/],
      ['words.csv', spoilt('N').replace(/[\d.]+\n$/, 'much\n'), /10\s+resistivity_ohm_cm\s.*much/],
      ['<img src=x>.csv', 'a"b\n', /1\s+—\s+—\s+quotes that do not match/],
    ];
    for (const [name, content, words] of faults) {
      await sendFile(page, name, content);
      await expect(answer(page), name).toContainText(/cannot be (read|recorded)/);
      const rows = await problems(page).getByRole('row').allInnerTexts();
      expect(
        rows.some((row) => words.test(row)),
        `${name}: ${rows.join(' | ')}`,
      ).toBe(true);
      await expect(page.getByRole('button', { name: /^Record/ })).toHaveCount(0);
      await page.getByRole('button', { name: 'Discard the file' }).click();
      await page.waitForURL('**/intake');
    }
    await sendFile(page, 'empty.csv', '');
    await expect(page.getByRole('status').filter({ hasText: 'empty.csv is empty.' })).toBeVisible();
    await expect(page).toHaveURL('/intake');
    await openPage(page, `/streams/${SLUG}`);
    await expect(
      page.getByRole('table', { name: 'The newest wafers of this stretch' }).getByRole('rowheader'),
    ).toHaveCount(3);
  });

  test('records the sound part of a file only where that is asked for', async ({ page, request }) => {
    const [good, bad] = steadyWafers(2, 4.5, Date.UTC(2026, 2, 1));
    const text = waferMapFile(SLUG, [
      { ...good!, wafer: 'SOUND' },
      { ...bad!, wafer: 'FAULTY', values: bad!.values.with(4, 'x') },
    ]);
    await sendFile(page, 'half.csv', text);
    await expect(answer(page)).toHaveText('1 of 2 wafer maps in half.csv cannot be recorded');
    const download = page.waitForEvent('download');
    await page.getByRole('link', { name: 'These problems as CSV' }).click();
    const file = await (await download).path();
    expect(await readFile(file, 'utf8')).toMatch(/^file,line,column,.*\r\nhalf\.csv,15,resistivity_ohm_cm,/);

    const form = page.getByRole('form', { name: 'Record this file' });
    await form.getByRole('button', { name: 'Record the 1 map' }).click();
    const box = form.getByRole('checkbox', { name: /^Record the sound ones/ });
    await expect(box).toHaveAttribute('aria-invalid', 'true');
    await box.check();
    await form.getByRole('checkbox', { name: /history/ }).check();
    await form.getByRole('button', { name: 'Record the 1 map' }).click();
    await page.waitForURL('**/intake/batches/*');
    await expect(answer(page)).toHaveText('1 wafer map was recorded, 1 was refused');
    await expect(page.getByText('open no excursions')).toBeVisible();
    await expect(page.getByRole('table', { name: 'Refused' })).toContainText('resistivity_ohm_cm');
    const batch = new URL(page.url()).pathname;
    const refusals = await csvFile(request, `/api${batch}/refusals`);
    expect(refusals.rows).toHaveLength(1);
    await openPage(page, '/intake');
    await expect(page.getByRole('row', { name: /^half\.csv/ }).first()).toContainText('history');
  });

  test('opens no excursion for history, and one for the same wafer otherwise', async ({ page }) => {
    for (const [kind, cases] of [
      ['history', '0'],
      ['new', /^[1-9]\d*$/],
    ] as const) {
      const slug = `${SLUG}-${kind}`;
      await setUpStream(page, { slug, name: slug, plan: `Nine for ${SLUG}` });
      const stray = { ...steadyWafers(1, 6)[0]!, wafer: 'STRAY', measuredAt: '2026-03-01T00:00:00Z' };
      await sendFile(page, `${kind}.csv`, waferMapFile(slug, [...steadyWafers(25), stray], OWN_SITES));
      if (kind === 'history') await page.getByRole('checkbox', { name: /history/ }).check();
      await page.getByRole('button', { name: 'Record 26 maps' }).click();
      await page.waitForURL('**/intake/batches/*');
      const row = page.getByRole('table', { name: 'Recorded, by stream' }).getByRole('row', { name: slug });
      await expect(row.getByRole('cell').last()).toHaveText(typeof cases === 'string' ? cases : /[1-9]/);
    }
  });
});

test.describe('an upload', () => {
  test.use({ statuses: [403] });

  test('from a page of another origin is refused', async ({ request }) => {
    const from = (headers: Record<string, string>) =>
      request.post('/api/intake', {
        data: 'x_mm,y_mm\n',
        headers: { 'content-type': 'text/csv', ...headers },
      });
    expect((await from({ origin: 'http://elsewhere.example' })).status()).toBe(403);
    expect((await from({ 'sec-fetch-site': 'cross-site' })).status()).toBe(403);
  });
});
