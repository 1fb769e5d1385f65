import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { add, emptyLine, LineStore, outcome, trim } from './line-store';
import { batches, streams, type Stream } from './streams';

const sizes = fc.array(fc.integer({ min: 1, max: 9 }), { minLength: 1, maxLength: 4 });
/** How far each wafer is out of its turn: most a little, some by the length of the stream. */
const delays = fc.array(fc.oneof(fc.nat(4), fc.nat(20), fc.nat(200)), {
  minLength: 1,
  maxLength: 40,
});

function atOnce(stream: Stream) {
  const line = emptyLine(stream);
  add(line, stream.additions);
  return outcome(line);
}

function disordered(stream: Stream, delay: readonly number[]) {
  return stream.additions
    .map((addition, i) => ({ addition, turn: i + (delay[i % delay.length] ?? 0) }))
    .sort((a, b) => a.turn - b.turn)
    .map(({ addition }) => addition);
}

describe('a stream judged as its wafers arrive ends as if judged at once', () => {
  it('in any order and in any batches, on one line held whole, given its limit revisions', () => {
    const shape = { minLength: 1, maxLength: 120, revisions: [1, 2], tangled: true };
    fc.assert(
      fc.property(streams(shape), delays, sizes, (stream, delay, size) => {
        const line = emptyLine(stream);
        for (const batch of batches(disordered(stream, delay), size)) add(line, batch);
        expect(outcome(line)).toEqual(atOnce(stream));
      }),
      { numRuns: 50 },
    );
  });

  it('in order, when the first baseline proposes its limits itself', () => {
    const shape = { minLength: 1, maxLength: 140, revisions: [0], tangled: false };
    fc.assert(
      fc.property(streams(shape), sizes, (stream, size) => {
        const line = emptyLine(stream);
        for (const batch of batches(stream.additions, size)) add(line, batch);
        expect(outcome(line)).toEqual(atOnce(stream));
      }),
      { numRuns: 50 },
    );
  });

  it('in order, on a line that forgets all but its end, and writes all that changed', () => {
    const shape = { minLength: 60, maxLength: 400, revisions: [0, 1, 2], tangled: false };
    fc.assert(
      fc.property(streams(shape), sizes, (stream, size) => {
        const expected = atOnce(stream);
        const store = new LineStore({ ...stream, limits: [...stream.limits] });
        let line = emptyLine(store.setting);
        for (const batch of batches(stream.additions, size)) {
          line = store.record(line, batch);
          trim(line);
        }
        expect(outcome(store.load(-Infinity))).toEqual(expected);
        expect(store.wholeLoads).toBe(0);
      }),
      { numRuns: 30 },
    );
  });

  it('out of order, on lines loaded afresh from the earliest wafer on', () => {
    const shape = { minLength: 60, maxLength: 180, revisions: [1, 2], tangled: true };
    fc.assert(
      fc.property(streams(shape), delays, sizes, (stream, delay, size) => {
        const expected = atOnce(stream);
        const store = new LineStore({ ...stream, limits: [...stream.limits] });
        for (const batch of batches(disordered(stream, delay), size)) {
          const keys = new Set(batch.map(({ key }) => key));
          const joined = [...store.points.values()].filter(({ key }) => keys.has(key));
          const from = Math.min(...batch.map(({ at }) => at), ...joined.map(({ at }) => at));
          store.record(store.load(from), batch);
        }
        expect(outcome(store.load(-Infinity))).toEqual(expected);
      }),
      { numRuns: 20 },
    );
  });
});
