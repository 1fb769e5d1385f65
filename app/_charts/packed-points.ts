import type { StreamChartPoint } from './stream-chart-point';

/** A point as a row without names. */
type Row = [
  id: string,
  index: number,
  label: string,
  at: string,
  day: string,
  href: string,
  level: number | null,
  movingRange: number | null,
  within: number | null,
  between: number | null,
  completions: readonly string[] | 0,
  /** Out of specification 1, open 2, judged 4, hollow 8. */
  flags: number,
  texts: (string | null)[],
  notes: readonly string[],
];

/**
 * Points as one short text, for the way to the browser. The server's renderer walks every value and every name of what
 * a page hands to its charts, and names and digits that no screen shows are more than half of what hundreds of points
 * weigh. Figures keep eight significant digits. `unpackedPoints` is the way back.
 */
export function packedPoints(points: readonly StreamChartPoint[]): string {
  const figure = (value: number | null) => value && Number(value.toPrecision(8));
  return JSON.stringify(
    points.map((point): Row => {
      const { id, index, label, at, day, href, completions, outOfSpecification, open, judged, hollow } =
        point;
      const { level, expected, difference, dopant, movingRange, within, between, notes } = point.texts;
      const { density, onBefore } = point.texts;
      return [
        id,
        index,
        label,
        at,
        day,
        href,
        figure(point.level),
        figure(point.movingRange),
        figure(point.within),
        figure(point.between),
        completions.length === 0 ? 0 : completions,
        (outOfSpecification ? 1 : 0) + (open ? 2 : 0) + (judged ? 4 : 0) + (hollow ? 8 : 0),
        [
          level,
          point.texts.at,
          expected,
          difference,
          dopant,
          movingRange,
          within,
          between,
          density,
          onBefore,
        ],
        notes,
      ];
    }),
  );
}

/** The points that `packedPoints` made a text of. */
export function unpackedPoints(packed: string): StreamChartPoint[] {
  return (JSON.parse(packed) as Row[]).map((row) => {
    const [id, index, label, at, day, href, level, movingRange, within, between, completions, flags] = row;
    const texts = row[12];
    return {
      id,
      index,
      label,
      at,
      day,
      href,
      level,
      movingRange,
      within,
      between,
      completions: completions === 0 ? [] : completions,
      outOfSpecification: (flags & 1) !== 0,
      open: (flags & 2) !== 0,
      judged: (flags & 4) !== 0,
      hollow: (flags & 8) !== 0,
      texts: {
        level: texts[0] ?? '',
        at: texts[1] ?? '',
        expected: texts[2] ?? null,
        difference: texts[3] ?? null,
        dopant: texts[4] ?? null,
        movingRange: texts[5] ?? null,
        within: texts[6] ?? null,
        between: texts[7] ?? null,
        density: texts[8] ?? null,
        onBefore: texts[9] ?? null,
        notes: row[13],
      },
    };
  });
}
