/** Exit statuses of every verb: 0 done, 1 failed, 2 wrong usage, 3 the input was refused. */
export type ExitStatus = 0 | 1 | 2 | 3;

/** Where a verb writes: results on `out`, everything said to a person on `say` (standard error). */
export interface VerbOutput {
  out(text: string): void;
  say(text: string): void;
}

/** One word of the command line. `usage` is printed by `--help`. `run` throws `UsageError` for wrong usage. */
export interface Verb {
  name: string;
  summary: string;
  usage: string;
  run(args: string[], output: VerbOutput): Promise<ExitStatus>;
}

/** Wrong usage of a verb: printed with a pointer to `--help`, exit status 2. */
export class UsageError extends Error {}
