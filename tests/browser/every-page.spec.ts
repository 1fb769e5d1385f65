import { expect, type APIRequestContext } from '@playwright/test';
import { csvFile } from './csv-file';
import { openPage } from './open-page';
import { waferMapFile } from './own-line';
import { expectSound } from './sound-page';
import { test } from './watched-test';

/** The pages of each place; `*` stands for an id that there is. */
const PLACES = {
  'the board and streams': [
    '/',
    '/?find=nowhere',
    '/streams',
    '/streams/phosphorus-furnace-c',
    '/streams/boron-crystal?gauge=Gauge+1',
    '/methods',
    '/expected',
    '/expected?kind=implant&dopant=boron&profile=implant&given=dose&dosePerCm2=5e14&rangeUm=0.1&lengthUm=0.05&backgroundDopant=phosphorus&backgroundDensityPerCm3=1e15&measured=200&at=30',
    '/expected?kind=crystal&dopant=boron&given=density&densityPerCm3=1e16&alongCrystal=on&counterDopant=phosphorus&counterDensityPerCm3=5e15',
    '/measure-again',
    '/measure-again?stream=boron-crystal&page=9',
  ],
  'wafers and excursions': [
    '/wafers/*',
    '/wafers/*?map=usual&site=out-3',
    '/excursions?state=all',
    '/excursions?state=acknowledged&stream=boron-crystal',
    '/excursions/*',
  ],
  'intake and setup': [
    '/intake',
    '/intake/*',
    '/intake/batches/*',
    '/setup',
    '/setup/plans/new',
    '/setup/streams/new',
    '/account',
  ],
  'the setup of a stream': [
    '/setup/streams/boron-implant-1',
    '/setup/streams/boron-crystal/specification',
    '/setup/streams/boron-crystal/limits',
    '/setup/streams/boron-implant-1/events',
    '/setup/streams/boron-implant-1/use',
  ],
};
const NOT_THERE = [
  '/no-such-page',
  '/streams/no-such',
  '/wafers/0',
  '/excursions/0',
  '/intake/no-such',
  '/intake/batches/0',
  '/setup/streams/no-such',
];

test.describe.configure({ mode: 'parallel', timeout: 180_000 });
test.use({ trace: 'off' });

test.describe('every page', { tag: '@phone' }, () => {
  for (const [place, addresses] of Object.entries(PLACES)) {
    test(`of ${place} is as wide as its window and free of serious axe violations in light and dark`, async ({
      page,
      request,
    }) => {
      const ids = await someIds(request);
      for (const address of addresses.map((one) =>
        one.replace(/(\w+)\/\*/, (_, kind) => `${kind}/${ids[kind]}`),
      )) {
        await page.emulateMedia({ colorScheme: 'light' });
        const response = await openPage(page, address);
        expect.soft(response?.status(), address).toBe(200);
        await expectSound(page, address);
      }
    });
  }

  test.describe('that is not there', () => {
    test.use({ statuses: [404] });

    test('answers 404, says so in words and offers a way on', async ({ page }) => {
      for (const address of NOT_THERE) {
        await page.emulateMedia({ colorScheme: 'light' });
        const response = await openPage(page, address);
        expect.soft(response?.status(), address).toBe(404);
        expect.soft(await page.getByRole('main').getByRole('link').count(), address).toBeGreaterThan(0);
        await expectSound(page, address);
      }
    });
  });
});

/** A wafer, a case and a batch that are on record, by the word before their id in an address. */
async function someIds(request: APIRequestContext): Promise<Record<string, string | undefined>> {
  const board = await (await request.get('/?find=n-epi-on-p')).text();
  const { rows: cases } = await csvFile(request, '/api/excursions/csv?state=all');
  const { rows: batches } = await csvFile(request, '/api/intake/batches');
  return {
    wafers: /href="\/wafers\/(\d+)"/.exec(board)?.[1],
    excursions: cases[0]?.['excursion'],
    intake: await halfSoundFile(request),
    batches: batches.at(-1)?.['batch'],
  };
}

/** The token of a file that waits to be recorded: one of its two wafers is sound, the other is not. */
async function halfSoundFile(request: APIRequestContext): Promise<string | undefined> {
  const { rows } = await csvFile(request, '/api/setup/plans');
  const sites = rows
    .filter((row) => row['plan'] === 'Polar 49, 200 mm')
    .map((row) => ({ xMm: Number(row['x_mm']), yMm: Number(row['y_mm']) }));
  const wafer = {
    wafer: 'A',
    measuredAt: '2026-01-01T00:00:00Z',
    values: sites.map(({ xMm }) => 4.5 + xMm / 1000),
  };
  const faulty = { ...wafer, wafer: 'B', values: wafer.values.with(7, Number.NaN) };
  const answer = await request.post('/api/intake', {
    data: waferMapFile('n-epi-on-p', [wafer, faulty], sites).replace('NaN', 'x'),
    headers: { 'content-type': 'text/csv', 'sec-fetch-site': 'same-origin', 'x-file-name': 'half.csv' },
  });
  const { href } = (await answer.json()) as { href: string };
  return href.split('/').at(-1);
}
