import type { CusumDesign } from '@/lib/control/cusum-run-length';
import type { EwmaDesign } from '@/lib/control/ewma-run-length';
import type { MemoryStudyOptions } from '@/lib/control/memory-study';
import { WESTERN_ELECTRIC } from '@/lib/control/rule';
import type { SigmaSource, StudyOptions } from '@/lib/control/study-chart';
import { numberFlag, ruleList, studyFlags, type StudyFlags } from './study-flags';
import type { SubgroupColumns } from './study-subgroups';
import { UsageError } from './verb';

const KINDS = ['individuals', 'mean-range', 'mean-s', 'three-way', 'nested', 'ewma', 'cusum'] as const;
const ESTIMATORS = ['mean-moving-range', 'median-moving-range', 'mean-range', 'mean-s', 'pooled-s'] as const;

/** The charts that were asked for, with all they need. */
export type WantedCharts =
  | { kind: 'individuals' | 'mean-range' | 'mean-s' | 'three-way' | 'nested'; options: StudyOptions }
  | { kind: 'ewma'; design: EwmaDesign; options: MemoryStudyOptions & { limits: 'steady' | 'growing' } }
  | { kind: 'cusum'; design: CusumDesign; options: MemoryStudyOptions };

/** What the words after `study` ask for. */
export interface StudyArguments {
  file: string;
  columns: SubgroupColumns;
  wanted: WantedCharts;
  json: boolean;
}

/** Flags that only some kinds of chart know. */
const OWN_FLAGS: Record<string, readonly (typeof KINDS)[number][]> = {
  rules: ['individuals', 'mean-range', 'mean-s', 'three-way', 'nested'],
  'spread-rules': ['mean-range', 'mean-s', 'three-way', 'nested'],
  target: ['ewma', 'cusum'],
  sigma: ['ewma', 'cusum'],
  lambda: ['ewma'],
  width: ['ewma'],
  reference: ['cusum'],
  decision: ['cusum'],
};

/** Reads the words after `study`. Throws `UsageError` for any that make no sense together or alone. */
export function studyArguments(args: string[]): StudyArguments {
  const { flags, words } = studyFlags(args);
  const [file, ...more] = words;
  if (file === undefined || more.length > 0) throw new UsageError('study takes one file');
  const columns = readSubgroupColumns(flags);
  const single = 'value' in columns && !('group' in columns);
  const usual = 'wafer' in columns ? 'nested' : single ? 'individuals' : 'three-way';
  const kind = KINDS.find((name) => name === (flags.chart ?? usual));
  if (!kind) throw new UsageError(`--chart is one of ${KINDS.join(', ')}, not "${flags.chart}"`);
  if ('wafer' in columns !== (kind === 'nested')) {
    throw new UsageError('nested takes two groups, and only nested does: --group RUN,WAFER');
  }
  if (kind !== 'ewma' && kind !== 'cusum' && single !== (kind === 'individuals')) {
    const need = single
      ? `${kind} needs subgroups: --group or --values`
      : 'individuals takes one value a row';
    throw new UsageError(need);
  }
  for (const [name, kinds] of Object.entries(OWN_FLAGS)) {
    if (flags[name as keyof StudyFlags] !== undefined && !kinds.includes(kind)) {
      throw new UsageError(`--${name} is for ${kinds.join(', ')}, not for ${kind}`);
    }
  }
  return { file, columns, wanted: wantedCharts(kind, flags), json: flags.json ?? false };
}

function wantedCharts(kind: (typeof KINDS)[number], flags: StudyFlags): WantedCharts {
  const shared: Pick<StudyOptions, 'baseline' | 'estimator'> = {};
  if (flags.baseline !== undefined) {
    if (!/^\d{1,9}$/.test(flags.baseline) || Number(flags.baseline) < 2) {
      throw new UsageError(`--baseline is a whole number of at least 2, not "${flags.baseline}"`);
    }
    shared.baseline = Number(flags.baseline);
  }
  if (flags.estimate !== undefined) {
    shared.estimator = oneOf<SigmaSource>('estimate', flags.estimate, ESTIMATORS);
  }
  if (kind === 'ewma' || kind === 'cusum') {
    const [target, sigma] = [numberFlag(flags, 'target'), numberFlag(flags, 'sigma')];
    const options: MemoryStudyOptions = {
      ...shared,
      ...(target === undefined ? {} : { target }),
      ...(sigma === undefined ? {} : { sigma }),
    };
    if (kind === 'cusum') {
      if (flags.limits !== undefined) throw new UsageError('the limit of cusum is --decision');
      const [reference = 0.5, decision = 5] = [numberFlag(flags, 'reference'), numberFlag(flags, 'decision')];
      return { kind, design: { reference, decision }, options };
    }
    const limits = oneOf('limits', flags.limits ?? 'steady', ['steady', 'growing']);
    const [lambda = 0.2, width = 3] = [numberFlag(flags, 'lambda'), numberFlag(flags, 'width')];
    return { kind, design: { lambda, width }, options: { ...options, limits } };
  }
  const options: StudyOptions = {
    ...shared,
    rules: flags.rules === undefined ? WESTERN_ELECTRIC : ruleList(flags.rules),
    limits: oneOf('limits', flags.limits ?? 'classical', ['classical', 'probability']),
    ...(flags['spread-rules'] === undefined ? {} : { spreadRules: ruleList(flags['spread-rules']) }),
  };
  return { kind, options };
}

function oneOf<W extends string>(flag: string, typed: string, words: readonly W[]): W {
  const found = words.find((word) => word === typed);
  if (found === undefined) throw new UsageError(`--${flag} is ${words.join(' or ')}, not "${typed}"`);
  return found;
}

function readSubgroupColumns({ value, group, values }: StudyFlags): SubgroupColumns {
  const list = (text: string, flag: string, most: number): string[] => {
    const names = text.split(',').map((name) => name.trim());
    if (names.length > most || names.includes('') || new Set(names).size < names.length) {
      throw new UsageError(`${flag} takes different columns, separated by commas, ${most} at most`);
    }
    return names;
  };
  if (values !== undefined) {
    if (value !== undefined || group !== undefined) throw new UsageError('--values stands alone');
    const names = list(values, '--values', 1000);
    if (names.length < 2) throw new UsageError('--values takes two columns or more');
    return { values: names };
  }
  if (value === undefined) throw new UsageError('name the column of the values: --value COLUMN');
  if (group === undefined) return { value };
  const [outer = '', wafer] = list(group, '--group', 2);
  return wafer === undefined ? { value, group: outer } : { value, group: outer, wafer };
}
