import { describe, expect, it } from 'vitest';
import { causeRows } from '@/app/(line)/cause-rows';
import { crystalPlot } from '@/app/(line)/crystal-plot';
import { conversionPlot } from '@/app/(line)/expected/conversion-plot';
import { layerPlot } from '@/app/(line)/expected/layer-plot';
import { modelRows } from '@/app/(line)/expected/model-rows';
import type { Target } from '@/lib/physics/target';
import { BORON, DRIVEN, EPI, GAUSSIAN } from '../physics/targets';

const plain = (text: string) => text.replaceAll('\u00a0', ' ');

describe('the drawing of the conversion', () => {
  it('marks the point on its own curve: boron 1e15 is 13.306 Ω·cm (ASTM F723)', () => {
    const { marks, curves } = conversionPlot('boron', 1e15, 23);
    expect(marks[0]?.y).toBeCloseTo(13.306, 3);
    expect(curves.filter(({ isOwn }) => isOwn).map(({ name }) => name)).toEqual(['boron']);
  });

  it('leaves the step between two fits of arsenic standing, and marks nothing outside the conversion', () => {
    const { curves } = conversionPlot('arsenic', 1e23, 23);
    expect(curves.find(({ name }) => name === 'arsenic')?.pieces).toHaveLength(2);
    expect(conversionPlot('arsenic', 1e23, 23).marks).toEqual([]);
  });
});

describe('the drawing of a layer', () => {
  it('names its junction: 1.517 µm of the gaussian (own integral)', () => {
    const { places, levels, y } = layerPlot(GAUSSIAN, 1e19, {});
    expect(places?.map(({ label }) => label)).toEqual(['junction at 1.517 µm']);
    expect(levels?.[0]).toEqual({ y: 1e15, label: 'phosphorus underneath' });
    expect(y.domain).toEqual([1e14, 1e20]);
  });

  it('that was grown shows how far it conducts: 10 µm of 1e15 on 1e19 lose 1.04 µm (depletion at zero bias)', () => {
    const { places, curves } = layerPlot(EPI, 1e15, {});
    expect(places?.map(({ label }) => label)).toEqual([
      'grown to 10.00 µm',
      expect.stringMatching(/^conducts to 8\.96/),
    ]);
    expect(curves.map(({ name }) => name)).toEqual(['phosphorus', 'boron of the substrate']);
    const own: Target = { ...EPI, backgroundDopant: 'arsenic', method: 'other' };
    expect(layerPlot(own, 1e15, {}).places).toHaveLength(1);
  });
});

describe('the drawing of a crystal', () => {
  const crystal: Target = { ...BORON, dopant: 'phosphorus', alongCrystal: true };

  it('follows Scheil’s law: phosphorus 1e15 is at 0.6486 of its seed end at one half', () => {
    const [piece = []] = crystalPlot(crystal, []).curves[0]?.pieces ?? [];
    const half = piece.find((point) => point !== null && Math.abs(point.x - 0.5) < 1e-9);
    expect((half?.y ?? 0) / (piece[0]?.y ?? 1)).toBeCloseTo(0.6486, 4);
  });

  it('names where a co-doped melt changes its type: boron 1e16 against phosphorus 5e15 at 0.786', () => {
    const mixed: Target = {
      ...BORON,
      densityPerCm3: 1e16,
      alongCrystal: true,
      counterDopant: 'phosphorus',
      counterDensityPerCm3: 5e15,
    };
    const { places, y } = crystalPlot(mixed, []);
    expect(places?.[0]?.x).toBeCloseTo(0.786, 3);
    expect(y.isLog).toBe(true);
  });

  it('is lifted by a calibration, and makes room for what was measured', () => {
    const mark = { x: 0.1, y: 40, label: 'W-1', kind: 'measured' as const };
    const { curves, y } = crystalPlot({ ...crystal, calibrationFactor: 2 }, [mark]);
    expect(curves[0]?.pieces[0]?.[0]?.y).toBeCloseTo(2 * 4.4819, 3);
    expect(y.domain[1]).toBeGreaterThan(40);
  });
});

describe('the models of a doping', () => {
  it('stand beside each other, each with its bound; the standard knows one dopant only', () => {
    const rows = modelRows(BORON, 1e15, null);
    expect(rows.map(({ model, boundPercent }) => [model, boundPercent])).toEqual([
      ['standard', 3],
      ['the same, boron at 300 K', 3],
      ['Masetti', 11],
      ['Arora', 8.7],
      ['Klaassen', 7.4],
    ]);
    const mixed = modelRows(
      { ...BORON, densityPerCm3: 1e17, counterDopant: 'phosphorus', counterDensityPerCm3: 9e16 },
      1e17,
      null,
    );
    // 2.258 Ω·cm by Masetti, two carriers, mobility at the total doping.
    expect(mixed[0]?.resistivityOhmCm).toBeCloseTo(2.258, 3);
    expect(mixed).toHaveLength(3);
  });
});

describe('what would explain a difference', () => {
  it('is told cause by cause, the least extraordinary first', () => {
    const rows = causeRows(BORON, {}, 0.98, 0.5).map(({ cause, takes }) => [cause, plain(takes)]);
    expect(rows[0]).toEqual(['doping', '+2.05 ± 0.51 %']);
    expect(rows.map(([cause]) => cause)).toContain('temperature of the wafer while it is measured');
    expect(causeRows(DRIVEN, {}, 1.05, 1).map(({ cause }) => cause)).toContain('temperature of the drive-in');
  });

  it('says where a straight line ends', () => {
    const [heavy] = causeRows(BORON, {}, 0.5, 0.5).filter(({ cause }) => cause === 'doping');
    expect(heavy?.takes).toMatch(/^a great deal, beyond the slope/);
  });
});
