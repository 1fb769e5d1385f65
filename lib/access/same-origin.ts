/**
 * Whether a request that changes something comes from a page of this server. Browsers say so in Sec-Fetch-Site
 * (W3C Fetch Metadata) or, over plain http to another machine, at least in Origin (RFC 6454). A request that says
 * neither comes from no page.
 */
export function isSameOrigin(headers: Headers): boolean {
  const site = headers.get('sec-fetch-site');
  if (site !== null) return site === 'same-origin';
  const origin = headers.get('origin');
  if (origin === null || !URL.canParse(origin)) return false;
  return new URL(origin).host === headers.get('host')?.toLowerCase();
}
