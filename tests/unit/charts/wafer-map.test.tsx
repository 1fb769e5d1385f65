import fc from 'fast-check';
import { renderToStaticMarkup } from 'react-dom/server';
import { describe, expect, it } from 'vitest';
import { isolineLabels } from '@/app/_charts/isoline-labels';
import { mapColour } from '@/app/_charts/map-colour';
import { mapLevels, stepShare } from '@/app/_charts/map-levels';
import { mapWords, siteInWords } from '@/app/_charts/map-words';
import { RadialPlot } from '@/app/_charts/radial-plot';
import { ShapeBars } from '@/app/_charts/shape-bars';
import { WaferMap } from '@/app/_charts/wafer-map';
import { waferOutline } from '@/app/_charts/wafer-outline';
import { drawnSurface, isInside } from '@/lib/wafer/drawn-surface';
import { polarSites } from '@/lib/wafer/polar-sites';

describe('mapLevels', () => {
  it('steps in round numbers over the values', () => {
    expect(mapLevels([9.83, 10.21], 'value')).toMatchObject({ step: 0.05, decimals: 2 });
    expect(mapLevels([9.83, 10.21], 'value').edges.slice(0, 2)).toEqual([9.8, 9.85]);
    expect(mapLevels([-2.1, 0.3], 'difference').edges).toContain(0);
  });

  it('covers every value with at most twelve even steps, whatever they are', () => {
    fc.assert(
      fc.property(
        fc.array(fc.double({ min: -1e6, max: 1e6, noNaN: true }), { minLength: 1, maxLength: 20 }),
        fc.constantFrom('value' as const, 'difference' as const),
        (values, mode) => {
          const { edges } = mapLevels(values, mode);
          const slack = 1e-6 * Math.max(...values.map(Math.abs), 1e-9);
          expect(edges[0]).toBeLessThanOrEqual(Math.min(...values) + slack);
          expect(edges.at(-1)).toBeGreaterThanOrEqual(Math.max(...values) - slack);
          expect(edges.length).toBeLessThanOrEqual(13);
          expect(edges.length).toBeGreaterThanOrEqual(2);
        },
      ),
      { seed: 21, numRuns: 300 },
    );
  });

  it('gives equal values a scale around them and refuses none', () => {
    const { edges } = mapLevels([7, 7], 'value');
    expect(edges[0]).toBeLessThan(7);
    expect(edges.at(-1)).toBeGreaterThan(7);
    expect(() => mapLevels([], 'value')).toThrow(RangeError);
    expect(() => mapLevels([NaN], 'value')).toThrow(RangeError);
  });
});

describe('colours of a map', () => {
  it('are pale at zero and equally strong on both sides of it', () => {
    const levels = mapLevels([-2, 1], 'difference');
    const shares = levels.edges.slice(0, -1).map((_, i) => stepShare(levels, i, 'difference'));
    expect(Math.min(...shares)).toBe(0);
    const zero = levels.edges.indexOf(0);
    expect(shares[zero]! - 0.5).toBeCloseTo(0.5 - shares[zero - 1]!, 12);
    expect(mapColour(0.5, 'difference')).toContain('var(--map-over) 0.0%');
    expect(mapColour(0, 'difference')).toContain('var(--map-under) 100.0%');
    expect(() => mapColour(1.1, 'value')).toThrow(RangeError);
    expect(() => stepShare(levels, 99, 'value')).toThrow(RangeError);
  });
});

