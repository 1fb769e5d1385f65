import { describe, expect, it } from 'vitest';
import { isSameOrigin } from '@/lib/access/same-origin';

const headers = (set: Record<string, string>) => new Headers({ host: '127.0.0.1:3000', ...set });

describe('isSameOrigin', () => {
  it('believes what the browser says of the page that sent the request', () => {
    expect(isSameOrigin(headers({ 'sec-fetch-site': 'same-origin' }))).toBe(true);
    for (const site of ['cross-site', 'same-site', 'none']) {
      expect(isSameOrigin(headers({ 'sec-fetch-site': site, origin: 'http://127.0.0.1:3000' }))).toBe(false);
    }
  });

  it('goes by the origin where the browser says nothing else', () => {
    expect(isSameOrigin(headers({ origin: 'http://127.0.0.1:3000' }))).toBe(true);
    expect(isSameOrigin(headers({ origin: 'http://127.0.0.1:3001' }))).toBe(false);
    expect(isSameOrigin(headers({ origin: 'null' }))).toBe(false);
  });

  it('takes nothing from a sender that says neither', () => {
    expect(isSameOrigin(headers({}))).toBe(false);
  });
});
