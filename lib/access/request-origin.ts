import { readEnvironment } from '@/lib/env';

/**
 * The origin (RFC 6454) by which a request reached this server. The gate in front of the pages has let in only hosts
 * that the server answers to: its public one, and the loopback.
 */
export function requestOrigin(headers: Headers): string {
  const { publicUrl, port } = readEnvironment();
  const host = headers.get('host')?.toLowerCase() ?? `127.0.0.1:${port}`;
  const given = publicUrl === null ? null : new URL(publicUrl);
  return given !== null && given.host === host ? given.origin : `http://${host}`;
}