describe('isolineLabels', () => {
  it('stand inside the hull, on their line, and away from the sites', () => {
    const sites = polarSites(3, 97);
    const bowl = sites.map(({ xMm, yMm }) => (xMm * xMm + yMm * yMm) / 97 ** 2);
    const surface = drawnSurface(sites, bowl, { repeatability: 0, levels: [0.25, 0.6] })!;
    const places = sites.map(({ xMm, yMm }) => [xMm, yMm] as const);
    const labels = isolineLabels(surface, [0.25, 0.6], places, 100);
    expect(labels.map(({ level }) => level)).toEqual([0.25, 0.6]);
    for (const { level, place } of labels) {
      expect(isInside(surface.hull, ...place)).toBe(true);
      expect(surface.valueAt(...place)).toBeCloseTo(level, 1);
      expect(Math.min(...places.map(([x, y]) => Math.hypot(x - place[0], y - place[1])))).toBeGreaterThan(5);
    }
    expect(isolineLabels(surface, [], places, 100)).toEqual([]);
  });
});

describe('words and outline', () => {
  it('say where a site lies', () => {
    expect(siteInWords({ xMm: 1, yMm: 2 }, 100)).toBe('in the centre');
    expect(siteInWords({ xMm: 90, yMm: 5 }, 100)).toBe('at +x');
    expect(siteInWords({ xMm: -60, yMm: -60 }, 100)).toBe('at −x, −y');
    expect(mapWords('W', [], { bad: 2, excluded: 1 }, 100, String)).toBe(
      'W: no good reading; 2 readings taken out, 1 in the edge exclusion',
    );
  });

  it('draw the flat where the standard puts it, and the notch at the bottom', () => {
    expect(waferOutline(150, 'flat', 100)).toMatch(/ 92\.36A/);
    expect(waferOutline(300, 'notch', 100)).toMatch(/L-?0\.00 95\.00Z$/);
  });
});

describe('the drawings', () => {
  const sites = polarSites(3, 97);
  const values = sites.map(({ xMm }, i) => (i === 7 ? null : 5 + xMm / 1000));
  const status = sites.map((_, i) => (i === 7 ? ('missing' as const) : ('good' as const)));
  const shown = { title: 'W-1', unit: 'Ω·cm', sites, values, status, mode: 'value' as const };

  it('name themselves, mark every site, and hold no NaN', () => {
    const map = renderToStaticMarkup(
      <WaferMap {...shown} label="resistivity" diameterMm={200} orientation="notch" repeatability={0.005} />,
    );
    expect(map).toMatch(
      /aria-label="W-1: 48 good sites, lowest 4\.90\d* Ω·cm at −x, highest .* at \+x; 1 reading taken out"/,
    );
    expect(map.match(/<circle/g)).toHaveLength(48);
    expect(map).toContain('taken out: missing');
    const plot = renderToStaticMarkup(
      <RadialPlot {...shown} radiusMm={100} mean={5} expected={{ value: 5, lower: 4.9, upper: 5.1 }} />,
    );
    expect(plot).toMatch(/aria-label="W-1: 48 good readings/);
    expect(map + plot).not.toMatch(/NaN|Infinity|undefined/);
  });

  it('say so when there is nothing to draw', () => {
    const empty = { ...shown, values: sites.map(() => null), status: sites.map(() => 'missing' as const) };
    const map = renderToStaticMarkup(
      <WaferMap {...empty} label="resistivity" diameterMm={null} orientation="flat" repeatability={0} />,
    );
    expect(map).toContain('No good reading to draw');
    expect(map).not.toMatch(/NaN|Infinity/);
    const plot = renderToStaticMarkup(<RadialPlot {...empty} radiusMm={null} mean={null} expected={null} />);
    expect(plot).toContain('No good reading to plot');
    expect(renderToStaticMarkup(<ShapeBars terms={[]} residualPercent={null} />)).toContain(
      'Too few readings',
    );
  });

  it('show each shape with sign and standard error, but not the level', () => {
    const bars = renderToStaticMarkup(
      <ShapeBars
        terms={[
          { name: 'level', percent: 100.1, standardError: 0.02 },
          { name: 'bowl', percent: -1.234, standardError: 0.051 },
        ]}
        residualPercent={0.3}
      />,
    );
    expect(bars).toContain('−1.23');
    expect(bars).toContain('± 0.05');
    expect(bars).not.toContain('level');
  });
});
