import { describe, expect, it } from 'vitest';
import { drawing } from '@/app/_charts/drawing';

describe('drawing', () => {
  it('writes each path that draws something, in order', () => {
    const paths = [
      { d: 'M0 0h5', className: 'a' },
      null,
      { d: '', className: 'b' },
      { d: 'M1-2.5', className: 'c' },
    ];
    expect(drawing(paths).__html).toBe('<path d="M0 0h5" class="a"/><path d="M1-2.5" class="c"/>');
  });

  it('refuses whatever could be markup', () => {
    for (const d of ['"><script>', 'M0 0"', '<g/>', 'url(x)', 'MNaN 0']) {
      expect(() => drawing([{ d, className: 'a' }])).toThrow(RangeError);
    }
  });
});
