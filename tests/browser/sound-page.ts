import AxeBuilder from '@axe-core/playwright';
import { expect, type Page } from '@playwright/test';

/**
 * Axe with everything that folds away unfolded: all its rules in the light, and in the dark those of contrast, which
 * alone depend on the theme, and on no width: a wide window shows them. And nothing is wider than the window.
 */
export async function expectSound(page: Page, address: string) {
  await page.locator('main details').evaluateAll((all) => all.forEach((one) => one.setAttribute('open', '')));
  const overflow = await page.evaluate(
    () => document.documentElement.scrollWidth - document.documentElement.clientWidth,
  );
  expect.soft(overflow, `${address} scrolls sideways`).toBeLessThanOrEqual(0);
  expect.soft(await seriousViolations(axe(page)), `${address}, light`).toEqual([]);
  if ((page.viewportSize()?.width ?? 0) < 600) return;
  await page.emulateMedia({ colorScheme: 'dark' });
  const contrast = axe(page).withRules(['color-contrast']);
  expect.soft(await seriousViolations(contrast), `${address}, dark`).toEqual([]);
}

/** Legacy mode leaves out frames of other origins, of which there are none, and is several times as fast. */
function axe(page: Page): AxeBuilder {
  return new AxeBuilder({ page }).setLegacyMode().options({ resultTypes: ['violations'] });
}

async function seriousViolations(builder: AxeBuilder): Promise<string[]> {
  const { violations } = await builder.analyze();
  return violations
    .filter(({ impact }) => impact === 'serious' || impact === 'critical')
    .flatMap(({ id, nodes }) => nodes.map(({ target }) => `${id}: ${target.join(' ')}`));
}
