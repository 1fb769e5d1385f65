import { describe, expect, it } from 'vitest';
import { diffusivity, diffusivityGrowthPerC } from '@/lib/physics/diffusivity';
import type { Dopant } from '@/lib/physics/dopant';
import { driveIn } from '@/lib/physics/drive-in-spread';
import { furnaceIntrinsicDensity } from '@/lib/physics/furnace-intrinsic-density';

describe('diffusion of dopants at low density', () => {
  // D0 and Ea: textbook values [memory].
  it.each<[Dopant, number, number]>([
    ['boron', 0.76, 3.46],
    ['phosphorus', 3.85, 3.66],
    ['arsenic', 22.9, 4.1],
    ['antimony', 0.214, 3.65],
  ])('of %s goes by D0 = %s cm²/s and Ea = %s eV', (dopant, d0, ev) => {
    const at = (celsius: number): number => Math.log(diffusivity(dopant, celsius));
    const k = 8.617333262e-5;
    const [cool, hot] = [1 / (k * 1173.15), 1 / (k * 1373.15)];
    expect((at(1100) - at(900)) / (cool - hot)).toBeCloseTo(ev, 9);
    expect(Math.exp(at(900) + ev * cool)).toBeCloseTo(d0, 9);
    expect(diffusivityGrowthPerC(dopant, 1000)).toBeCloseTo((at(1000.01) - at(999.99)) / 0.02, 7);
  });

  it('is trusted below the intrinsic density, about 4e18 at 900 and 1.2e19 at 1100 °C (Morin and Maita, 1954) [memory]', () => {
    expect(furnaceIntrinsicDensity(900) / 4e18).toBeCloseTo(1, 1);
    expect(furnaceIntrinsicDensity(1100) / 1.2e19).toBeCloseTo(1, 1);
    expect(driveIn('boron', 3e18, 900, 30).isClassical).toBe(true);
    expect(driveIn('boron', 5e18, 900, 30).isClassical).toBe(false);
    expect(driveIn('boron', 5e18, 1100, 30).isClassical).toBe(true);
  });

  it('is refused at temperatures no furnace works at, and without a time', () => {
    expect(() => diffusivity('boron', 500)).toThrow(RangeError);
    expect(() => furnaceIntrinsicDensity(1300)).toThrow(RangeError);
    expect(() => driveIn('boron', 1e18, 1000, 0)).toThrow(RangeError);
  });
});
