import { cusumCharts } from '@/lib/control/cusum-charts';
import { ewmaCharts } from '@/lib/control/ewma-charts';
import { individualsCharts } from '@/lib/control/individuals-charts';
import { meanSpreadCharts } from '@/lib/control/mean-spread-charts';
import { nestedCharts } from '@/lib/control/nested-charts';
import { rangeLaw, standardDeviationLaw } from '@/lib/control/spread-law';
import type { StudyChart } from '@/lib/control/study-chart';
import { threeWayCharts } from '@/lib/control/three-way-charts';
import { mean } from '@/lib/stats/mean';
import { fileFailure } from '../file-failure';
import { studyArguments, type WantedCharts } from '../study-arguments';
import { studySubgroups } from '../study-subgroups';
import { studyTable } from '../study-table';
import type { Verb } from '../verb';

const usage = `evenohm study FILE --value COLUMN [--group COLUMN] [options]
evenohm study FILE --values A,B,C [options]

A control study of any CSV file with a header row.

  --value COLUMN     the measured value, one a row
  --group COLUMN     rows with the same text here form one subgroup
  --group RUN,WAFER  runs of several wafers of several sites: chart nested
  --values A,B,C     these columns of a row form one subgroup
  --chart KIND       individuals, mean-range, mean-s, three-way, nested, ewma or cusum
                     (individuals with one value a row, else three-way or nested);
                     ewma and cusum take the mean of each subgroup
  --baseline N       the first N points set the limits (all of them)
  --rules A,B        rules of the level chart, by name:
                     beyond-3-sigma, two-of-three-beyond-2-sigma, four-of-five-beyond-1-sigma,
                     eight-on-one-side (these four by default), fifteen-within-1-sigma,
                     eight-beyond-1-sigma, six-in-a-trend, fourteen-alternating,
                     or any M-of-N-beyond-K-sigma with N up to 15
  --spread-rules A,B rules of the chart of ranges or spreads beside its limits; subgroups of
                     fewer than five take 2-of-2-beyond-2-sigma, 3-of-3-beyond-1-sigma and
                     7-of-7-beyond-0-sigma above, 4-of-4-beyond-2-sigma, 6-of-6-beyond-1-sigma
                     and 10-of-10-beyond-0-sigma below the centre
  --estimate KIND    what σ comes from: mean-moving-range or median-moving-range, mean-range,
                     mean-s or pooled-s, as the chart knows it (the first it knows)
  --limits KIND      classical (the default), or probability: 0.27 % beyond the limits of ranges
                     and spreads; of an EWMA steady (the default) or growing from the start
  --target --sigma   of ewma and cusum (else from the baseline)
  --lambda --width   weight of the newest value, limits in σ of the EWMA (0.2, 3)
  --reference --decision  k and h of the CUSUM in σ (0.5, 5)
  --json             one JSON object; sigma is the standard deviation of what is plotted

Limits that differ from point to point are lists. Points are counted from 1.`;

/** A control study of any CSV file, without a database. */
export const study: Verb = {
  name: 'study',
  summary: 'control charts of any CSV file: limits and signals',
  usage,
  async run(args, output) {
    const { file, columns, wanted, json } = studyArguments(args);
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
      charts = chartsOf(wanted, read.subgroups, read.groups);
    } catch (error) {
      if (error instanceof RangeError) return refuse([`${file}: ${error.message}`]);
      throw error;
    }
    output.out(json ? JSON.stringify({ charts }) : studyTable(charts));
    return 0;
  },
};

function chartsOf(
  wanted: WantedCharts,
  subgroups: readonly (readonly number[])[],
  groups: readonly string[],
): StudyChart[] {
  switch (wanted.kind) {
    case 'individuals':
      return individualsCharts(subgroups.flat(), wanted.options);
    case 'mean-range':
      return meanSpreadCharts(subgroups, rangeLaw, wanted.options);
    case 'mean-s':
      return meanSpreadCharts(subgroups, standardDeviationLaw, wanted.options);
    case 'three-way':
      return threeWayCharts(subgroups, wanted.options);
    case 'nested':
      return nestedCharts(byGroup(subgroups, groups), wanted.options);
    case 'ewma':
      return ewmaCharts(subgroups.map(mean), wanted.design, wanted.options);
    case 'cusum':
      return cusumCharts(subgroups.map(mean), wanted.design, wanted.options);
  }
}

/** The wafers of each run, runs in the order in which they first appear. */
function byGroup(subgroups: readonly (readonly number[])[], groups: readonly string[]) {
  const runs = new Map<string, (readonly number[])[]>();
  subgroups.forEach((values, i) => {
    const wafers = runs.get(groups[i] ?? '');
    if (wafers) wafers.push(values);
    else runs.set(groups[i] ?? '', [values]);
  });
  return [...runs.values()];
}
