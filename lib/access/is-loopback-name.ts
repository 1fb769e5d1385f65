import { isIP } from 'node:net';

/** Whether a name or address is this machine alone: localhost, 127.0.0.0/8 (RFC 1122 §3.2.1.3), ::1 (RFC 4291 §2.5.3). */
export function isLoopbackName(name: string): boolean {
  return name === 'localhost' || name === '::1' || (isIP(name) === 4 && name.startsWith('127.'));
}

/** The name in a Host header or the host of an address, without its port and brackets. */
export function nameOfHost(host: string): string {
  return host
    .toLowerCase()
    .replace(/:\d+$/, '')
    .replace(/^\[(.*)\]$/, '$1');
}
