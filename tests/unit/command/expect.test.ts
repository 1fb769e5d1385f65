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
