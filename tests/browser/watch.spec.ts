import { openPage } from './open-page';
import { test } from './watched-test';

/** These are meant to fail: they show that a fault of a page does not pass unseen. */
test.describe('the watch over pages', () => {
  test.fail();

  test('fails a test whose page asks another origin', async ({ page }) => {
    await openPage(page, '/methods');
    await page.evaluate(() => fetch('http://127.0.0.1:9/').catch(() => null));
  });

  test('fails a test whose page holds a handler that its policy refuses', async ({ page }) => {
    await openPage(page, '/methods');
    await page.evaluate(() => {
      document.body.insertAdjacentHTML('beforeend', '<button onclick="document.title = 1">Press</button>');
    });
    await page.getByRole('button', { name: 'Press' }).click();
  });
});
