import { capability as capabilityOf, FEWEST_VALUES, type Capability } from '@/lib/control/capability';
import { capabilityArguments } from '../capability-arguments';
import { capabilityTable } from '../capability-table';
import { fileFailure } from '../file-failure';
import { studySubgroups } from '../study-subgroups';
import type { Verb } from '../verb';

const usage = `evenohm capability FILE --value COLUMN --lower X --upper X [options]

What a process can hold against its specification, from any CSV file with a header row.

  --value COLUMN     the measured value, one a row, in time order
  --group COLUMN     rows with the same text here form one subgroup
  --lower X          lower limit of the specification; one of the two limits may be missing
  --upper X          upper limit of the specification
  --target X         the target, for Cpm
  --sigma KIND       where the σ of Cp and Cpk comes from: overall-s, mean-moving-range (of values in
                     time order), pooled-s or mean-range (within groups); overall-s by default,
                     pooled-s with --group
  --distribution D   normal (the default), or lognormal for a skewed figure: Pp and Ppk by percentiles
  --json             one JSON object

95 % intervals take the values as independent. Fewer than ${FEWEST_VALUES} values give no index. Of an
unstable process no index foretells what it will do.`;

/** Capability of the values of any CSV file, without a database. */
export const capability: Verb = {
  name: 'capability',
  summary: 'what a process can hold against its specification, from any CSV file',
  usage,
  async run(args, output) {
    const { file, columns, specification, options, json } = capabilityArguments(args);
    let read;
    try {
      read = await studySubgroups(file, columns);
    } catch (error) {
      output.say(fileFailure(file, error));
      return 1;
    }
    const refuse = (reasons: readonly string[]): 3 => {
      for (const reason of reasons) output.say(reason);
      return 3;
    };
    if (!read.ok) {
      return refuse(
        read.faults.map((fault) => `${fault.file}:${fault.line}:${fault.column}: ${fault.reason}`),
      );
    }
    let found: Capability | null;
    try {
      found = capabilityOf(read.subgroups, specification, options);
    } catch (error) {
      if (error instanceof RangeError) return refuse([`${file}: ${error.message}`]);
      throw error;
    }
    if (!found) {
      const count = read.subgroups.flat().length;
      return refuse([
        count < FEWEST_VALUES
          ? `${file}: ${count} values, and an index needs ${FEWEST_VALUES}`
          : `${file}: the values have no spread of this kind`,
      ]);
    }
    output.out(json ? JSON.stringify(flat(found)) : capabilityTable(found));
    return 0;
  },
};

const INDICES = ['cp', 'cpk', 'pp', 'ppk', 'cpm'] as const;

/** The indices as plain numbers, their intervals beside. */
function flat(found: Capability) {
  const { values, mean, sigma, overall, signals, normality } = found;
  const value = (name: (typeof INDICES)[number]) => [name, found[name]?.value ?? null];
  const interval = (name: (typeof INDICES)[number]) => [name, found[name]?.interval ?? null];
  return {
    ...Object.fromEntries(INDICES.map(value)),
    intervals: Object.fromEntries(INDICES.map(interval)),
    values,
    mean,
    sigma,
    overall,
    stable: signals === 0,
    signals,
    normality,
  };
}
