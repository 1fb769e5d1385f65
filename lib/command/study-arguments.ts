import { parseArgs } from 'node:util';
import { parseRule, WESTERN_ELECTRIC } from '@/lib/control/rule';
import type { StudyOptions } from '@/lib/control/study-chart';
import type { SubgroupColumns } from './study-subgroups';
import { UsageError } from './verb';

const KINDS = ['individuals', 'mean-range', 'mean-s', 'three-way'] as const;
export type StudyKind = (typeof KINDS)[number];

/** What the words after `study` ask for. */
export interface StudyArguments {
  file: string;
  columns: SubgroupColumns;
  kind: StudyKind;
  options: StudyOptions;
  json: boolean;
}

/** Reads the words after `study`. Throws `UsageError` for any that make no sense together or alone. */
export function studyArguments(args: string[]): StudyArguments {
  const { values, positionals } = parse(args);
  const [file, ...more] = positionals;
  if (file === undefined || more.length > 0) throw new UsageError('study takes one file');
  const columns = readSubgroupColumns(values);
  const single = 'value' in columns && columns.group === undefined;
  const kind = KINDS.find((name) => name === (values.chart ?? (single ? 'individuals' : 'three-way')));
  if (!kind) throw new UsageError(`--chart is one of ${KINDS.join(', ')}, not "${values.chart}"`);
  if (single !== (kind === 'individuals')) {
    const need = single
      ? `${kind} needs subgroups: --group or --values`
      : 'individuals takes one value a row';
    throw new UsageError(need);
  }
  const limits = values.limits ?? 'classical';
  if (limits !== 'classical' && limits !== 'probability') {
    throw new UsageError(`--limits is classical or probability, not "${limits}"`);
  }
  const options: StudyOptions = { rules: readRules(values.rules), limits };
  if (values.baseline !== undefined) {
    if (!/^\d{1,9}$/.test(values.baseline) || Number(values.baseline) < 2) {
      throw new UsageError(`--baseline is a whole number of at least 2, not "${values.baseline}"`);
    }
    options.baseline = Number(values.baseline);
  }
  return { file, columns, kind, options, json: values.json ?? false };
}

function parse(args: string[]) {
  const text = { type: 'string' } as const;
  const names = {
    value: text,
    group: text,
    values: text,
    chart: text,
    baseline: text,
    rules: text,
    limits: text,
  };
  try {
    return parseArgs({ args, allowPositionals: true, options: { ...names, json: { type: 'boolean' } } });
  } catch (error) {
    throw new UsageError(error instanceof Error ? error.message : String(error));
  }
}

function readSubgroupColumns(flags: { value?: string; group?: string; values?: string }): SubgroupColumns {
  const { value, group, values } = flags;
  if (values !== undefined) {
    if (value !== undefined || group !== undefined) throw new UsageError('--values stands alone');
    const names = values.split(',').map((name) => name.trim());
    if (names.length < 2 || names.includes('') || new Set(names).size < names.length) {
      throw new UsageError('--values takes two or more different columns, separated by commas');
    }
    return { values: names };
  }
  if (value === undefined) throw new UsageError('name the column of the values: --value COLUMN');
  return group === undefined ? { value } : { value, group };
}

function readRules(list: string | undefined): readonly string[] {
  if (list === undefined) return WESTERN_ELECTRIC;
  const names = list.split(',').map((name) => name.trim());
  try {
    for (const name of names) parseRule(name);
  } catch (error) {
    throw new UsageError(error instanceof Error ? error.message : String(error));
  }
  return [...new Set(names)];
}
