import { parseArgs } from 'node:util';
import { individualsCharts } from '@/lib/control/individuals-charts';
import { meanSpreadCharts } from '@/lib/control/mean-spread-charts';
import { parseRule, WESTERN_ELECTRIC } from '@/lib/control/rule';
import { rangeLaw, standardDeviationLaw } from '@/lib/control/spread-law';
import type { StudyChart, StudyOptions } from '@/lib/control/study-chart';
import { threeWayCharts } from '@/lib/control/three-way-charts';
import { studySubgroups, type SubgroupColumns } from '../study-subgroups';
import { studyTable } from '../study-table';
import { UsageError, type Verb } from '../verb';

const usage = `evenohm study FILE --value COLUMN [--group COLUMN] [options]
evenohm study FILE --values A,B,C [options]

A control study of any CSV file with a header row.

  --value COLUMN     the measured value, one a row
  --group COLUMN     rows with the same text here form one subgroup
  --values A,B,C     these columns of a row form one subgroup
  --chart KIND       individuals, mean-range, mean-s or three-way
                     (individuals with one value a row, else three-way)
  --baseline N       the first N points set the limits (all of them)
  --rules A,B        rules of the level chart, by name:
                     beyond-3-sigma, two-of-three-beyond-2-sigma, four-of-five-beyond-1-sigma,
                     eight-on-one-side (these four by default), fifteen-within-1-sigma,
                     eight-beyond-1-sigma, six-in-a-trend, fourteen-alternating,
                     or any M-of-N-beyond-K-sigma with N up to 15
  --limits KIND      classical (the default), or probability: 0.27 % beyond the limits of ranges
                     and spreads
  --json             one JSON object; sigma is the standard deviation of what is plotted

Limits that differ from point to point are lists. Points are counted from 1.`;

const KINDS = ['individuals', 'mean-range', 'mean-s', 'three-way'] as const;
type Kind = (typeof KINDS)[number];

/** A control study of any CSV file, without a database. */
export const study: Verb = {
  name: 'study',
  summary: 'control charts of any CSV file: limits and signals',
  usage,
  async run(args, output) {
    const { file, columns, kind, options, json } = readArguments(args);
    let read;
    try {
      read = await studySubgroups(file, columns);
    } catch (error) {
      output.say(`${file} cannot be read: ${error instanceof Error ? error.message : String(error)}`);
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
    let charts: StudyChart[];
    try {
      charts = chartsOf(kind, read.subgroups, options);
    } catch (error) {
      if (error instanceof RangeError) return refuse([`${file}: ${error.message}`]);
      throw error;
    }
    output.out(json ? JSON.stringify({ charts }) : studyTable(charts));
    return 0;
  },
};

function chartsOf(
  kind: Kind,
  subgroups: readonly (readonly number[])[],
  options: StudyOptions,
): StudyChart[] {
  switch (kind) {
    case 'individuals':
      return individualsCharts(subgroups.flat(), options);
    case 'mean-range':
      return meanSpreadCharts(subgroups, rangeLaw, options);
    case 'mean-s':
      return meanSpreadCharts(subgroups, standardDeviationLaw, options);
    case 'three-way':
      return threeWayCharts(subgroups, options);
  }
}

function readArguments(args: string[]) {
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
