import { mkdtemp, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { UsageError } from '@/lib/command/verb';
import { map } from '@/lib/command/verbs/map';
import { polarSites } from '@/lib/wafer/polar-sites';

let folder = '';
beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), 'map-verb-'));
});
afterAll(() => rm(folder, { recursive: true }));

async function run(content: string | Uint8Array, ...flags: string[]) {
  const file = join(folder, 'wafer.csv');
  await writeFile(file, content);
  const out: string[] = [];
  const said: string[] = [];
  const exit = await map.run([file, ...flags], { out: (t) => out.push(t), say: (t) => said.push(t) });
  const json = () => JSON.parse(out.join('\n')) as Record<string, unknown>;
  return { exit, out: out.join('\n'), said: said.join('\n'), json };
}

const five =
  'x_mm,y_mm,resistivity_ohm_cm\r\n0,0,9.8\r\n10,0,10.0\r\n0,10,10.2\r\n-10,0,10.1\r\n0,-10,9.9\r\n';

describe('map', () => {
  it('prints one JSON object with the figures of the wafer', async () => {
    const { exit, json } = await run(five, '--json');
    expect(exit).toBe(0);
    expect(json()).toMatchObject({
      sites: 5,
      badSites: 0,
      excludedSites: 0,
      goodSites: 5,
      areaMean: null,
      median: 10,
      minimum: 9.8,
      maximum: 10.2,
      maximumAt: { x_mm: 0, y_mm: 10 },
      bad: [],
      features: [],
    });
    // 100·√(0.1/4)/10, computed by the definition.
    expect(json()['relativeStandardDeviationPercent']).toBeCloseTo(1.58114, 5);
    expect((await run(five, '--json', '--diameter-mm', '100')).json()['areaMean']).toBeCloseTo(10, 1);
  });

  it('prints a table for a person', async () => {
    const { exit, out } = await run(five);
    expect(exit).toBe(0);
    expect(out).toMatch(/5 of 5 sites good/);
    expect(out).toMatch(/relative s +1\.581\u00a0%/);
  });

  it('lists bad readings with place and reason, and leaves them out', async () => {
    const { json } = await run('x_mm,y_mm,resistivity_ohm_cm\n0,0,9\n1,0,-2\n2,0,\n3,0,nan\n', '--json');
    expect(json()['bad']).toEqual([
      { x_mm: 1, y_mm: 0, value: -2, reason: 'negative' },
      { x_mm: 2, y_mm: 0, value: null, reason: 'missing' },
      { x_mm: 3, y_mm: 0, value: null, reason: 'not-a-number' },
    ]);
  });

  it('counts the sites in the edge exclusion apart', async () => {
    const sites = polarSites(2, 97).map(({ xMm, yMm }) => `${xMm},${yMm},5`);
    const content = `x_mm,y_mm,sheet_resistance_ohm_sq\n${sites.join('\n')}\n`;
    const { json } = await run(content, '--json', '--diameter-mm', '200', '--edge-exclusion-mm', '5');
    expect(json()).toMatchObject({ sites: 25, excludedSites: 16, goodSites: 9, badSites: 0, unit: 'Ω/□' });
  });

  it('takes several wafers with --all only, and the diameter from the file', async () => {
    const two =
      'wafer,x_mm,y_mm,resistivity_ohm_cm,diameter_mm\nA,0,0,5,200\nA,9,0,5,200\nB,0,0,6,200\nB,9,0,6,200\n';
    const { json } = await run(two, '--json', '--all');
    expect(json()['wafers']).toMatchObject([
      { wafer: 'A', mean: 5, areaMean: 5, diameterMm: 200 },
      { wafer: 'B', mean: 6, areaMean: 6 },
    ]);
    const refused = await run(two);
    expect(refused.exit).toBe(3);
    expect(refused.said).toMatch(/wafer\.csv:4:1: 2 wafers in the file/);
    expect((await run(two, '--all', '--diameter-mm', '150')).exit).toBe(3);
  });

  it('gathers the rows of a wafer that stand apart, and passes over what else a file says of a wafer', async () => {
    const apart =
      'wafer,note,x_mm,y_mm,resistivity_ohm_cm\nA,"1, first",0,0,5\nB,2,0,0,6\nA,3,9,0,7\nB,4,9,0,8\n';
    const { json } = await run(apart, '--json', '--all');
    expect(json()['wafers']).toMatchObject([
      { wafer: 'A', sites: 2, mean: 6 },
      { wafer: 'B', sites: 2, mean: 7 },
    ]);
  });

  it('refuses a wafer with two diameters, or none that is a number', async () => {
    const rows = (first: string, second: string) =>
      `x_mm,y_mm,resistivity_ohm_cm,diameter_mm\n0,0,5,${first}\n9,0,5,${second}\n`;
    expect((await run(rows('200', '150'))).said).toMatch(/:3:4: "150" here, but "200"/);
    expect((await run(rows('wide', 'wide'))).said).toMatch(/:2:4: the diameter is no number/);
  });

  it('refuses faults with file, line and column', async () => {
    const { exit, said, json } = await run(`${five}5,five,10\r\n`, '--json');
    expect(exit).toBe(3);
    expect(said).toMatch(/wafer\.csv:7:2: "five" is not a number/);
    expect(json()['refusals']).toMatchObject([{ line: 7, column: 2 }]);
    for (const [content, reason] of [
      ['', /empty/],
      ['x_mm,y_mm,resistivity_ohm_cm\n', /no readings/],
      ['x_mm,resistivity_ohm_cm\n1,2\n', /no column y_mm/],
      ['x_mm,y_mm\n1,2\n', /neither resistivity_ohm_cm nor/],
      ['x_mm,y_mm,resistivity_ohm_cm,sheet_resistance_ohm_sq\n1,2,3,4\n', /contradict/],
      ['x_mm,y_mm,resistivity_ohm_cm\n1,2\n', /:2:1: this row has 2 cells, the header 3/],
      ['x_mm,y_mm,resistivity_ohm_cm\n1,2,3\n1,2,3\n', /:3:1: .* already, in line 2/],
      [Uint8Array.of(0xff, 0xfe, 0, 1), /binary file, not text/],
    ] as const) {
      const refused = await run(content);
      expect(refused.exit).toBe(3);
      expect(refused.said).toMatch(reason);
    }
    expect((await run(five, '--diameter-mm', '15')).said).toMatch(/:3:1: .* lies off a wafer of 15 mm/);
  });

  it('tells wrong usage from a file that is not there', async () => {
    await expect(run(five, '--screen', 'some')).rejects.toThrow(UsageError);
    await expect(run(five, '--edge-exclusion-mm', '3')).rejects.toThrow('--diameter-mm');
    await expect(run(five, '--diameter-mm', 'wide')).rejects.toThrow(UsageError);
    await expect(run(five, '--what')).rejects.toThrow(UsageError);
    const exit = await map.run([join(folder, 'none.csv')], { out: () => undefined, say: () => undefined });
    expect(exit).toBe(1);
  });
});
