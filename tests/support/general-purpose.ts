import { spawnSync } from 'node:child_process';
import { fileURLToPath } from 'node:url';

const script = fileURLToPath(new URL('general-purpose.py', import.meta.url));

/** The Python that has scipy, if there is one: Debian's with the package python3-scipy, or the one in use. */
const python = ['/usr/bin/python3', 'python3'].find(
  (program) =>
    spawnSync(program, ['-c', 'import importlib.util as u, sys; sys.exit(not u.find_spec("scipy"))'])
      .status === 0,
);

export const generalPurposePresent = python !== undefined;

/** One question: the name of a function in the script beside, and its arguments. */
export type Question = [string, unknown[]];

/** The answers of the general-purpose packages, in the order of the questions; null where one was not given. */
export function generalPurpose(questions: readonly Question[]): (number | null)[][] {
  if (python === undefined) throw new Error('there is no Python with scipy');
  const run = spawnSync(python, [script], { input: JSON.stringify(questions), encoding: 'utf8' });
  if (run.status !== 0) throw new Error(run.stderr);
  return JSON.parse(run.stdout) as (number | null)[][];
}
