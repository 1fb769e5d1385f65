import { expect } from '@playwright/test';
import { openPage } from './open-page';
import { test } from './watched-test';

test('the focus is seen wherever the key Tab leads', async ({ page }) => {
  for (const address of ['/', '/streams/phosphorus-furnace-c', '/setup/streams/boron-implant-1/events']) {
    await openPage(page, address);
    const unseen: string[] = [];
    for (let press = 0; press < 40; press += 1) {
      await page.keyboard.press('Tab');
      unseen.push(...(await page.evaluate(focusUnseen)));
    }
    expect.soft(unseen, address).toEqual([]);
  }
});

/** The focused element, by its words, if nothing about it shows that it has the focus. Runs in the page. */
function focusUnseen(): string[] {
  const element = document.activeElement;
  if (element === null || element === document.body) return [];
  const { outlineStyle, outlineWidth } = getComputedStyle(element);
  const { width, height } = element.getBoundingClientRect();
  const isSeen = outlineStyle !== 'none' && Number.parseFloat(outlineWidth) >= 1 && width > 1 && height > 1;
  return isSeen ? [] : [`${element.tagName} ${element.textContent?.slice(0, 40)}`];
}
