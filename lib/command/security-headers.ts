/**
 * Response headers of every page. The policy lets run only scripts that carry this request's nonce (W3C Content
 * Security Policy Level 3, §6.7.3); styles stay open because charts place their parts by inline style. Development needs
 * `eval` and a web socket for hot reloading.
 */
export function securityHeaders(
  nonce: string,
  options: { dev: boolean; https: boolean },
): Record<string, string> {
  const policy = [
    `default-src 'self'`,
    `script-src 'self' 'nonce-${nonce}' 'strict-dynamic'${options.dev ? " 'unsafe-eval'" : ''}`,
    `style-src 'self' 'unsafe-inline'`,
    `img-src 'self' data: blob:`,
    `font-src 'self'`,
    `connect-src 'self'${options.dev ? ' ws: wss:' : ''}`,
    `object-src 'none'`,
    `base-uri 'none'`,
    `form-action 'self'`,
    `frame-ancestors 'none'`,
  ].join('; ');
  return {
    'content-security-policy': policy,
    'x-content-type-options': 'nosniff',
    'x-frame-options': 'DENY',
    'referrer-policy': 'same-origin',
    'permissions-policy': 'camera=(), microphone=(), geolocation=(), browsing-topics=()',
    'cross-origin-opener-policy': 'same-origin',
    'cross-origin-resource-policy': 'same-origin',
    ...(options.https ? { 'strict-transport-security': 'max-age=31536000' } : {}),
  };
}
