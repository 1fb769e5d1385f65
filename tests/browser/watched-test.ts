import { expect, test as plain } from '@playwright/test';

/**
 * A test whose page is watched: an error on its console (a refusal by the Content Security Policy is one), an error
 * nobody caught, or a request to another origin fails it. `statuses` are answers of the server that the test asks for:
 * browsers report those on the console too.
 */
export const test = plain.extend<{ statuses: readonly number[]; watched: undefined }>({
  statuses: [[], { option: true }],
  watched: [
    async ({ page, baseURL, statuses }, use) => {
      const faults: string[] = [];
      page.on('console', (message) => {
        const status = /^Failed to load resource: .* status of (\d+)/.exec(message.text())?.[1];
        const isAsked = status !== undefined && statuses.includes(Number(status));
        if (message.type() === 'error' && !isAsked)
          faults.push(`console: ${message.text()} (${message.location().url})`);
      });
      page.on('pageerror', (error) => faults.push(`uncaught: ${error.message}`));
      page.on('request', (request) => {
        const { protocol, origin } = new URL(request.url());
        if (protocol !== 'data:' && protocol !== 'blob:' && origin !== baseURL) {
          faults.push(`a request left for ${request.url()}`);
        }
      });
      await use(undefined);
      expect(faults).toEqual([]);
    },
    { auto: true },
  ],
});
