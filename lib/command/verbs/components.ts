import { parseArgs } from 'node:util';
import {
  varianceComponents,
  type NestedValue,
  type VarianceComponents,
} from '@/lib/control/variance-components';
import { componentsTable } from '../components-table';
import { decimalNumber } from '../decimal-number';
import { fileFailure } from '../file-failure';
import { readColumns, type FileFault } from '../read-columns';
import { UsageError, type Verb } from '../verb';

const usage = `evenohm components FILE --value COLUMN --nest OUTER,INNER

How much of the variation comes from where: variance components of groups within groups.

  --value COLUMN     the measured value, one a row
  --nest A,B,C       the columns that say which group a row is in, from the outermost to the
                     innermost: lot,wafer. What varies within the innermost is the last level.
  --json             one JSON object

Analysis of variance, balanced or not, restricted maximum likelihood (reml) and 95 % intervals.
A group is known by its own name and those around it. What the data cannot give is null.`;

/** Nested variance components of any CSV file, without a database. */
export const components: Verb = {
  name: 'components',
  summary: 'where variation comes from: nested variance components of any CSV file',
  usage,
  async run(args, output) {
    const { file, value, nest, json } = readArguments(args);
    let table;
    try {
      table = await readColumns(file, [value, ...nest]);
    } catch (error) {
      output.say(fileFailure(file, error));
      return 1;
    }
    const faults: FileFault[] = table.ok ? [] : table.faults;
    const rows = (table.ok ? table.rows : []).map(([cell, ...labels]): NestedValue => {
      const refuse = (at: { line: number; column: number } | undefined, reason: string): void =>
        void faults.push({ file, line: at?.line ?? 1, column: at?.column ?? 1, reason });
      const read = decimalNumber(cell?.text ?? '');
      if (read === null)
        refuse(cell, cell?.text === '' ? 'the cell is empty' : `not a number: "${cell?.text}"`);
      for (const label of labels) if (label.text === '') refuse(label, 'the cell is empty');
      return { labels: labels.map(({ text }) => text), value: read ?? 0 };
    });
    if (faults.length > 0) {
      for (const { line, column, reason } of faults) output.say(`${file}:${line}:${column}: ${reason}`);
      return 3;
    }
    let found: VarianceComponents;
    try {
      found = varianceComponents(rows, nest);
    } catch (error) {
      if (!(error instanceof RangeError)) throw error;
      output.say(`${file}: ${error.message}`);
      return 3;
    }
    output.out(json ? JSON.stringify(found) : componentsTable(found));
    return 0;
  },
};

function readArguments(args: string[]): { file: string; value: string; nest: string[]; json: boolean } {
  const text = { type: 'string' } as const;
  let parsed;
  try {
    const options = { value: text, nest: text, json: { type: 'boolean' } } as const;
    parsed = parseArgs({ args, allowPositionals: true, options });
  } catch (error) {
    throw new UsageError(error instanceof Error ? error.message : String(error));
  }
  const [file, ...more] = parsed.positionals;
  if (file === undefined || more.length > 0) throw new UsageError('components takes one file');
  const { value, nest = '', json = false } = parsed.values;
  if (value === undefined) throw new UsageError('name the column of the values: --value COLUMN');
  const names = nest.split(',').map((name) => name.trim());
  if (names.includes('') || new Set([value, ...names]).size <= names.length) {
    throw new UsageError(
      'name the groups from the outermost to the innermost, each once: --nest OUTER,INNER',
    );
  }
  return { file, value, nest: names, json };
}
