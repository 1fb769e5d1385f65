import { describe, expect, it } from 'vitest';
import { securityHeaders } from '@/lib/command/security-headers';

const headers = securityHeaders('one-nonce', { dev: false, https: false });
const policy = headers['content-security-policy'] ?? '';

describe('the headers of every page', () => {
  it('let run only scripts with the nonce of the response, and nobody frame the page', () => {
    expect(policy).toContain(`script-src 'self' 'nonce-one-nonce' 'strict-dynamic';`);
    expect(policy).toContain(`object-src 'none'`);
    expect(policy).toContain(`base-uri 'none'`);
    expect(policy).toContain(`frame-ancestors 'none'`);
    expect(headers['x-frame-options']).toBe('DENY');
  });

  it('keep types, addresses and answers from other sites', () => {
    expect(headers['x-content-type-options']).toBe('nosniff');
    expect(headers['referrer-policy']).toBe('same-origin');
    expect(Object.keys(headers).filter((name) => name.startsWith('access-control'))).toEqual([]);
  });

  it('ask for https from then on where it is used', () => {
    const overHttps = securityHeaders('one-nonce', { dev: false, https: true });
    expect(overHttps['strict-transport-security']).toMatch(/^max-age=\d{8}/);
    expect(headers).not.toHaveProperty('strict-transport-security');
  });
});
