import { mkdtemp, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { UsageError } from '@/lib/command/verb';
import { expect as verb } from '@/lib/command/verbs/expect';

async function run(line: string): Promise<{ status: number; out: string; said: string }> {
  const [out, said]: [string[], string[]] = [[], []];
  const status = await verb.run(line.split(' ').filter(Boolean), {
    out: (text) => out.push(text),
    say: (text) => said.push(text),
  });
  return { status, out: out.join('\n'), said: said.join('\n') };
}

async function answer(line: string): Promise<Record<string, unknown>> {
  const { status, out, said } = await run(`${line} --json`);
  expect(said).toBe('');
  expect(status).toBe(0);
  const parsed: unknown = JSON.parse(out);
  expect(parsed).toBeTypeOf('object');
  return Object(parsed) as Record<string, unknown>;
}

describe('expect', () => {
  // Anchors of ASTM F723 / SEMI MF723 [calc].
  it('gives the resistivity of a doping, with every key', async () => {
    const found = await answer('--dopant boron --density 1e15');
    expect(found['resistivityOhmCm']).toBeCloseTo(13.306, 3);
    expect(found).toMatchObject({
      type: 'p',
      densityPerCm3: 1e15,
      temperatureC: 23,
      model: 'standard',
      notes: [],
    });
    expect(found['uncertaintyPercent']).toBeCloseTo(3 / Math.sqrt(3), 10);
    const carriers = Object(found['carriers']) as Record<string, number>;
    expect((carriers['holesPerCm3'] ?? 0) / 1e15).toBeCloseTo(1, 9);
    expect(carriers['electronsPerCm3']).toBeGreaterThan(0);
  });

  it('gives the doping of a resistivity by either inverse', async () => {
    const direct = await answer('--dopant phosphorus --resistivity 10 --inverse direct');
    expect(Number(direct['densityPerCm3']) / 4.445e14).toBeCloseTo(1, 3);
    expect(direct['resistivityOhmCm']).toBe(10);
    const numeric = await answer('--dopant phosphorus --resistivity 10');
    const back = await answer(`--dopant phosphorus --density ${String(numeric['densityPerCm3'])}`);
    expect(back['resistivityOhmCm']).toBeCloseTo(10, 9);
  });

  it('closes the circle at another temperature', async () => {
    const warm = await answer('--dopant boron --density 1e15 --temperature-c 27');
    expect(Number(warm['resistivityOhmCm'])).toBeGreaterThan(13.306 * 1.03);
    const back = await answer(
      `--dopant boron --resistivity ${String(warm['resistivityOhmCm'])} --temperature-c 27`,
    );
    expect(Number(back['densityPerCm3']) / 1e15).toBeCloseTo(1, 9);
  });

  it('counts both dopants of compensated silicon: 2.258 Ω·cm at 300 K (Masetti) [calc]', async () => {
    const found = await answer(
      '--dopant boron --density 1e17 --counter-dopant phosphorus --counter-density 9e16 --temperature-c 26.85',
    );
    expect(found['resistivityOhmCm']).toBeCloseTo(2.258, 3);
    expect(found).toMatchObject({ type: 'p', model: 'masetti' });
  });

  it('inverts a mobility model too', async () => {
    for (const model of ['masetti', 'arora', 'klaassen']) {
      const there = await answer(`--dopant arsenic --density 1e17 --model ${model}`);
      const back = await answer(
        `--dopant arsenic --resistivity ${String(there['resistivityOhmCm'])} --model ${model}`,
      );
      expect(Number(back['densityPerCm3']) / 1e17).toBeCloseTo(1, 8);
    }
  });

  it('gives a layer its sheet resistance, junction and dose [calc]', async () => {
    const found = await answer(
      '--dopant boron --profile gaussian --peak-density 1e19 --length-um 0.5 --background-dopant phosphorus --background-density 1e15',
    );
    expect(found['sheetResistanceOhmSq']).toBeCloseTo(170.0, 1);
    expect(found['junctionDepthUm']).toBeCloseTo(1.517, 3);
    expect(Number(found['dosePerCm2']) / 4.431e14).toBeCloseTo(1, 4);
    const box = await answer('--dopant phosphorus --profile box --peak-density 1e19 --length-um 0.3');
    expect(box['sheetResistanceOhmSq']).toBeCloseTo(192.5, 1);
  });

  it('follows a crystal from its seed end', async () => {
    const found = await answer('--dopant phosphorus --density 1e15 --fraction 0.5');
    expect(Number(found['resistivityOhmCm']) / 4.48188).toBeCloseTo(0.6486, 4);
  });

  it('lets each dopant of a crystal segregate by itself, and says where its type changes', async () => {
    const found = await answer(
      '--dopant boron --density 1e16 --counter-dopant phosphorus --counter-density 5e15 --fraction 0.8',
    );
    expect(found).toMatchObject({ type: 'n', model: 'masetti' });
    // Scheil, k = 0.8: 1e16·0.2^−0.2.
    expect(Number(found['densityPerCm3']) / (1e16 * 0.2 ** -0.2)).toBeCloseTo(1, 12);
    expect(String(found['notes'])).toMatch(/at the fraction 0.7857/);
  });

  it('gives a grown layer ρ/(t − w), and refuses one on its own type', async () => {
    const line = '--dopant phosphorus --density 1e15 --thickness-um 10 --substrate-density 1e19';
    const found = await answer(`${line} --substrate-dopant boron`);
    // ρ = 4.4819 Ω·cm (ASTM F723), w = 1.04 µm [calc].
    expect(Number(found['sheetResistanceOhmSq']) / (4.4819 / 8.96e-4)).toBeCloseTo(1, 3);
    const refused = await run(`${line} --substrate-dopant arsenic`);
    expect(refused.status).toBe(3);
    expect(refused.said).toMatch(/measures the substrate/);
    const other = await answer(`${line} --substrate-dopant arsenic --method other`);
    expect(Number(other['sheetResistanceOhmSq']) / (4.4819 / 1e-3)).toBeCloseTo(1, 4);
  });

  const implant =
    '--dopant boron --range-um 0.1 --straggle-um 0.04 --background-dopant phosphorus --background-density 1e15';

  it('takes an implant by dose, range and straggle, and spreads it by a drive-in', async () => {
    const bare = await answer(`${implant} --dose-per-cm2 2e13`);
    expect(Number(bare['densityPerCm3']) / (2e13 / (Math.sqrt(2 * Math.PI) * 0.04e-4))).toBeCloseTo(1, 9);
    // 2.5 straggles deep: 0.62 % of the dose lies above the surface.
    expect(Number(bare['dosePerCm2']) / 2e13).toBeCloseTo(0.9938, 4);
    const driven = await answer(`${implant} --dose-per-cm2 2e13 --drive-in-c 1000 --drive-in-min 30`);
    expect(Number(driven['junctionDepthUm'])).toBeGreaterThan(Number(bare['junctionDepthUm']) + 0.1);
    expect(driven['dosePerCm2']).toBe(bare['dosePerCm2']);
    expect(driven['uncertaintyPercent']).toBeGreaterThan(10);
  });

  it('calls a drive-in beyond the classical law an order of magnitude, without a band', async () => {
    const line = `${implant} --dose-per-cm2 1e15 --drive-in-c 1000 --drive-in-min 30`;
    const found = await answer(line);
    expect(found['uncertaintyPercent']).toBeNull();
    expect(String(found['notes'])).toMatch(/order of magnitude only, no band/);
    expect((await run(`${line} --uncertainty`)).out).toMatch(/none: an order of magnitude only/);
  });

  it('takes a profile as depths and densities from a file, or says where the file is wrong', async () => {
    const folder = await mkdtemp(join(tmpdir(), 'evenohm-'));
    const [sound, faulty] = [join(folder, 'sound.csv'), join(folder, 'faulty.csv')];
    await writeFile(sound, 'depth_um,density_per_cm3\n0,1e19\n0.3,1e19\n');
    await writeFile(faulty, 'depth_um,density_per_cm3\n0,1e19\n0.3,much\n');
    const found = await answer(`--dopant phosphorus --profile pairs --pairs-file ${sound}`);
    // A box of 0.30 µm and 1e19: 192.5 Ω/□ [calc].
    expect(found['sheetResistanceOhmSq']).toBeCloseTo(192.5, 1);
    const refused = await run(`--dopant phosphorus --profile pairs --pairs-file ${faulty}`);
    expect(refused.status).toBe(3);
    expect(refused.said).toMatch(/faulty.csv:3:2 no number: "much"/);
    await rm(folder, { recursive: true });
  });

  it('prints the budget part by part, and what would explain a measured value', async () => {
    const line = '--dopant boron --density 1e15 --temperature-c 25 --temperature-uncertainty-c 0.5';
    const { out } = await run(`${line} --uncertainty --measured 13.2`);
    expect(out).toMatch(/conversion: ±3.00 rectangular, common to the stream/);
    expect(out).toMatch(/wafer temperature: normal, of one wafer/);
    expect(out).toMatch(/more dopant/);
    expect(out).toMatch(/change control/);
    const found = await answer(`${line} --measured 13.2`);
    const causes = found['causes'] as { cause: string; size: number }[];
    const moved = Object(found['sensitivities']) as Record<string, number>;
    const ln = 100 * Math.log(13.2 / Number(found['resistivityOhmCm']));
    const dopant = causes.find(({ cause }) => cause === 'dopant');
    expect(dopant?.size).toBeCloseTo(ln / (moved['perPercentDopant'] ?? 1), 10);
  });

  it('closes the circle far from 23 °C too, and says by how much the model steps off there', async () => {
    const hot = await answer('--dopant phosphorus --density 3e15 --temperature-c 60');
    expect(String(hot['notes'])).toMatch(/At 28 °C it lies -?\d/);
    const back = await answer(
      `--dopant phosphorus --resistivity ${String(hot['resistivityOhmCm'])} --temperature-c 60`,
    );
    expect(Number(back['densityPerCm3']) / 3e15).toBeCloseTo(1, 9);
  });

  it('has the fits at 300 K, there and back', async () => {
    const found = await answer('--dopant boron --density 1e15 --conversion 300k');
    expect(found).toMatchObject({ temperatureC: 26.85 });
    // 2.9 % above 23 °C (NBS SP 400-64) [calc].
    expect(Number(found['resistivityOhmCm']) / 13.306).toBeCloseTo(1.029, 3);
    const back = await answer(
      `--dopant boron --resistivity ${String(found['resistivityOhmCm'])} --conversion 300k`,
    );
    expect(Number(back['densityPerCm3']) / 1e15).toBeCloseTo(1, 9);
  });

  it('lets phosphorus stand in for antimony in a mobility model, and says so', async () => {
    const found = await answer('--dopant antimony --density 1e17 --model klaassen');
    expect(String(found['notes'])).toMatch(/phosphorus stands in/);
  });

  it('prints for a person what it prints for a machine', async () => {
    const { status, out } = await run('--dopant arsenic --density 1e20');
    expect(status).toBe(0);
    expect(out).toContain('0.00096353 Ω·cm at 23 °C');
    expect(out).toContain('1e20 per cm³, n-type');
  });

  it.each([
    ['', /--dopant/],
    ['--dopant gold --density 1e15', /one of/],
    ['--dopant boron', /one of the two/],
    ['--dopant boron --density 1e15 --resistivity 1', /one of the two/],
    ['--dopant boron --density 1,5', /no number/],
    ['--dopant boron --density 1e15 --counter-dopant phosphorus', /go together/],
    ['--dopant arsenic --density 1e15 --counter-dopant phosphorus --counter-density 1e14', /same type/],
    ['--dopant boron --density 1e15 --inverse direct', /--resistivity/],
    ['--dopant boron --density 1e15 --model guess', /one of/],
    ['--dopant boron --density 1e15 --length-um 3', /--profile/],
    ['--dopant boron --profile erfc --peak-density 1e19 --length-um 1', /background/],
    ['--dopant boron --profile box --peak-density 1e19 --length-um 1 --model arora', /standard only/],
    ['--dopant boron --density 1e15 --colour red', /colour/],
    ['--dopant boron --density 1e15 --substrate-dopant arsenic --substrate-density 1e19', /--thickness-um/],
    ['--dopant boron --profile implant --dose-per-cm2 1e14 --straggle-um 0.04', /--background/],
    ['--dopant boron --profile box --length-um 1', /one of the two/],
    ['--dopant boron --profile box --length-um 1 --peak-density 1e19 --range-um 1', /does not go with a box/],
    ['--dopant boron --profile pairs', /--pairs-file/],
    ['--dopant boron --density 1e15 --conversion 300k --temperature-c 25', /26.85/],
  ])('calls "%s" wrong usage', async (line, reason) => {
    await expect(run(line)).rejects.toThrow(UsageError);
    await expect(run(line)).rejects.toThrow(reason);
  });

  it.each([
    '--dopant boron --density 1e25',
    '--dopant boron --density 0',
    '--dopant antimony --density 1e20',
    '--dopant boron --resistivity 1e9',
    '--dopant boron --density 1e15 --temperature-c 300',
    '--dopant boron --density 1e15 --fraction 1',
    '--dopant boron --profile box --peak-density 1e19 --length-um 1 --background-dopant boron --background-density 1e15',
  ])('refuses "%s" with a reason and status 3', async (line) => {
    const { status, out, said } = await run(`${line} --json`);
    expect(status).toBe(3);
    expect(out).toBe('');
    expect(said.length).toBeGreaterThan(20);
  });
});
