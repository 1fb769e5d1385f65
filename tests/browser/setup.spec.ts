import { expect } from '@playwright/test';
import { csvFile } from './csv-file';
import { openPage } from './open-page';
import { drawUpPlan, ownSlug, recordFile, setUpStream, steadyWafers, waferMapFile } from './own-line';
import { test } from './watched-test';

const SLUG = ownSlug('setup');
const NAME = `Setup of a bench ${SLUG}`;

test.describe('setup', () => {
  test('draws a site plan as it is typed, and keeps what was typed where something is wrong', async ({
    page,
  }) => {
    await openPage(page, '/setup/plans/new');
    const form = page.getByRole('form', { name: 'New site plan' });
    const main = page.getByRole('main');
    await expect(main).toContainText('49 sites');
    await form.getByLabel('Rings').fill('2');
    await expect(main).toContainText('25 sites');
    await form.getByLabel('Out to a radius of').fill('120');
    await expect(main).toContainText('No plan yet: ');
    await form.getByLabel('Out to a radius of').fill('93');
    await form.getByRole('button', { name: 'Keep this plan' }).click();
    await expect(form.getByLabel('Name')).toHaveAttribute('aria-invalid', 'true');
    await expect(form.getByLabel('Name')).toHaveAccessibleDescription(/Give the plan a name\./);
    await expect(form.getByLabel('Rings')).toHaveValue('2');

    await form.getByLabel('How the sites lie').selectOption('list');
    await form.getByLabel(/^Sites, a line/).fill('x,y\n0,0\n10;0\n-10\t5');
    await expect(main).toContainText('3 sites');
    await form.getByLabel(/^Sites, a line/).fill('0,0\nten,0');
    await expect(main).toContainText('No plan yet: Line 2, “ten,0”, is not two numbers');
    await form.getByLabel(/^Sites, a line/).fill('0,0\n10,0\n-10,0');
    await form.getByLabel('Name').fill(`Three for ${SLUG}`);
    await form.getByRole('button', { name: 'Keep this plan' }).click();
    await page.waitForURL('**/setup#plans');
    await expect(page.getByRole('table', { name: 'Site plans' })).toContainText(`Three for ${SLUG}`);
  });

  test('says what to expect as a doping is typed', async ({ page }) => {
    await openPage(page, '/setup/streams/new');
    const form = page.getByRole('form', { name: 'New stream' });
    const note = page.getByRole('region', { name: 'Expected value' });
    await expect(note).toContainText('Type what is known of the dopant');
    await form.getByRole('combobox', { name: 'Dopant', exact: true }).selectOption('phosphorus');
    await form.getByLabel('Dopant density').fill('1e15');
    await expect(note).toContainText('4.48 ± 0.12 Ω·cm');
    const before = await note.innerText();
    await form.getByLabel('Dopant density').fill('2 × 10¹⁵');
    await expect(note).not.toHaveText(before);
    await expect(note).toContainText(/2\.\d+ ± [\d.]+\sΩ·cm/);
    await form.getByLabel('Dopant density').fill('1,5e15');
    await expect(note).toContainText('Nothing yet: ');

    await form.getByLabel('Name', { exact: true }).fill('Ein Kanal');
    await expect(form.getByText('Left empty: ein-kanal')).toBeVisible();
    await form.getByLabel('Wafers in a point').fill('3');
    await form.getByRole('button', { name: 'Set up this stream' }).click();
    await expect(form.getByRole('status')).toContainText('fields need another look.');
    for (const [label, words] of [
      ['Step', 'Name the step.'],
      ['Site plan', 'Choose a site plan.'],
      ['Wafers in a point', 'A point that is one wafer has one wafer.'],
      ['Dopant density', '“1,5e15” is not a number.'],
    ] as const) {
      await expect(form.getByLabel(label, { exact: true })).toHaveAttribute('aria-invalid', 'true');
      await expect(form.getByLabel(label, { exact: true })).toHaveAccessibleDescription(new RegExp(words));
    }
    await expect(form.getByLabel('Name', { exact: true })).toHaveValue('Ein Kanal');
    await expect(form.getByLabel('Dopant density')).toHaveValue('1,5e15');
    await expect(form.getByRole('combobox', { name: 'Dopant', exact: true })).toHaveValue('phosphorus');
  });

  test('brings a stream from its plan to approved limits that its charts show', async ({ page, request }) => {
    const root = `/setup/streams/${SLUG}`;
    await test.step('a plan, a stream and thirty wafers', async () => {
      await drawUpPlan(page, `Nine for ${SLUG}`);
      await setUpStream(page, { slug: SLUG, name: NAME, plan: `Nine for ${SLUG}` });
      await expect(page.getByRole('heading', { level: 1 })).toContainText(
        `${NAME} aims at phosphorus, 1.00 × 10¹⁵ cm⁻³`,
      );
      await recordFile(page, 'setup.csv', waferMapFile(SLUG, steadyWafers(30)));
    });

    await test.step('a new revision of the target, with a reason', async () => {
      await openPage(page, root);
      const form = page.getByRole('form', { name: 'New target revision' });
      await form.getByLabel('Tolerance of the density').fill('5');
      await form.getByRole('button', { name: 'Record this revision' }).click();
      await expect(form.getByLabel('Why')).toHaveAccessibleDescription(/Say why/);
      await expect(form.getByLabel('Tolerance of the density')).toHaveValue('5');
      await form.getByLabel('Why').fill('Agreed with the next step');
      await form.getByRole('button', { name: 'Record this revision' }).click();
      await expect(page.getByText('Target revision 2 is recorded.')).toBeVisible();
      const row = page.getByRole('table', { name: 'Target revisions' }).getByRole('row').nth(1);
      await expect(row).toContainText('± 5 %');
      await expect(row).toContainText('Agreed with the next step');
    });

    await test.step('a specification; limits the wrong way round are refused beside their field', async () => {
      await page.getByRole('link', { name: 'Specification', exact: true }).click();
      await page.waitForURL(`**${root}/specification`);
      const form = page.getByRole('form', { name: 'New specification revision' });
      await form.getByLabel('Wafer, lower').fill('5');
      await form.getByLabel('Wafer, upper').fill('4');
      await form.getByLabel('Why').fill('Customer drawing');
      await form.getByRole('button', { name: 'Record this revision' }).click();
      await expect(form.getByLabel('Wafer, upper')).toHaveAccessibleDescription(
        /The upper limit lies above the lower one\./,
      );
      await expect(form.getByLabel('Wafer, lower')).toHaveValue('5');
      await form.getByLabel('Wafer, lower').fill('4');
      await form.getByLabel('Wafer, upper').fill('5');
      await form.getByRole('button', { name: 'Record this revision' }).click();
      await expect(page.getByRole('heading', { level: 1 })).toContainText('wafer 4.000 to 5.000 Ω·cm');
    });

    await test.step('limits drawn up from the last subgroups, and approved', async () => {
      await page.getByRole('link', { name: 'Limits', exact: true }).click();
      await page.waitForURL(`**${root}/limits`);
      await expect(page.getByRole('heading', { level: 1 })).toContainText(
        'is judged by revision 1, provisional, from 25 subgroups, not approved yet',
      );
      await expect(page.getByText('30 judged subgroups: these limits would be young.')).toBeVisible();
      const draft = page.getByRole('form', { name: 'Draft these limits' });
      await draft.getByRole('button', { name: 'Draft these limits' }).click();
      await expect(draft.getByLabel('Why this span')).toHaveAttribute('aria-invalid', 'true');
      await draft.getByLabel('Why this span').fill('All that ran quietly');
      await draft.getByRole('button', { name: 'Draft these limits' }).click();
      await expect(draft.getByRole('status')).toContainText('The draft is made');
      const approval = page.getByRole('form', { name: 'Approve revision 2' });
      await approval.getByLabel('Why these limits are right').fill('Thirty wafers, no signal');
      await approval.getByLabel('In force for subgroups after').fill('2026-01-06T02:30');
      await approval.getByRole('button', { name: 'Approve revision 2' }).click();
      await expect(page.getByRole('heading', { level: 1 })).toContainText(
        'is judged by revision 2, young, from 30 subgroups',
      );
      await expect(approval).toHaveCount(0);
    });

    await test.step('an event after which the charts begin afresh', async () => {
      await page.getByRole('link', { name: 'Events', exact: true }).click();
      await page.waitForURL(`**${root}/events`);
      const form = page.getByRole('form', { name: 'Record an event' });
      await form.getByRole('button', { name: 'Record this event' }).click();
      await expect(form.getByLabel('In words')).toHaveAccessibleDescription(/Say what was done\./);
      await form.getByLabel('What').selectOption('maintenance');
      await form.getByLabel('When').fill('2026-01-06T03:30');
      await form.getByLabel('In words').fill('New liner');
      await form.getByRole('checkbox', { name: 'The charts begin afresh after it' }).check();
      await form.getByRole('button', { name: 'Record this event' }).click();
      const table = page.getByRole('table', { name: 'Adjustments and maintenance' });
      await expect(table.getByRole('row', { name: /New liner/ })).toContainText('begin afresh after it');
    });

    await test.step('all of it stands on the page of the stream and in its files', async () => {
      await page.getByRole('link', { name: 'charts', exact: true }).click();
      await page.waitForURL(`**/streams/${SLUG}`);
      const beside = page.getByRole('complementary');
      await expect(beside).toContainText('2, young');
      await expect(beside).toContainText('New liner');
      await expect(page.getByRole('list', { name: 'Key to the charts' })).toContainText(
        '90 % interval of a limit not yet established',
      );
      const { rows } = await csvFile(request, `/api/streams/${SLUG}/points.csv`);
      expect(rows.map((row) => row['limits_revision'])).toEqual(expect.arrayContaining(['1', '2']));
      expect(rows.at(-1)?.['limits_revision']).toBe('2');
      for (const [table, first] of [
        ['targets', 'revision'],
        ['specifications', 'revision'],
        ['limits', 'revision'],
        ['events', 'at'],
      ] as const) {
        const file = await csvFile(request, `/api/setup/streams/${SLUG}/${table}`);
        expect(file.header[0], table).toBe(first);
        expect(file.rows.length, table).toBeGreaterThan(0);
      }
    });

    await test.step('taken out of use it leaves the board, and comes back', async () => {
      await openPage(page, `${root}/use`);
      await page.getByRole('button', { name: 'Take it out of use' }).click();
      await expect(page.getByRole('heading', { level: 1 })).toContainText('is out of use');
      await openPage(page, `/?find=${SLUG}`);
      await expect(page.getByRole('heading', { level: 1 })).toContainText('No stream matches');
      await openPage(page, `${root}/use`);
      await page.getByRole('button', { name: 'Take it back into use' }).click();
      await expect(page.getByRole('heading', { level: 1 })).toContainText('is in use');
    });
  });
});
