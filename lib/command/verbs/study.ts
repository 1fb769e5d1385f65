import { individualsCharts } from '@/lib/control/individuals-charts';
import { meanSpreadCharts } from '@/lib/control/mean-spread-charts';
import { rangeLaw, standardDeviationLaw } from '@/lib/control/spread-law';
import type { StudyChart, StudyOptions } from '@/lib/control/study-chart';
import { threeWayCharts } from '@/lib/control/three-way-charts';
import { fileFailure } from '../file-failure';
import { studyArguments, type StudyKind } from '../study-arguments';
import { studySubgroups } from '../study-subgroups';
import { studyTable } from '../study-table';
import type { Verb } from '../verb';

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

/** A control study of any CSV file, without a database. */
export const study: Verb = {
  name: 'study',
  summary: 'control charts of any CSV file: limits and signals',
  usage,
  async run(args, output) {
    const { file, columns, kind, options, json } = studyArguments(args);
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
  kind: StudyKind,
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
