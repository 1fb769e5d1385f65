import type { Page, Response } from '@playwright/test';

/** Goes to an address and waits until React has taken the page over, so that keys and forms are heard. */
export async function openPage(page: Page, address: string): Promise<Response | null> {
  const response = await page.goto(address);
  await pageIsReady(page);
  return response;
}

/** React has taken the page over, and no chart waits to know its width. */
export async function pageIsReady(page: Page): Promise<void> {
  await page.waitForFunction(() => {
    const keys = Object.keys(document.querySelector('dialog') ?? {});
    return keys.some((key) => key.startsWith('__reactFiber'));
  });
}
