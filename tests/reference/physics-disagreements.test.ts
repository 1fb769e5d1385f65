import { describe, expect, it } from 'vitest';
import { intrinsicDensity } from '@/lib/physics/intrinsic-density';
import { masettiMobility } from '@/lib/physics/masetti-mobility';
import { standardResistivity300K } from '@/lib/physics/standard-conversion-300k';
import { temperatureCoefficientPercentPerC } from '@/lib/physics/temperature-coefficient';
import { standardResistivity } from '@/lib/physics/standard-resistivity';
import { temperatureRatio, temperatureSlopePercentPerC } from '@/lib/physics/temperature-ratio';
import { ionizedFraction } from '@/lib/physics/ionized-fraction';

const CHARGE_C = 1.602176634e-19;

describe('sources of the intrinsic density', () => {
  it('Misiakos and Tsamakis (1993) say 9.696e9 at 300 K [2], 0.5 % above the 9.65e9 of Altermatt and others (2003) [1]', () => {
    expect(intrinsicDensity(300) / 9.696e9).toBeCloseTo(1, 4);
    expect(100 * (intrinsicDensity(300) / 9.65e9 - 1)).toBeCloseTo(0.5, 1);
  });

  it('Sproul and Green (1991) [1] lie 3.5 % higher at 300 K, and the two stay within 4 % from 275 to 340 K [calc]', () => {
    expect(100 * (intrinsicDensity(300, 'sproul') / intrinsicDensity(300) - 1)).toBeCloseTo(3.5, 1);
    for (let t = 275; t <= 340; t += 5) {
      expect(Math.abs(intrinsicDensity(t, 'sproul') / intrinsicDensity(t) - 1)).toBeLessThan(0.04);
    }
  });

  it('each is refused outside its own temperatures', () => {
    expect(intrinsicDensity(370, 'sproul')).toBeGreaterThan(intrinsicDensity(300, 'sproul'));
    expect(() => intrinsicDensity(370)).toThrow(/78 to 340 K/);
    expect(() => intrinsicDensity(270, 'sproul')).toThrow(/275 to 375 K/);
  });

  it('the textbook intrinsic resistivity of 2.3e5 Ω·cm belongs to 1.45e10 per cm³, not to these [calc]', () => {
    const intrinsic = (density: number): number => 1 / (CHARGE_C * density * (1414 + 470.5));
    expect(intrinsic(1.45e10) / 2.3e5).toBeCloseTo(1, 1);
    expect(intrinsic(intrinsicDensity(300))).toBeGreaterThan(3.2e5);
  });
});

describe('hole mobilities', () => {
  it('Caughey and Thomas (1967), constants from memory, read boron up to 50 % high and are not used', () => {
    let worst = 0;
    for (let x = 13; x <= 20; x += 0.05) {
      const mobility = 47.7 + (495 - 47.7) / (1 + (10 ** x / 6.3e16) ** 0.76);
      const resistivity = 1 / (CHARGE_C * 10 ** x * mobility);
      worst = Math.max(worst, 100 * (resistivity / standardResistivity300K('boron', 10 ** x) - 1));
    }
    expect(worst).toBeGreaterThan(40);
    expect(worst).toBeLessThan(55);
  });
});

describe('the arsenic set of Masetti, Severi and Solmi (1983)', () => {
  it('is printed in some texts with 9.96e16 and 3.34e20, which differs by up to 1.6 % in mobility [2], [calc]', () => {
    let worst = 0;
    for (let x = 13; x <= 21; x += 0.02) {
      const n = 10 ** x;
      const other = 52.2 + (1417 - 52.2) / (1 + (n / 9.96e16) ** 0.68) - 43.4 / (1 + (3.34e20 / n) ** 2);
      worst = Math.max(worst, Math.abs(other / masettiMobility('arsenic', n) - 1) * 100);
    }
    expect(worst).toBeCloseTo(1.6, 1);
  });
});

// Arora, Hauser and Roulston (1982) against Bullis and others (1968), slopes at 23 °C [calc].
describe('the Arora model’s temperature ratio against the measured coefficients', () => {
  it.each([
    ['boron', 'p', 1e16],
    ['boron', 'p', 1e17],
    ['boron', 'p', 1e18],
    ['phosphorus', 'n', 1e17],
    ['phosphorus', 'n', 1e18],
  ] as const)(
    'comes closer for %s (%s) of %s per cm³ with every dopant ionized than with the share that is',
    (dopant, type, density) => {
      const measured = temperatureCoefficientPercentPerC(type, standardResistivity(dopant, density));
      const plain = temperatureSlopePercentPerC(dopant, density);
      const share = (celsius: number): number => ionizedFraction(dopant, density, celsius + 273.15) ?? 1;
      const withShare = plain + (100 * Math.log(share(22.5) / share(23.5))) / 1;
      expect(Math.abs(plain - measured)).toBeLessThan(Math.abs(withShare - measured));
    },
  );

  it('misses them by at most 0.2 % per °C between 1e14 and 1e20', () => {
    for (let x = 14; x <= 19.9; x += 0.1) {
      for (const [dopant, type] of [
        ['boron', 'p'],
        ['phosphorus', 'n'],
      ] as const) {
        const measured = temperatureCoefficientPercentPerC(
          type,
          Math.max(0.001, standardResistivity(dopant, 10 ** x)),
        );
        expect(Math.abs(temperatureSlopePercentPerC(dopant, 10 ** x) - measured)).toBeLessThan(0.2);
      }
    }
  });

  it('is 1 at 23 °C and ends at 250 and 340 K', () => {
    expect(temperatureRatio('boron', 1e15, 23)).toBe(1);
    expect(() => temperatureRatio('boron', 1e15, -24)).toThrow(RangeError);
    expect(() => temperatureRatio('boron', 1e15, 67)).toThrow(RangeError);
  });
});
