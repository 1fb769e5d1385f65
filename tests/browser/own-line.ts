import { expect, type Page } from '@playwright/test';
import { openPage } from './open-page';

/** The centre and a ring of eight: the plan of every stream that a test sets up for itself. */
export const OWN_SITES = [
  { xMm: 0, yMm: 0 },
  ...[0, 1, 2, 3, 4, 5, 6, 7].map((eighth) => ({
    xMm: Number((60 * Math.cos((eighth * Math.PI) / 4)).toFixed(3)),
    yMm: Number((60 * Math.sin((eighth * Math.PI) / 4)).toFixed(3)),
  })),
];

/** A name that no other run of a test has taken. */
export function ownSlug(word: string): string {
  return `${word}-${process.pid.toString(36)}${Date.now().toString(36)}`;
}

/** Draws up a site plan of nine sites by the page for it. */
export async function drawUpPlan(page: Page, name: string): Promise<void> {
  await openPage(page, '/setup/plans/new');
  const form = page.getByRole('form', { name: 'New site plan' });
  await form.getByLabel('Name').fill(name);
  await form.getByLabel('Wafer diameter').fill('150');
  await form.getByLabel('Out to a radius of').fill('60');
  await form.getByLabel('Rings').fill('1');
  await form.getByRole('button', { name: 'Keep this plan' }).click();
  await page.waitForURL('**/setup#plans');
}

/** Sets up a stream of phosphorus-doped wafers, 1 × 10¹⁵ cm⁻³, by the page for it. */
export async function setUpStream(
  page: Page,
  stream: { slug: string; name: string; plan: string },
): Promise<void> {
  await openPage(page, '/setup/streams/new');
  const form = page.getByRole('form', { name: 'New stream' });
  await form.getByLabel('Name', { exact: true }).fill(stream.name);
  await form.getByLabel('Name in files and addresses').fill(stream.slug);
  await form.getByLabel('Step').fill('Epitaxy');
  await form.getByLabel('Tool').fill('Bench 9');
  await form.getByLabel('Recipe').fill('N-9');
  await form.getByLabel('Site plan').selectOption({ label: stream.plan });
  await form.getByRole('combobox', { name: 'Dopant', exact: true }).selectOption('phosphorus');
  await form.getByLabel('Dopant density').fill('1e15');
  await form.getByRole('button', { name: 'Set up this stream' }).click();
  await page.waitForURL(`**/setup/streams/${stream.slug}`);
}

interface OwnWafer {
  wafer: string;
  measuredAt: string;
  /** Readings in the order of the sites, Ω·cm. */
  values: readonly (number | string)[];
}

/** A wafer-map file of wafers of one stream. */
export function waferMapFile(
  slug: string,
  wafers: readonly OwnWafer[],
  sites: readonly { xMm: number; yMm: number }[] = OWN_SITES,
): string {
  const head = 'stream,lot,wafer,measured_at,gauge,x_mm,y_mm,resistivity_ohm_cm\n';
  const rows = wafers.flatMap(({ wafer, measuredAt, values }) =>
    values.map((value, i) =>
      [slug, 'L1', wafer, measuredAt, 'Gauge 1', sites[i]?.xMm, sites[i]?.yMm, value].join(','),
    ),
  );
  return `${head}${rows.join('\n')}\n`;
}

/** Wafers an hour apart about a level, that of wafer `i` moved by a fixed scatter of a few tenths of a percent. */
export function steadyWafers(count: number, level = 4.5, from = Date.UTC(2026, 0, 5)): OwnWafer[] {
  return Array.from({ length: count }, (_, i) => ({
    wafer: `W${String(i + 1).padStart(2, '0')}`,
    measuredAt: new Date(from + i * 3_600_000).toISOString(),
    values: readings(level * (1 + 0.003 * Math.sin(5 * i * (1 + 0.7 * i))), i),
  }));
}

/** Nine readings of a wafer: a bowl of one percent and a fixed scatter. */
export function readings(level: number, seed = 0): number[] {
  return OWN_SITES.map(({ xMm, yMm }, i) =>
    Number(
      (
        level *
        (1 + 0.01 * ((xMm * xMm + yMm * yMm) / 3600 - 0.5) + 0.001 * Math.sin(12.9898 * (i + 1) * (seed + 2)))
      ).toFixed(5),
    ),
  );
}

/** Chooses a file on the intake page and asks for its check. */
export async function sendFile(page: Page, name: string, content: string | Buffer): Promise<void> {
  if (new URL(page.url()).pathname !== '/intake') await openPage(page, '/intake');
  const form = page.getByRole('form', { name: 'Send a wafer-map file' });
  await form
    .getByLabel('Drop a wafer-map file here, or choose one')
    .setInputFiles({ name, mimeType: 'text/csv', buffer: Buffer.from(content) });
  await form.getByRole('button', { name: 'Check this file' }).click();
}

/** Sends a sound file and records it; ends on the page of its batch. */
export async function recordFile(page: Page, name: string, content: string): Promise<void> {
  await sendFile(page, name, content);
  await page.getByRole('button', { name: /^Record \d+ maps?$/ }).click();
  await page.waitForURL('**/intake/batches/*');
  await expect(page.getByRole('heading', { level: 1 })).toContainText('recorded');
}
