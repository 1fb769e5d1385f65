import { describe, expect, it } from 'vitest';
import { measureWafer } from '@/lib/wafer/measure-wafer';
import { planGeometry } from '@/lib/wafer/plan-geometry';
import { polarSites } from '@/lib/wafer/polar-sites';
import { soundWafer, withValue } from '../../support/sound-wafer';

const diameterMm = 200;
const plan = (rings: number) => planGeometry(polarSites(rings, 97), { diameterMm, edgeExclusionMm: 3 });
const nine = plan(1);
const fortyNine = plan(3);

describe('screening', () => {
  const sound = soundWafer(fortyNine.sites);

  it('takes out impossible readings, each with its reason', () => {
    const values = withValue(sound, { 3: null, 4: 0, 5: -10, 6: NaN, 7: Infinity });
    const { status, badSites, goodSites } = measureWafer(values, fortyNine, { screen: 'impossible' });
    expect(status.slice(2, 9)).toEqual([
      'good',
      'missing',
      'zero',
      'negative',
      'not-a-number',
      'not-a-number',
      'good',
    ]);
    expect([badSites, goodSites]).toEqual([5, 44]);
    const off = measureWafer(values, fortyNine, { screen: 'off' });
    expect(off.status.slice(3, 8)).toEqual(['missing', 'good', 'good', 'not-a-number', 'not-a-number']);
  });

  it('takes out one reading that stands alone, wherever it is', () => {
    for (const site of sound.keys()) {
      for (const factor of [1.06, 0.94]) {
        const values = withValue(sound, { [site]: sound[site]! * factor });
        const measure = measureWafer(values, fortyNine, { screen: 'outliers' });
        expect([site, measure.status[site], measure.badSites]).toEqual([site, 'outlier', 1]);
        expect(measure.judgeable).toBe(true);
      }
    }
  });

  it('keeps neighbours that deviate together and names them', () => {
    const ring = [25, 26, 48];
    const values = withValue(sound, Object.fromEntries(ring.map((site) => [site, sound[site]! * 1.08])));
    const measure = measureWafer(values, fortyNine, { screen: 'outliers' });
    expect(measure.badSites).toBe(0);
    expect(measure.features.map(({ sites }) => sites)).toEqual([ring]);
    expect(measure.features[0]!.description).toMatch(
      /^3 neighbouring sites at \+x read .* above .*; edge geometry not excluded$/,
    );
  });

  it('says nothing of the edge for a feature away from it', () => {
    const inner = [0, 1, 2];
    const values = withValue(sound, Object.fromEntries(inner.map((site) => [site, sound[site]! * 0.93])));
    const [feature, ...more] = measureWafer(values, fortyNine, { screen: 'outliers' }).features;
    expect(more).toEqual([]);
    expect(feature!.description).toMatch(/near the centre read .* below/);
    expect(feature!.description).not.toMatch(/edge/);
  });

  it('keeps the centre of a ring pattern, which no other site sees, but not a gross centre', () => {
    for (const geometry of [plan(2), fortyNine]) {
      const rings = geometry.sites.map(
        ({ xMm, yMm }, i) =>
          10 *
          (1 +
            0.03 * Math.cos((2 * Math.PI * (xMm * xMm + yMm * yMm)) / 97 ** 2) +
            0.002 * Math.sin(9 * i * i)),
      );
      expect(measureWafer(rings, geometry, { screen: 'outliers' }).badSites).toBe(0);
      const gross = withValue(soundWafer(geometry.sites), { 0: 13 });
      expect(measureWafer(gross, geometry, { screen: 'outliers' }).status[0]).toBe('outlier');
    }
  });

  it('leaves a plan of fewer than 25 sites to the eye', () => {
    const values = withValue(soundWafer(nine.sites), { 4: 30 });
    expect(measureWafer(values, nine, { screen: 'outliers' }).badSites).toBe(0);
  });

  it('takes out 5 % at most; with more standing alone the wafer is not judged', () => {
    const spikes = { 30: 14, 36: 15, 44: 13, 1: 16 };
    const measure = measureWafer(withValue(sound, spikes), fortyNine, { screen: 'outliers' });
    expect(measure.badSites).toBe(2);
    expect([measure.status[36], measure.status[1]]).toEqual(['outlier', 'outlier']);
    expect(measure.judgeable).toBe(false);
    expect(measure.notJudgeableReason).toMatch(/4 readings stand alone/);
  });

  it('judges a wafer with 80 % good sites, none with fewer', () => {
    const missing = (count: number) => sound.map((value, i) => (i < count ? null : value));
    expect(measureWafer(missing(9), fortyNine, { screen: 'outliers' }).judgeable).toBe(true);
    const less = measureWafer(missing(10), fortyNine, { screen: 'outliers' });
    expect(less.judgeable).toBe(false);
    expect(less.notJudgeableReason).toMatch(/39 of 49/);
  });

  it('follows a person who puts a reading back or takes one out, but not into the impossible', () => {
    const values = withValue(sound, { 9: sound[9]! * 1.08, 11: -3 });
    const overrides = new Map([
      [9, 'in'],
      [10, 'out'],
      [11, 'in'],
    ] as const);
    const { status } = measureWafer(values, fortyNine, { screen: 'outliers', overrides });
    expect([status[9], status[10], status[11]]).toEqual(['good', 'by-hand', 'negative']);
  });

  it('counts sites in the edge exclusion apart from bad ones, and does not let them in', () => {
    const geometry = planGeometry(polarSites(3, 99), { diameterMm, edgeExclusionMm: 5 });
    const values = soundWafer(geometry.sites).map((value, i) => (i > 24 ? -1 : value));
    const measure = measureWafer(values, geometry, { screen: 'outliers' });
    expect([measure.sites, measure.excludedSites, measure.badSites, measure.goodSites]).toEqual([
      49, 24, 0, 25,
    ]);
    expect(measure.judgeable).toBe(true);
  });

  it('throws on another number of values than sites', () => {
    expect(() => measureWafer([1, 2], nine, { screen: 'off' })).toThrow(RangeError);
  });
});
