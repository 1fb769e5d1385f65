import { expect } from '@playwright/test';
import { csvFile } from './csv-file';
import { openPage } from './open-page';
import { drawUpPlan, ownSlug, recordFile, setUpStream, steadyWafers, waferMapFile } from './own-line';
import { test } from './watched-test';

const SLUG = ownSlug('inherited');
const NAME = `Bench with a past ${SLUG}`;

test.describe('a stream with a past', () => {
  test.describe.configure({ mode: 'serial' });

  test('is judged from its first wafer by limits inherited from elsewhere', async ({ page, request }) => {
    await drawUpPlan(page, `Nine for ${SLUG}`);
    await setUpStream(page, { slug: SLUG, name: NAME, plan: `Nine for ${SLUG}` });
    await openPage(page, `/setup/streams/${SLUG}/limits`);
    await page.getByText('Lower limit, centre line and upper limit from elsewhere').click();
    const form = page.getByRole('form', { name: 'Enter inherited limits' });
    await form.getByLabel('Level, lower limit').fill('4.6');
    await form.getByLabel('Level, centre line').fill('4.5');
    await form.getByLabel('Level, upper limit').fill('4.4');
    await form.getByLabel('In force from').fill('2026-01-01T00:00');
    await form.getByRole('button', { name: 'Enter them as a draft' }).click();
    await expect(form.getByLabel('Level, upper limit')).toHaveAccessibleDescription(
      /The upper limit lies above the lower one\./,
    );
    await expect(form.getByLabel('Why')).toHaveAttribute('aria-invalid', 'true');
    await expect(form.getByLabel('Level, centre line')).toHaveValue('4.5');
    await form.getByLabel('Level, lower limit').fill('4.4');
    await form.getByLabel('Level, upper limit').fill('4.6');
    await form.getByLabel('Subgroups they came from').fill('40');
    await form.getByLabel('Why').fill('From the line before');
    await form.getByRole('button', { name: 'Enter them as a draft' }).click();
    const approval = page.getByRole('form', { name: 'Approve revision 1' });
    await approval.getByLabel('Why these limits are right').fill('The tool is the same');
    await approval.getByLabel('In force for subgroups after').fill('2026-01-01T00:00');
    await approval.getByRole('button', { name: 'Approve revision 1' }).click();
    await expect(page.getByRole('heading', { level: 1 })).toContainText('is judged by revision 1');

    await recordFile(page, 'past.csv', waferMapFile(SLUG, [...steadyWafers(3), ...high]));
    await openPage(page, `/streams/${SLUG}`);
    await expect(page.getByRole('heading', { level: 1 })).toHaveText(
      `${NAME}: change from one subgroup to the next beyond the upper limit, at wafer L1/H1`,
    );
    await expect(page.getByRole('main')).toContainText('Limits are inherited.');
    await expect(page.getByRole('list', { name: 'Key to the charts' })).toContainText(
      '90 % interval of a limit not yet established',
    );
    const { rows } = await csvFile(request, `/api/streams/${SLUG}/points.csv`);
    expect(rows.map((row) => [row['limits_revision'], row['upper_ohm_cm']])).toEqual(
      Array.from({ length: 4 }, () => ['1', '4.6']),
    );
  });

  test('changes its screening with a reason, and shows who changed it', async ({ page }) => {
    await openPage(page, `/setup/streams/${SLUG}/use`);
    const form = page.getByRole('form', { name: 'Change the screening' });
    await form.getByLabel('From now on').selectOption({ label: 'impossible readings alone are taken out' });
    await form.getByRole('button', { name: 'Change the screening' }).click();
    await expect(form.getByLabel('Why')).toHaveAttribute('aria-invalid', 'true');
    await expect(form.getByLabel('From now on')).toHaveValue('impossible');
    await form.getByLabel('Why').fill('Nine sites are too few');
    await form.getByRole('button', { name: 'Change the screening' }).click();
    const row = page.getByRole('table', { name: 'Changes of the screening' }).getByRole('row').nth(1);
    await expect(row).toContainText('Nine sites are too few');
    await expect(row).toContainText('impossible readings alone are taken out');
    await expect(page.getByRole('heading', { level: 1 })).toContainText('impossible readings alone');
  });

  test('says why a draft is not set aside that was set aside meanwhile', async ({ page, context }) => {
    await openPage(page, `/setup/streams/${SLUG}/limits`);
    await page.getByText('Lower limit, centre line and upper limit from elsewhere').click();
    const form = page.getByRole('form', { name: 'Enter inherited limits' });
    await form.getByLabel('Level, lower limit').fill('4.4');
    await form.getByLabel('Level, centre line').fill('4.5');
    await form.getByLabel('Level, upper limit').fill('4.6');
    await form.getByLabel('In force from').fill('2026-01-07T00:00');
    await form.getByLabel('Why').fill('Once more');
    await form.getByRole('button', { name: 'Enter them as a draft' }).click();
    const button = { name: 'Set it aside' };
    await expect(page.getByRole('button', button)).toBeVisible();
    const other = await context.newPage();
    await openPage(other, `/setup/streams/${SLUG}/limits`);
    await other.getByRole('button', button).click();
    await expect(other.getByRole('button', button)).toHaveCount(0);
    await page.getByRole('button', button).click();
    await expect(page.getByText('Only a draft can be set aside.')).toBeVisible();
  });
});

test('a target of an implanted layer takes its calibration from a baseline', async ({ page }) => {
  await openPage(page, '/setup/streams/boron-implant-3');
  await page.getByText('Make it the target’s calibration').click();
  const form = page.getByRole('form', { name: 'Calibrate the target' });
  await expect(form).toContainText(/Ω\/□/);
  await form.getByRole('button', { name: 'Record the calibrated target' }).click();
  await expect(form.getByLabel('Why')).toHaveAccessibleDescription(/Say why/);
  await form.getByLabel('Why').fill('The last quiet stretch');
  await form.getByRole('button', { name: 'Record the calibrated target' }).click();
  const row = page.getByRole('table', { name: 'Target revisions' }).getByRole('row').nth(1);
  await expect(row).toContainText('The last quiet stretch');
  await expect(row).toContainText(/\d\.\d+ ± [\d.]+\s%, \d+ wafers/);
});

/** One wafer beyond the upper limit, after those that are not. */
const high = steadyWafers(1, 4.75, Date.UTC(2026, 0, 6)).map((one) => ({ ...one, wafer: 'H1' }));
