import { describe, expect, it } from 'vitest';
import { measureWafer } from '@/lib/wafer/measure-wafer';
import { planGeometry } from '@/lib/wafer/plan-geometry';
import { referenceDataPresent, referenceRows } from '../support/reference-data';

/** NIST, public dataplot data library, EHRSTEIN.DAT: a four-point-probe map of a 125 mm wafer, 1986. */
describe.skipIf(!referenceDataPresent)('the NIST map of 300 sites', () => {
  const rows = referenceDataPresent ? referenceRows('nist_resistivity_map_300.csv') : [];
  const sites = rows.map((row) => ({ xMm: Number(row['x_mm']), yMm: Number(row['y_mm']) }));
  const values = rows.map((row) => Number(row['resistivity_ohm_cm']));
  const geometry = (edgeExclusionMm: number) => planGeometry(sites, { diameterMm: 125, edgeExclusionMm });

  it('has 13 impossible readings, and the published figures without them', () => {
    const {
      sites: count,
      badSites,
      goodSites,
      status,
      figures,
    } = measureWafer(values, geometry(0), {
      screen: 'impossible',
    });
    expect([count, badSites, goodSites]).toEqual([300, 13, 287]);
    expect(status.filter((s) => s === 'zero')).toHaveLength(3);
    expect(status.filter((s) => s === 'negative')).toHaveLength(10);
    expect(figures.mean).toBeCloseTo(14.17356, 5);
    expect(figures.standardDeviation).toBeCloseTo(0.23044, 5);
    expect(figures.relativeStandardDeviationPercent).toBeCloseTo(1.626, 3);
    expect(figures.median).toBeCloseTo(14.12059, 5);
    expect(figures.minimum!.value).toBe(13.90108);
    expect(figures.maximum!.value).toBe(16.24341);
    expect(figures.fullRangeOverMidrangePercent).toBeCloseTo(15.54, 2);
    expect(figures.radialVariationPercent).toBeNull();
  });

  it('has 250 good sites within 55 mm, and their published figures', () => {
    for (const screen of ['impossible', 'outliers'] as const) {
      const { goodSites, badSites, excludedSites, figures } = measureWafer(values, geometry(7.5), { screen });
      expect([goodSites, badSites, excludedSites]).toEqual([250, 6, 44]);
      expect(figures.mean).toBeCloseTo(14.12379, 5);
      expect(figures.standardDeviation).toBeCloseTo(0.08306, 5);
    }
  });

  it('keeps its high edge at +x under the default screening and names it', () => {
    const measure = measureWafer(values, geometry(0), { screen: 'outliers' });
    expect([measure.goodSites, measure.judgeable]).toEqual([287, true]);
    const [feature] = measure.features;
    expect(feature!.sites.map((i) => values[i])).toEqual([16.24341, 16.13671, 15.70058, 15.02972]);
    expect(feature!.description).toMatch(/4 neighbouring sites at \+x .*edge geometry not excluded/);
  });
});
