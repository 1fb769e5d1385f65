import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { positiveInverse } from '@/lib/wafer/positive-inverse';

const size = 5;
const numbers = (length: number) =>
  fc.array(fc.double({ min: -3, max: 3, noNaN: true }), { minLength: length, maxLength: length });

/** AᵀA + I of any A: positive definite. */
function positive(a: readonly number[]): Float64Array {
  return Float64Array.from({ length: size * size }, (_, at) => {
    const [i, j] = [Math.floor(at / size), at % size];
    let sum = i === j ? 1 : 0;
    for (let k = 0; k < size; k++) sum += a[k * size + i]! * a[k * size + j]!;
    return sum;
  });
}

const times = (matrix: Float64Array, x: Float64Array) =>
  Float64Array.from({ length: size }, (_, i) =>
    x.reduce((sum, value, j) => sum + matrix[i * size + j]! * value, 0),
  );

describe('positiveInverse', () => {
  it('undoes the matrix', () => {
    fc.assert(
      fc.property(numbers(size * size), numbers(size), (a, b) => {
        const matrix = positive(a);
        const right = Float64Array.from(b);
        const x = times(positiveInverse(matrix, size)!, right);
        times(matrix, x).forEach((value, i) => expect(value).toBeCloseTo(right[i]!, 8));
      }),
      { seed: 31, numRuns: 50 },
    );
  });

  it('is undefined where the matrix is not positive definite', () => {
    expect(positiveInverse(Float64Array.of(4), 1)![0]).toBeCloseTo(0.25, 12);
    expect(positiveInverse(Float64Array.of(0), 1)).toBeNull();
    expect(() => positiveInverse(Float64Array.of(1, 2), 2)).toThrow(RangeError);
  });
});
