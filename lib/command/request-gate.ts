import { isLoopbackName, nameOfHost } from '@/lib/access/is-loopback-name';

/** What the gate looks at. */
export interface GateRequest {
  method: string;
  /** What was asked for, as it stands in the request line. */
  target: string;
  host: string | undefined;
  origin: string | undefined;
}

/** Why a request stays outside, with its status (RFC 9110 §15.5). */
export interface GateRefusal {
  status: 400 | 403 | 421;
  reason: string;
}

/**
 * Whether a request may come in at all, before any page sees it. A server on loopback is reachable by every page in
 * the same browser: a foreign name that resolves to this machine (DNS rebinding) is refused by its Host, and a
 * foreign page that posts here (cross-site request forgery) by its Origin. Returns null where all is well.
 */
export function requestGate(request: GateRequest, publicUrl: string | null): GateRefusal | null {
  const host = request.host?.toLowerCase() ?? '';
  const publicHost = publicUrl === null ? null : new URL(publicUrl).host;
  if (host !== publicHost && !isLoopbackName(nameOfHost(host))) {
    return {
      status: 421,
      reason: 'This server does not answer to that name; EVENOHM_URL sets its public one.',
    };
  }
  // RFC 9112 §3.2.2: an absolute target names a host of its own, which would pass by the check of Host.
  if (!request.target.startsWith('/')) {
    return { status: 400, reason: 'The address must begin with a slash.' };
  }
  const changes = request.method !== 'GET' && request.method !== 'HEAD';
  if (changes && request.origin !== undefined && hostOf(request.origin) !== host) {
    return { status: 403, reason: 'Changes are taken from pages of this server only.' };
  }
  return null;
}

function hostOf(origin: string): string | null {
  return URL.canParse(origin) ? new URL(origin).host : null;
}
