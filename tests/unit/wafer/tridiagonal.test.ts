import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { mirrorOf, turned } from '@/lib/wafer/mirror';
import { tridiagonalised } from '@/lib/wafer/tridiagonalised';
import { tridiagonalSolve } from '@/lib/wafer/tridiagonal-solve';

const size = 6;
const numbers = (length: number) =>
  fc.array(fc.double({ min: -3, max: 3, noNaN: true }), { minLength: length, maxLength: length });

/** AᵀA + I of any A: symmetric, positive definite. */
function positive(a: readonly number[]): Float64Array[] {
  return Array.from({ length: size }, (_, i) =>
    Float64Array.from({ length: size }, (__, j) => {
      let sum = i === j ? 1 : 0;
      for (let k = 0; k < size; k++) sum += a[k * size + i]! * a[k * size + j]!;
      return sum;
    }),
  );
}

describe('a mirror', () => {
  it('turns its vector onto the first axis and keeps lengths', () => {
    const vector = Float64Array.of(-3, 0, 4);
    const mirror = mirrorOf(vector, 0)!;
    const column = Float64Array.of(7, -3, 0, 4);
    turned([mirror], column);
    expect([...column].map((value) => Number(value.toFixed(12)))).toEqual([7, 5, 0, 0]);
    const other = Float64Array.of(1, 2, 3);
    turned([mirror], other);
    expect(Math.hypot(...other)).toBeCloseTo(Math.hypot(1, 2, 3), 12);
    expect(mirrorOf(new Float64Array(3), 0)).toBeNull();
  });
});

describe('a tridiagonalised matrix', () => {
  it('has nothing but its diagonal and the numbers beside it, and solves what the matrix solves', () => {
    fc.assert(
      fc.property(
        numbers(size * size),
        numbers(size),
        fc.double({ min: 0, max: 2, noNaN: true }),
        (a, b, ridge) => {
          const [matrix, turnedOne] = [positive(a), positive(a)];
          const mirrors = tridiagonalised(turnedOne);
          turnedOne.forEach((row, i) =>
            row.forEach((value, j) => {
              if (Math.abs(i - j) > 1) expect(value).toBeCloseTo(0, 8);
            }),
          );
          const right = Float64Array.from(b);
          turned(mirrors, right);
          const diagonal = Float64Array.from(turnedOne, (row, i) => row[i]!);
          const beside = Float64Array.from({ length: size - 1 }, (_, i) => turnedOne[i]![i + 1]!);
          const x = tridiagonalSolve(diagonal, beside, ridge, right)!;
          turned(mirrors.toReversed(), x);
          matrix.forEach((row, i) => {
            const sum = row.reduce((total, value, j) => total + value * x[j]!, ridge * x[i]!);
            expect(sum).toBeCloseTo(b[i]!, 7);
          });
        },
      ),
      { seed: 32, numRuns: 50 },
    );
  });

  it('stays as it is where it was tridiagonal before', () => {
    const matrix = [Float64Array.of(2, 0, 0), Float64Array.of(0, 3, 1), Float64Array.of(0, 1, 4)];
    expect(tridiagonalised(matrix)).toEqual([]);
    expect(matrix[1]).toEqual(Float64Array.of(0, 3, 1));
  });
});

describe('tridiagonalSolve', () => {
  it('adds the ridge, and is undefined where the sum is not positive definite', () => {
    const one = (diagonal: number, ridge: number) =>
      tridiagonalSolve(Float64Array.of(diagonal), Float64Array.of(), ridge, Float64Array.of(8));
    expect(one(3, 1)![0]).toBeCloseTo(2, 12);
    expect(one(0, 0)).toBeNull();
    expect(tridiagonalSolve(Float64Array.of(1, 1), Float64Array.of(2), 0, Float64Array.of(1, 1))).toBeNull();
    expect(() =>
      tridiagonalSolve(Float64Array.of(1, 2), Float64Array.of(), 0, Float64Array.of(1, 1)),
    ).toThrow(RangeError);
    expect(tridiagonalSolve(Float64Array.of(), Float64Array.of(), 1, Float64Array.of())).toHaveLength(0);
  });
});
