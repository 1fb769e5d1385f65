import { expect, test } from '@playwright/test';

test.describe('the frame around every page', () => {
  for (const address of ['/', '/no-such-page']) {
    test(`sends with ${address} only scripts that carry the nonce of the response`, async ({ page }) => {
      const refused: string[] = [];
      page.on('console', (message) => {
        if (message.text().includes('Content Security Policy')) refused.push(message.text());
      });
      const response = await page.goto(address);
      const policy = response?.headers()['content-security-policy'] ?? '';
      const nonce = /'nonce-([^']+)'/.exec(policy)?.[1] ?? '';
      expect(nonce.length).toBeGreaterThan(20);
      // What these load later comes without one: 'strict-dynamic' trusts it because it trusts them.
      const scripts = ((await response?.text()) ?? '').match(/<script[^>]*>/g) ?? [];
      expect(scripts.length).toBeGreaterThan(0);
      expect(scripts.filter((script) => !script.includes(`nonce="${nonce}"`))).toEqual([]);
      expect(refused).toEqual([]);
    });
  }

  test('takes a fresh nonce for every response', async ({ request }) => {
    const policies = await Promise.all(
      [1, 2].map(async () => (await request.get('/')).headers()['content-security-policy']),
    );
    expect(policies[0]).not.toBe(policies[1]);
  });

  test('has its icon where browsers look for one before a page names it', async ({ request }) => {
    const [guessed, named] = await Promise.all(['/favicon.ico', '/icon.svg'].map((one) => request.get(one)));
    expect([guessed?.status(), guessed?.headers()['content-type']]).toEqual([200, 'image/svg+xml']);
    expect(await guessed?.text()).toBe(await named?.text());
  });

  test('refuses a foreign name and a foreign page that posts', async ({ request }) => {
    const rebound = await request.get('/', { headers: { host: 'rebound.example' } });
    expect(rebound.status()).toBe(421);
    const forged = await request.post('/', { headers: { origin: 'http://elsewhere.example' } });
    expect(forged.status()).toBe(403);
  });
});
