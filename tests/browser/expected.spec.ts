import { expect } from '@playwright/test';
import { csvFile } from './csv-file';
import { openPage } from './open-page';
import { expectSound } from './sound-page';
import { test } from './watched-test';

const heading = { level: 1 } as const;

test.describe('the bench of the physics', () => {
  test('says at once what silicon should measure, and its address says the same again', async ({ page }) => {
    await openPage(page, '/expected');
    // Boron 1e15 is 13.306 Ω·cm (ASTM F723), 3 %/√3 of it 0.23.
    await expect(page.getByRole('heading', heading)).toContainText('13.31 ± 0.23 Ω·cm');
    const form = page.getByRole('form', { name: 'What is asked' });
    await form.getByLabel('Dopant', { exact: true }).selectOption('phosphorus');
    await form.getByLabel('Known of it').selectOption('resistivity');
    await form.getByLabel('Resistivity at 23 °C').fill('10');
    await expect(page.getByRole('heading', heading)).toContainText(/10\.00 ± 0\.26\sΩ·cm/);
    await expect(page.getByRole('img', { name: /Resistivity against doping/ })).toBeVisible();
    const address = page.url();
    expect(address).toContain('resistivityOhmCm=10');
    await page.goto('/');
    await openPage(page, address);
    await expect(page.getByRole('heading', heading)).toContainText(/10\.00 ± 0\.26\sΩ·cm/);
    await expect(form.getByLabel('Resistivity at 23 °C')).toHaveValue('10');
  });

  test('moves the curves with the temperature, by keys', async ({ page }) => {
    await openPage(page, '/expected');
    const slider = page.getByRole('slider', { name: /Temperature of the wafer/ });
    await slider.focus();
    for (let i = 0; i < 4; i += 1) await page.keyboard.press('ArrowRight');
    await expect(page.getByText(/^At 25 °C: 13\.5\d/)).toBeVisible();
    await expect(page.getByRole('img', { name: /against doping at 25 °C/ })).toBeVisible();
    expect(page.url()).toContain('at=25');
  });

  test('asks an implant by dose, range and straggle, and refuses a band where the drive-in leaves the law', async ({
    page,
  }) => {
    await openPage(page, '/expected');
    const form = page.getByRole('form', { name: 'What is asked' });
    await form.getByLabel('What it is').selectOption('implant');
    await form.getByLabel('Dose', { exact: true }).fill('2e13');
    await form.getByLabel('Projected range').fill('0.1');
    await form.getByLabel('Straggle').fill('0.05');
    await expect(page.getByRole('heading', heading)).toContainText('say on what');
    await form.getByLabel('Dopant underneath').selectOption('phosphorus');
    await form.getByLabel('Its density').fill('1e15');
    await expect(page.getByRole('heading', heading)).toContainText(/± .*\sΩ\/□ at 23 °C/);
    await expect(page.getByRole('img', { name: /Density of boron against depth/ })).toBeVisible();
    await form.getByLabel('Drive-in at').fill('900');
    await form.getByLabel('for', { exact: true }).fill('30');
    await form.getByLabel('Dose', { exact: true }).fill('5e15');
    const note = page.getByRole('region', { name: 'Expected value' });
    await expect(note).toContainText('Order of magnitude only, no band');
    await expect(page.getByRole('heading', heading)).toContainText('only the order of magnitude is known');
    await expectSound(page, 'an implant on the bench');
  });

  test('refuses an epitaxial layer on its own type in so many words', async ({ page }) => {
    const layer = 'kind=epi&dopant=phosphorus&given=density&densityPerCm3=1e15&lengthUm=10';
    const on = 'backgroundDopant=arsenic&backgroundDensityPerCm3=1e19';
    await openPage(page, `/expected?${layer}&${on}`);
    const form = page.getByRole('form', { name: 'What is asked' });
    await expect(page.getByRole('heading', heading)).toContainText(
      'a four-point probe measures the substrate',
    );
    await form.getByLabel('Measured by').selectOption('other');
    await expect(page.getByRole('heading', heading)).toContainText(/Ω\/□ at 23 °C/);
  });

  test('tells what would explain a reading, with the usual caution, and gives its budget as a file', async ({
    page,
    request,
  }) => {
    await openPage(
      page,
      '/expected?kind=substrate&dopant=boron&given=density&densityPerCm3=1e15&measured=13',
    );
    await expect(page.getByText('one reading tells no cause from another')).toBeVisible();
    const causes = page.getByRole('table', { name: 'Single causes' });
    await expect(causes.getByRole('row').nth(1)).toContainText(/^doping\+2\.4 ± 1\.7\s%/);
    await expect(page.getByText('Advice from figures alone')).toBeVisible();
    const href = await page.getByRole('link', { name: 'The budget as CSV' }).getAttribute('href');
    const { rows } = await csvFile(request, href ?? '');
    expect(rows[0]).toMatchObject({ part: 'conversion', kind: 'rectangular', bound_percent: '3' });
    const curves = await csvFile(request, '/api/expected/curves.csv');
    expect(curves.rows.length).toBeGreaterThan(500);
  });
});

test('the form of a new stream asks for what its kind is known by', async ({ page }) => {
  await openPage(page, '/setup/streams/new');
  const form = page.getByRole('form', { name: 'New stream' });
  const note = page.getByRole('region', { name: 'Expected value' });
  await form.getByLabel('What it makes').selectOption('diffusion');
  await form.getByLabel('What is measured').selectOption('sheet_resistance');
  await form.getByLabel('Profile in depth').selectOption('gaussian');
  await form.getByLabel('Surface density').fill('1e19');
  await form.getByLabel('Depth known as').selectOption('junction');
  await form.getByLabel('Dopant underneath').selectOption('phosphorus');
  await form.getByLabel('Its density').fill('1e15');
  await form.getByLabel('Depth of the junction').fill('1.517');
  // The gaussian of 1e19 with L = 0.5 µm in 1e15: junction at 1.517 µm, 170.0 Ω/□ (own integral).
  await expect(note).toContainText(/170 ± 20\sΩ\/□/);
  await expect(note).toContainText('1 % more dose reads');
  await form.getByLabel('What it makes').selectOption('crystal');
  await form.getByLabel('What is measured').selectOption('resistivity');
  await form.getByLabel('Dopant density').fill('1e15');
  await expect(note).toContainText('Expected along the crystal');
});
