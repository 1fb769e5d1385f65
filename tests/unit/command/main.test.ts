import { describe, expect, it } from 'vitest';
import { runCommand } from '@/lib/command/main';

/** Runs a command line and keeps apart what it prints and what it says. */
async function run(...words: string[]) {
  const printed: string[] = [];
  const said: string[] = [];
  const output = {
    out: (text: string) => void printed.push(text),
    say: (text: string) => void said.push(text),
  };
  return { status: await runCommand(words, output), printed: printed.join('\n'), said: said.join('\n') };
}

/** The first line of help loads every verb. */
describe('runCommand', { timeout: 60_000 }, () => {
  it('prints the help that was asked for, with every verb', async () => {
    const { status, printed, said } = await run('--help');
    expect(status).toBe(0);
    expect(printed).toMatch(/serve .*\n.*build /);
    expect(said).toBe('');
  });
  it('without a verb says the same on standard error and ends with 2', async () => {
    const { status, printed, said } = await run();
    expect(status).toBe(2);
    expect(printed).toBe('');
    expect(said).toContain('evenohm VERB');
  });
  it('ends with 2 on an unknown verb and on wrong usage', async () => {
    expect(await run('bake')).toMatchObject({ status: 2, printed: '' });
    expect(await run('serve', '--loud')).toMatchObject({ status: 2, printed: '' });
  });
  it('prints the usage of one verb', async () => {
    const { status, printed } = await run('serve', '--help');
    expect(status).toBe(0);
    expect(printed).toContain('EVENOHM_DATA');
  });
});
