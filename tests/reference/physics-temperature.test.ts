import { describe, expect, it } from 'vitest';
import { temperatureCoefficientPercentPerC } from '@/lib/physics/temperature-coefficient';

// ASTM F84 / SEMI MF84, after Bullis, Brewer, Kolstad and Swartzendruber, Solid-State Electron. 11, 639 (1968) [1].
describe('the temperature coefficient of resistivity', () => {
  it.each([
    [0.001, 0.2058, 0.1578],
    [0.005, 0.0954, 0.0938],
    [0.01, -0.023, 0.0307],
    [0.02, 0.0248, 0.0454],
    [0.1, 0.4855, 0.3715],
    [1, 0.7364, 0.7068],
    [10, 0.8132, 0.8248],
    [100, 0.8304, 0.8757],
  ])('at %s Ω·cm is %s %% per °C for n-type and %s for p-type', (resistivity, n, p) => {
    expect(temperatureCoefficientPercentPerC('n', resistivity)).toBeCloseTo(n, 4);
    expect(temperatureCoefficientPercentPerC('p', resistivity)).toBeCloseTo(p, 4);
  });

  it('is negative for n-type between about 0.0085 and 0.0175 Ω·cm', () => {
    expect(temperatureCoefficientPercentPerC('n', 0.008)).toBeGreaterThan(0);
    expect(temperatureCoefficientPercentPerC('n', 0.0087)).toBeLessThan(0);
    expect(temperatureCoefficientPercentPerC('n', 0.0173)).toBeLessThan(0);
    expect(temperatureCoefficientPercentPerC('n', 0.018)).toBeGreaterThan(0);
  });
});
