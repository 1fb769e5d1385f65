import { describe, expect, it } from 'vitest';
import { spanWish, streamHref } from '@/app/(line)/streams/[slug]/span-wish';

const none = { from: null, to: null, around: null, gauge: null, lot: null };

describe('what the address of a stream’s page asks for', () => {
  it('is the usual view without words', () => {
    expect(spanWish({}, 'UTC')).toEqual({ wish: none, notices: [] });
    expect(spanWish({ from: '', gauge: ' ', lot: undefined }, 'UTC')).toEqual({ wish: none, notices: [] });
  });

  it('takes instants with offset, and days of the site', () => {
    const { wish } = spanWish({ from: '2031-04-05', to: '2031-04-06T06:07:00+02:00' }, 'Asia/Kathmandu');
    expect(wish.from?.toISOString()).toBe('2031-04-04T18:15:00.000Z');
    expect(wish.to?.toISOString()).toBe('2031-04-06T04:07:00.000Z');
  });

  it.each([
    'yesterday',
    '2031-04-05T06:07',
    '2031-13-05T06:07Z',
    '0000-01-01T00:00Z',
    '9999-12-31',
    '2031-02-30',
  ])('leaves aside %s and says so', (from) => {
    const { wish, notices } = spanWish({ from }, 'UTC');
    expect(wish.from).toBeNull();
    expect(notices.join()).toContain(from);
  });

  it('leaves aside a stretch that ends before it begins', () => {
    const { wish, notices } = spanWish({ from: '2031-04-06', to: '2031-04-05' }, 'UTC');
    expect([wish.from, wish.to]).toEqual([null, null]);
    expect(notices).toHaveLength(1);
  });

  it('takes only ids for a subgroup, the first of repeated words, and names without control characters', () => {
    expect(spanWish({ at: '1; DROP' }, 'UTC').notices).toHaveLength(1);
    expect(spanWish({ at: '1234567890123456789' }, 'UTC').wish.around).toBeNull();
    expect(spanWish({ at: '12', gauge: ['Gauge\u0000 2', 'x'] }, 'UTC').wish).toMatchObject({
      around: '12',
      gauge: 'Gauge 2',
    });
  });

  it('goes into an address and comes out the same', () => {
    const { wish } = spanWish(
      { from: '2031-04-05T00:00:00Z', to: '2031-04-06T00:00:00Z', at: '7', gauge: 'a&b=c', lot: 'L 1' },
      'UTC',
    );
    const search = Object.fromEntries(new URL(streamHref('s', wish), 'http://x').searchParams);
    expect(spanWish(search, 'UTC').wish).toEqual(wish);
    expect(streamHref('s', none)).toBe('/streams/s');
  });
});
