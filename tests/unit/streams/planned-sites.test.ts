import { describe, expect, it } from 'vitest';
import { faultsOf } from '@/app/_ui/form-state';
import { listedSites, newSitePlan } from '@/lib/streams/planned-sites';

const frame = {
  name: 'P',
  diameterMm: '200',
  edgeExclusionMm: '5',
  orientation: 'notch',
  outerRadiusMm: '93',
};
const plan = (words: Record<string, string>) => newSitePlan.safeParse({ ...frame, ...words });
const fault = (words: Record<string, string>) => {
  const parsed = plan(words);
  return parsed.success ? null : (faultsOf(parsed.error)[0] ?? null);
};

describe('newSitePlan', () => {
  it('lays out each shape', () => {
    expect(plan({ shape: 'polar', rings: '3' }).data?.sites).toHaveLength(49);
    expect(plan({ shape: 'cross', arms: '5' }).data?.sites).toHaveLength(5);
    expect(plan({ shape: 'scan', count: '25', angleDegrees: '0' }).data?.sites).toHaveLength(25);
    expect(plan({ shape: 'lattice', pitchMm: '93' }).data?.sites).toHaveLength(5);
    expect(plan({ shape: 'list', list: '0,0\n1,1' }).data?.sites).toHaveLength(2);
  });

  it('says beside the field why there is no plan', () => {
    expect(fault({ shape: 'polar', rings: '3', outerRadiusMm: '120' })?.field).toBe('outerRadiusMm');
    expect(fault({ shape: 'polar', rings: '3', edgeExclusionMm: '100' })?.field).toBe('edgeExclusionMm');
    expect(fault({ shape: 'lattice', pitchMm: '0.5' })?.field).toBe('pitchMm');
    expect(fault({ shape: 'list', list: '0,0\n0,0' })?.field).toBe('list');
    expect(fault({ shape: 'list', list: '95,0', edgeExclusionMm: '20' })?.reason).toContain('edge exclusion');
    expect(fault({ shape: 'spiral' })?.reason).toBe('Choose how the sites lie.');
  });
});

describe('listedSites', () => {
  it('takes what a spreadsheet or a file holds, with a header or without', () => {
    const sites = [
      { xMm: 0, yMm: 0 },
      { xMm: -1.5, yMm: 2 },
    ];
    expect(listedSites('x_mm,y_mm\n0,0\n\n-1.5,2\n')).toEqual(sites);
    expect(listedSites('0\t0\r\n−1.5\t2')).toEqual(sites);
    expect(listedSites(' 0 ; 0 \n -1.5 2 ')).toEqual(sites);
  });

  it('names the line that it cannot read', () => {
    expect(listedSites('0,0\n1')).toContain('Line 2');
    expect(listedSites('0,0\n1,2,3')).toContain('Line 2');
    expect(listedSites('')).toContain('Paste');
  });
});
