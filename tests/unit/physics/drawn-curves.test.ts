import { describe, expect, it } from 'vitest';
import { conversionCurve } from '@/lib/physics/conversion-curve';
import { layerOfTarget } from '@/lib/physics/layer-of-target';
import { layerProfile } from '@/lib/physics/layer-profile';
import { resistivityAtTemperature } from '@/lib/physics/resistivity-at-temperature';
import { standardResistivity } from '@/lib/physics/standard-resistivity';
import { BORON, DRIVEN, GAUSSIAN, PAIRS } from './targets';

describe('the curve of resistivity against doping', () => {
  it('runs over the whole conversion, both ends included, and lies on it', () => {
    const [boron = []] = conversionCurve('boron', 23, 10);
    expect(boron).toHaveLength(91);
    expect([boron[0]?.densityPerCm3, boron.at(-1)?.densityPerCm3]).toEqual([1e12, 1e21]);
    for (const { densityPerCm3, resistivityOhmCm } of boron) {
      expect(resistivityOhmCm).toBe(standardResistivity('boron', densityPerCm3));
    }
  });

  it('leaves arsenic’s step of 3.8 % at 1e19 standing, between two pieces', () => {
    const [light = [], heavy = []] = conversionCurve('arsenic', 23, 10);
    const step = (light.at(-1)?.resistivityOhmCm ?? 0) / (heavy[0]?.resistivityOhmCm ?? 1);
    // Computed from the two published fits (ASTM F723), which do not meet.
    expect((1 - 1 / step) * 100).toBeCloseTo(3.8, 1);
    expect(conversionCurve('antimony', 23, 5)).toHaveLength(1);
  });

  it('moves with the temperature', () => {
    const [warm = []] = conversionCurve('boron', 50, 1);
    const at50C = resistivityAtTemperature('boron', 1e15, standardResistivity('boron', 1e15), 50);
    expect(warm[3]?.resistivityOhmCm).toBeCloseTo(at50C, 10);
    expect(() => conversionCurve('boron', 90, 1)).toThrow(RangeError);
    expect(() => conversionCurve('boron', 23, 0)).toThrow(RangeError);
  });
});

describe('a layer as it is drawn', () => {
  it('runs from the surface to below its junction', () => {
    const drawn = layerProfile(layerOfTarget(GAUSSIAN, 1e19), 14);
    expect(drawn.points[0]).toEqual({ depthUm: 0, densityPerCm3: 1e19 });
    expect(drawn.points.at(-1)?.depthUm).toBeCloseTo(1.3 * drawn.junctionUm, 12);
    expect(drawn.points.at(-1)?.densityPerCm3).toBeLessThan(drawn.backgroundPerCm3 ?? 0);
    // By the formula of a Gaussian: 0.5·√(ln 1e4) µm.
    expect(drawn.junctionUm).toBeCloseTo(1.517, 3);
  });

  it('ends where a box or a profile of pairs ends', () => {
    const box = layerProfile(layerOfTarget({ ...GAUSSIAN, profile: 'box', lengthUm: 0.3 }, 1e19), 2);
    expect(box.points).toEqual([
      { depthUm: 0, densityPerCm3: 1e19 },
      { depthUm: 0.3, densityPerCm3: 1e19 },
    ]);
    expect(layerProfile(layerOfTarget(PAIRS, 1e19), 50).points.at(-1)?.depthUm).toBe(2);
  });

  it('of a driven implant falls from one top only', () => {
    const densities = layerProfile(layerOfTarget(DRIVEN, 3e18), 200).points.map(
      ({ densityPerCm3 }) => densityPerCm3,
    );
    const top = densities.indexOf(Math.max(...densities));
    expect(densities.slice(top)).toEqual([...densities.slice(top)].sort((a, b) => b - a));
    expect(densities.slice(0, top)).toEqual([...densities.slice(0, top)].sort((a, b) => a - b));
    expect(() => layerProfile(layerOfTarget(BORON, 1e15), 1)).toThrow(RangeError);
  });
});
