import { expect } from '@playwright/test';
import { openPage } from './open-page';
import { test } from './watched-test';

test('a new target of a stream charted against expected tells by how much its points move, and no past', async ({
  page,
}) => {
  await openPage(page, '/setup/streams/boron-crystal');
  const form = page.getByRole('form', { name: 'New target revision' });
  await expect(form).toContainText('Wafers made as the latest were would read as before from then on.');
  await form.getByLabel('Dopant density').fill('1.1e15');
  // More dopant is expected to read lower, so that the same wafers read higher against it.
  await expect(form).toContainText(/would read \d\.\d\d\s% higher from then on/);
  await form.getByLabel('Dopant density').fill('none');
  await expect(form).toContainText('By how much they move stands here as soon as the target is whole.');
  await form.getByLabel('Dopant density').fill('1.1e15');
  await expect(form.getByLabel('The rules begin afresh where it takes force')).not.toBeChecked();
  await form.getByLabel('In force from').fill('2020-01-01T00:00');
  await form.getByLabel('Why').fill('another product');
  await form.getByRole('button', { name: 'Record this revision' }).click();
  await expect(form.getByLabel('In force from')).toHaveAccessibleDescription(
    /Wafers processed later are on record.*choose a time after them/,
  );
  await expect(form.getByLabel('Dopant density')).toHaveValue('1.1e15');
});
