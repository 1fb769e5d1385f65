import Link from 'next/link';
import { Figures } from '@/app/_ui/figures';
import { SectionHead } from '@/app/_ui/section-head';
import { limitsState } from '@/lib/control/limits-state';
import { SINCE_MOST } from '@/lib/excursions/stream-standing';
import { targetModel } from '@/lib/excursions/target-model';
import {
  formatDate,
  formatDateTime,
  formatDensity,
  formatNumber,
  formatReading,
  formatWithUncertainty,
} from '@/lib/format';
import { lagOneAutocorrelation } from '@/lib/stats/lag-one-autocorrelation';
import { inForce } from '@/lib/streams/in-force';
import { STATISTIC_WORDS } from './chart-unit';
import type { StreamView } from './stream-view';

const SYMBOLS = { boron: 'B', phosphorus: 'P', arsenic: 'As', antimony: 'Sb' };

/** What the stream is and what judges it, beside its charts. */
export function StreamFacts({ view }: { view: StreamView }) {
  const { settings, standing, timeZone, unit } = view;
  const { stream } = settings;
  const setup = `/setup/streams/${stream.slug}`;
  return (
    <section aria-labelledby="the-stream">
      <SectionHead id="the-stream" aside={<Link href={setup}>Set up</Link>}>
        The stream
      </SectionHead>
      <Figures
        figures={[
          ...targetFigures(view),
          {
            name: 'charted',
            value:
              stream.chartedValue === 'relative'
                ? '100·ln(measured/expected)'
                : STATISTIC_WORDS[stream.controlStatistic],
          },
          {
            name: 'subgroup',
            value:
              stream.subgroupSize === 1
                ? stream.subgroup
                : `${stream.subgroup} of ${stream.subgroupSize} wafers`,
          },
        ]}
      />
      <SectionHead id="the-limits" aside={<Link href={`${setup}#limits`}>Limits</Link>}>
        The limits in force
      </SectionHead>
      {standing.inForce === null ? (
        <p className="quiet small">None yet: the first 25 subgroups propose them.</p>
      ) : (
        <Figures figures={limitFigures(view, standing.inForce, unit, timeZone)} />
      )}
      {view.events.length > 0 && (
        <>
          <SectionHead>Last in the log</SectionHead>
          <ul className="plain-list small">
            {view.events.slice(0, 3).map((event) => (
              <li key={event.id}>
                <span className="quiet">{formatDateTime(event.at, timeZone)}</span> {event.text}
                {event.restart && ' Rules start afresh.'}
              </li>
            ))}
          </ul>
        </>
      )}
    </section>
  );
}

function targetFigures({ settings, now }: StreamView) {
  const revision = inForce(settings.targets, now);
  if (revision === null) return [{ name: 'target', value: 'none' }];
  const { target } = revision;
  const { quantity } = settings.stream;
  const tolerance =
    target.tolerancePercent === null ? '' : ` ± ${formatNumber(target.tolerancePercent, 2)} %`;
  const model = targetModel(target, null);
  return [
    {
      name: 'target',
      value: `${SYMBOLS[target.dopant]} ${formatDensity(target.densityPerCm3)}${tolerance}`,
      definition: `Revision ${revision.revision}, by ${revision.author}: ${revision.reason}. Dopant per cm³${
        target.alongCrystal ? ' at the seed end of the crystal' : ''
      }${target.profile === 'gaussian' || target.profile === 'erfc' ? ' at the peak of the layer' : ''}.`,
    },
    {
      name: 'expected',
      value: model?.value == null ? 'differs by wafer' : formatReading(quantity, model.value),
      definition:
        model === null
          ? 'What physics expects of a wafer of this target.'
          : `Known to ± ${formatNumber(model.uncertaintyPercent, 2)} % (one standard uncertainty, k = 1)${
              target.calibrationFactor === null ? ', from physics alone' : ', calibrated on a baseline'
            }.`,
      ink: 'expected' as const,
    },
  ];
}

function limitFigures(
  view: StreamView,
  limits: NonNullable<StreamView['standing']['inForce']>,
  unit: StreamView['unit'],
  timeZone: string,
) {
  const { level, n } = { ...limits.limits };
  const { since, baselineLevels } = view.standing;
  const lag = baselineLevels.length < 2 ? null : lagOneAutocorrelation(baselineLevels);
  const bound = 2 / Math.sqrt(Math.max(1, baselineLevels.length));
  const approved =
    limits.approvedBy === null
      ? ''
      : ` Approved by ${limits.approvedBy}, ${formatDate(limits.approvedAt, timeZone)}.`;
  return [
    {
      name: 'revision',
      value: `${limits.revision}, ${limits.origin === 'inherited' ? 'inherited' : limitsState(limits)}`,
      definition: `Drawn up by ${limits.author}, ${formatDate(limits.draftedAt, timeZone)}, from ${n} subgroups.${approved}`,
    },
    { name: 'in force since', value: formatDate(limits.effectiveFrom, timeZone) },
    {
      name: 'centre, σ',
      value: `${formatWithUncertainty(level.centre * unit.factor, level.sigma * unit.factor).replace(' ± ', ', ')} ${unit.unit}`,
      definition: 'σ from the moving range of the baseline: the spread from one subgroup to the next.',
    },
    {
      name: 'since then',
      value:
        since.subgroups > SINCE_MOST
          ? `${since.withSignal} of the last ${SINCE_MOST} with a signal`
          : `${since.subgroups} ${since.subgroups === 1 ? 'subgroup' : 'subgroups'}, ${since.withSignal} with a signal`,
    },
    {
      name: 'lag-1 in the baseline',
      value:
        lag === null ? '—' : `${formatNumber(lag, 2)}${Math.abs(lag) <= bound ? ' (fine)' : ' (not free)'}`,
      definition: `Autocorrelation from one subgroup to the next. Within ± ${formatNumber(bound, 2)} it looks like none; beyond it limits from moving ranges are too tight (positive) or too wide (negative).`,
    },
  ];
}
