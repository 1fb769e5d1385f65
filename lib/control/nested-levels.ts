import { deviations } from '@/lib/stats/deviations';
import { meanDeviation } from '@/lib/stats/mean';

/** One value and where it belongs, from the outermost group to the innermost: lot, wafer, site. */
export interface NestedValue {
  labels: readonly string[];
  value: number;
}

/** One group: the place of the group around it in the level outside, its values' number and mean (from the origin). */
export interface NestedGroup {
  parent: number;
  count: number;
  mean: number;
}

/** Values as levels of groups within groups, and last the single values themselves. */
export interface NestedLevels {
  names: string[];
  groups: NestedGroup[][];
  /** The groups that single values are members of, the whole where there are none, with their inner sums of squares. */
  innermost: { group: NestedGroup; squares: number }[];
  origin: number;
}

/**
 * Values sorted into groups within groups. A group is known by its label and those around it: wafer 1 of lot A is not
 * wafer 1 of lot B. The last level holds each value alone; it is named `within`, or after the innermost grouping where
 * that already has one value in each group.
 *
 * Throws `RangeError` with fewer than two values, no grouping, labels that do not fit the names, or a value that is not
 * finite.
 */
export function nestedLevels(rows: readonly NestedValue[], names: readonly string[]): NestedLevels {
  if (rows.length < 2) throw new RangeError(`components need at least two values, not ${rows.length}`);
  if (names.length === 0 || rows.some(({ labels }) => labels.length !== names.length)) {
    throw new RangeError('each value needs one label for each grouping');
  }
  const { origin, values } = deviations(rows.map(({ value }) => value));
  const centre = meanDeviation(values);
  const singles = Array.from(values, (value) => ({ parent: 0, count: 1, mean: value - centre }));
  const groups: NestedGroup[][] = [];
  let around = rows.map(() => 0);
  names.forEach((_, depth) => {
    const known = new Map<string, number>();
    const level: NestedGroup[] = [];
    around = rows.map(({ labels }, i) => {
      const parent = around[i] ?? 0;
      const key = `${parent} ${labels[depth] ?? ''}`;
      const place = known.get(key) ?? level.push({ parent, count: 0, mean: 0 }) - 1;
      known.set(key, place);
      const group = level[place];
      if (group) {
        group.count++;
        group.mean += singles[i]?.mean ?? 0;
      }
      return place;
    });
    for (const group of level) group.mean /= group.count;
    groups.push(level);
  });
  around.forEach((parent, i) => {
    const single = singles[i];
    if (single) single.parent = parent;
  });
  const alone = groups.at(-1)?.length === rows.length;
  if (!alone) groups.push(singles);
  const holders = groups.at(-2) ?? [{ parent: 0, count: rows.length, mean: 0 }];
  const innermost = holders.map((group) => ({ group, squares: 0 }));
  for (const { parent, mean } of groups.at(-1) ?? []) {
    const holder = innermost[parent];
    if (holder) holder.squares += (mean - holder.group.mean) ** 2;
  }
  return { names: alone ? [...names] : [...names, 'within'], groups, innermost, origin: origin + centre };
}
