/** Something that was done on the line, as its log says it. */
export interface DemoEvent {
  streamSlug: string;
  kind: 'maintenance' | 'adjustment';
  at: Date;
  text: string;
  /** Rules start afresh here: the step is expected not to be the same as before. */
  restart: boolean;
}

const PLANNED: readonly (Omit<DemoEvent, 'at'> & { day: number })[] = [
  { streamSlug: 'n-epi-on-p', kind: 'maintenance', day: 38.1, text: 'Susceptor changed.', restart: false },
  { streamSlug: 'p-epi-on-n', kind: 'maintenance', day: 58, text: 'Injector cleaned.', restart: false },
  {
    streamSlug: 'phosphorus-furnace-c',
    kind: 'maintenance',
    day: 30.2,
    text: 'Boat changed.',
    restart: false,
  },
  {
    streamSlug: 'phosphorus-furnace-a',
    kind: 'maintenance',
    day: 61.4,
    text: 'Thermocouples checked.',
    restart: false,
  },
  { streamSlug: 'boron-implant-1', kind: 'maintenance', day: 44.5, text: 'Source changed.', restart: false },
  {
    streamSlug: 'boron-implant-2',
    kind: 'maintenance',
    day: 55.3,
    text: 'Source changed, dose checked.',
    restart: true,
  },
  {
    streamSlug: 'arsenic-implant-2',
    kind: 'maintenance',
    day: 69,
    text: 'Gauge 4: probe head changed.',
    restart: false,
  },
  {
    streamSlug: 'n-epi-on-p-300',
    kind: 'maintenance',
    day: 47.6,
    text: 'Lamp zones balanced.',
    restart: false,
  },
  {
    streamSlug: 'boron-crystal',
    kind: 'maintenance',
    day: 40.8,
    text: 'Hot zone of the puller renewed.',
    restart: true,
  },
];

/**
 * The log of the line's last `days` days up to `endAt`, in order of time. Apart from the mishaps none of these changes
 * what the step makes: a log is full of events that do not show on a chart.
 */
export function lineEvents(days: number, endAt: Date): DemoEvent[] {
  return PLANNED.filter(({ day }) => day < days)
    .map(({ day, ...event }) => ({ ...event, at: new Date(endAt.getTime() - (days - day) * 86_400_000) }))
    .sort((a, b) => a.at.getTime() - b.at.getTime());
}
