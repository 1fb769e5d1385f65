import { describe, expect, it } from 'vitest';
import { isLoopbackName } from '@/lib/access/is-loopback-name';
import { requestGate } from '@/lib/command/request-gate';

const get = (host: string | undefined, target = '/') => ({ method: 'GET', target, host, origin: undefined });
const post = (host: string, origin: string | undefined) => ({ method: 'POST', target: '/', host, origin });

describe('requestGate', () => {
  it.each(['localhost:3000', '127.0.0.1:3000', '[::1]:3000', 'LOCALHOST'])('lets %s in', (host) => {
    expect(requestGate(get(host), null)).toBeNull();
  });
  it('refuses a foreign name that resolves to this machine', () => {
    expect(requestGate(get('rebound.example:3000'), null)?.status).toBe(421);
    expect(requestGate(get('127.0.0.1.example:3000'), null)?.status).toBe(421);
    expect(requestGate(get(undefined), null)?.status).toBe(421);
  });
  it('refuses an address that names a host of its own', () => {
    expect(requestGate(get('localhost', 'http://elsewhere.example/'), null)?.status).toBe(400);
    expect(requestGate(get('localhost', '*'), null)?.status).toBe(400);
  });
  it('knows its public name', () => {
    expect(requestGate(get('wafers.example'), 'https://wafers.example')).toBeNull();
  });
  it('takes changes from its own pages and from machines, not from foreign pages', () => {
    expect(requestGate(post('localhost:3000', 'http://localhost:3000'), null)).toBeNull();
    expect(requestGate(post('localhost:3000', undefined), null)).toBeNull();
    expect(requestGate(post('localhost:3000', 'http://localhost:8080'), null)?.status).toBe(403);
    expect(requestGate(post('localhost:3000', 'null'), null)?.status).toBe(403);
  });
});

describe('isLoopbackName', () => {
  it('takes all of 127.0.0.0/8 and nothing else', () => {
    expect(['127.0.0.1', '127.9.8.7', '::1', 'localhost'].every(isLoopbackName)).toBe(true);
    expect(['0.0.0.0', '::', '10.0.0.1', '127.example', ''].some(isLoopbackName)).toBe(false);
  });
});
