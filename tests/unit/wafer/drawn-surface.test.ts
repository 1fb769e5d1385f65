import { describe, expect, it } from 'vitest';
import { drawnSurface } from '@/lib/wafer/drawn-surface';
import { edgeDistanceMm } from '@/lib/wafer/edge-distance-mm';
import { flatOffsetMm } from '@/lib/wafer/flat-offset-mm';
import { polarSites } from '@/lib/wafer/polar-sites';
import { scanSites } from '@/lib/wafer/scan-sites';
import { smoothSurface } from '@/lib/wafer/smooth-surface';
import { surfaceGrid } from '@/lib/wafer/surface-grid';

const sites = polarSites(3, 97);
const wavy = sites.map(({ xMm, yMm }, i) => 10 + 0.002 * xMm + 1e-5 * yMm * yMm + 0.03 * Math.sin(7 * i * i));

function rmsLeft(repeatability: number): number {
  const surface = smoothSurface(sites, wavy, repeatability)!;
  const squares = sites.reduce((sum, { xMm, yMm }, i) => sum + (surface(xMm, yMm) - wavy[i]!) ** 2, 0);
  return Math.sqrt(squares / sites.length);
}

describe('smoothSurface', () => {
  it('goes through every reading of a gauge without scatter', () => {
    expect(rmsLeft(0)).toBeLessThan(1e-7);
  });

  it('leaves as much of the readings as the gauge scatters, and no more', () => {
    for (const scatter of [0.002, 0.01, 0.02]) {
      expect(rmsLeft(scatter)).toBeLessThanOrEqual(scatter * (1 + 1e-9));
      expect(rmsLeft(scatter)).toBeGreaterThan(0.99 * scatter);
    }
  });

  it('is the least-squares plane for a gauge that scatters more than the wafer', () => {
    const surface = smoothSurface(sites, wavy, 10)!;
    expect(surface(30, 40) + surface(-30, -40)).toBeCloseTo(2 * surface(0, 0), 9);
    const mean = wavy.reduce((sum, value) => sum + value, 0) / wavy.length;
    expect(surface(0, 0)).toBeCloseTo(mean, 6);
  });

  it('gives back a plane exactly, from three sites or many', () => {
    const plane = ({ xMm, yMm }: { xMm: number; yMm: number }) => 5 + 0.01 * xMm - 0.02 * yMm;
    for (const some of [sites, sites.slice(0, 3)]) {
      expect(smoothSurface(some, some.map(plane), 0)!(12, 34)).toBeCloseTo(plane({ xMm: 12, yMm: 34 }), 8);
    }
  });

  it('does not depend on the wafers that were drawn before', () => {
    const places = [0, 10, 45].map((xMm) => smoothSurface(sites, wavy, 0.01)!(xMm, 2 * xMm));
    smoothSurface(sites, wavy.toReversed(), 0.02);
    smoothSurface(sites.slice(0, 30), wavy.slice(0, 30), 0.02);
    expect([0, 10, 45].map((xMm) => smoothSurface(sites, wavy, 0.01)!(xMm, 2 * xMm))).toEqual(places);
  });

  it('is undefined on one or two sites or on a line, and refuses readings that are none', () => {
    expect(smoothSurface([], [], 0)).toBeNull();
    expect(smoothSurface(sites.slice(0, 2), [1, 2], 0)).toBeNull();
    const scan = scanSites(25, 97, 30);
    expect(
      smoothSurface(
        scan,
        scan.map((_, i) => i),
        0,
      ),
    ).toBeNull();
    expect(() => smoothSurface(sites, wavy.with(3, NaN), 0)).toThrow(RangeError);
    expect(() => smoothSurface(sites, [1], 0)).toThrow(RangeError);
    expect(() => smoothSurface(sites, wavy, -1)).toThrow(RangeError);
  });
});

describe('drawnSurface', () => {
  it('traces a cone on its circles', () => {
    const fine = polarSites(6, 97);
    const dish = fine.map(({ xMm, yMm }) => (xMm * xMm + yMm * yMm) / 97 ** 2);
    const { regions } = drawnSurface(fine, dish, { repeatability: 0, levels: [0.49, 0.25] })!;
    expect(regions.map(({ level }) => level)).toEqual([0.25, 0.49]);
    regions.forEach(({ level, rings }) => {
      const inner = rings
        .map((ring) => ring.map(([x, y]) => Math.hypot(x, y) / 97))
        .find((r) => Math.max(...r) < 0.9)!;
      for (const radius of inner) expect(Math.abs(radius - Math.sqrt(level))).toBeLessThan(0.02);
    });
  });

  it('knows nothing outside the hull of the sites', () => {
    const { valueAt, hull } = drawnSurface(sites, wavy, { repeatability: 0.01, levels: [] })!;
    expect(hull).toHaveLength(24);
    expect(valueAt(0, 0)).toBeGreaterThan(9);
    expect(valueAt(96.9, 0)).toBeGreaterThan(9);
    expect(valueAt(97.1, 0)).toBeNull();
    expect(valueAt(-80, 80)).toBeNull();
  });
});

describe('surfaceGrid', () => {
  it('is the surface at its nodes, all round the sites, for one wafer after another', () => {
    for (const readings of [wavy, wavy.toReversed()]) {
      const surface = smoothSurface(sites, readings, 0.01)!;
      const { columns, rows, values, place } = surfaceGrid(surface, 12);
      expect(place(2, 2)[0]).toBeCloseTo(-97, 9);
      expect(place(columns - 1, rows - 1)[1]).toBeGreaterThan(97);
      values.forEach((value, node) => {
        expect(value).toBeCloseTo(surface(...place(node % columns, Math.floor(node / columns))), 5);
      });
    }
  });
});

describe('edges', () => {
  it('lie at the rim, or at the flat of smaller wafers (flat lengths of SEMI M1, from memory)', () => {
    expect(edgeDistanceMm({ xMm: 95, yMm: 0 }, 200)).toBe(5);
    expect(edgeDistanceMm({ xMm: 0, yMm: -60 }, 150)).toBeCloseTo(9.27, 2);
    expect(edgeDistanceMm({ xMm: 0, yMm: 0 }, null)).toBeNull();
    expect(flatOffsetMm(150)).toBeCloseTo(69.27, 2);
    expect(flatOffsetMm(200)).toBeNull();
    expect(() => flatOffsetMm(0)).toThrow(RangeError);
  });
});
