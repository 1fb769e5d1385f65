import type { Mishap } from './mishap';

/**
 * Every mishap of the demonstration line. The truth and the due dates were set down from the sizes of the effects
 * against the variation built into each stream, before any chart had judged a wafer; they are not to be moved
 * afterwards. A chart that is late is reported as late.
 */
export const MISHAPS: readonly Mishap[] = [
  {
    streamSlug: 'boron-implant-1',
    truth:
      'The dose integrator of Implanter 1 loses 0.04 % of dose a monitor wafer, every wafer, from day 52 on.',
    onsetDay: 52,
    effect: { kind: 'dose-drift', dopingPercentPerSubgroup: -0.04 },
    chart: 'level',
    expectedWithinSubgroups: 25,
  },
  {
    streamSlug: 'p-epi-on-n',
    truth: 'After the injector of Reactor 3 was cleaned on day 58 it delivers 2.2 % more boron.',
    onsetDay: 58,
    effect: { kind: 'step', dopingPercent: 2.2 },
    chart: 'level',
    expectedWithinSubgroups: 6,
  },
  {
    streamSlug: 'phosphorus-furnace-c',
    truth:
      'A heater segment of Furnace C ages: a zone at ten o’clock runs hotter by 0.04 °C a run from day 48 on.',
    onsetDay: 48,
    effect: {
      kind: 'hot-zone',
      temperatureCPerSubgroup: 0.04,
      radiusShare: 0.6,
      angleDegrees: 150,
      widthShare: 0.35,
    },
    chart: 'within',
    expectedWithinSubgroups: 30,
  },
  {
    streamSlug: 'arsenic-implant-2',
    truth: 'Gauge 4 reads 0.8 % high from day 66 to day 69, until its probe head is changed.',
    onsetDay: 66,
    effect: { kind: 'gauge-offset', percent: 0.8, days: 3 },
    chart: 'level',
    expectedWithinSubgroups: 4,
  },
  {
    streamSlug: 'n-epi-on-p',
    truth:
      'On day 73 one wafer of another recipe, with 30 % more phosphorus, is measured as a monitor of Reactor 1.',
    onsetDay: 73,
    effect: { kind: 'misrouted-wafer', dopingPercent: 30 },
    chart: 'level',
    expectedWithinSubgroups: 1,
  },
];
