/** Points from one checkpoint to the next. */
export const CHECKPOINT_EVERY = 256;

/** A replay: `after[i]` is the memory after point `from` + i, and all checkpoints that now hold. */
export interface Replay<Memory> {
  from: number;
  after: Memory[];
  checkpoints: Memory[];
}

/**
 * A chart with memory judged again from where a stream changed, at a cost that does not grow with the points before:
 * `checkpoints[j]` is the memory before point `CHECKPOINT_EVERY`·j, and the replay runs from the last one at or before
 * `changed`, the first point that is new, moved or gone. Checkpoints after it are made anew; those before are kept.
 * The result is that of a replay from the very beginning, whatever the order of arrival. `points` reaches back to the
 * checkpoint only where the caller has no more: `first` is the place of its first entry in the stream.
 *
 * Throws `RangeError` when `points` does not reach back to the checkpoint, or `changed` is no place in the stream.
 */
export function replayed<Memory, Point>(
  next: (memory: Memory, point: Point) => Memory,
  begin: Memory,
  points: readonly Point[],
  checkpoints: readonly Memory[],
  changed: number,
  first = 0,
): Replay<Memory> {
  const end = first + points.length;
  if (!Number.isInteger(changed) || changed < 0 || changed > end)
    throw new RangeError(`no point ${changed} of ${end}`);
  const kept = Math.min(Math.floor(changed / CHECKPOINT_EVERY), Math.max(0, checkpoints.length - 1));
  const from = kept * CHECKPOINT_EVERY;
  if (from < first) throw new RangeError(`the points begin at ${first}, the checkpoint at ${from}`);
  let memory = checkpoints[kept] ?? begin;
  const held = checkpoints.slice(0, kept);
  const after: Memory[] = [];
  for (let place = from; place <= end; place++) {
    if (place % CHECKPOINT_EVERY === 0) held.push(memory);
    const point = points[place - first];
    if (place === end || point === undefined) break;
    memory = next(memory, point);
    after.push(memory);
  }
  return { from, after, checkpoints: held };
}
