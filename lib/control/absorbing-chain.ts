/** A Markov chain that ends, solved once for every question asked of it. */
export interface AbsorbingChain {
  /** Mean steps until the chain ends, from each state; the step that ends it counts. */
  steps(): Float64Array;
  /** The share of time in each state after long without ending: the left eigenvector of the kept probabilities. */
  standing(): Float64Array;
}

/**
 * An absorbing Markov chain from the probabilities of going on: row i, column j of `kept` is the chance to be in
 * state j after state i; what a row lacks to 1 ends the chain. Run lengths of control charts are such chains: the
 * mean number of steps solves (I − Q)·n = 1 (D. Brook and D. A. Evans, Biometrika 59, 539 (1972)).
 *
 * I − Q is factored without exchanging rows, which is stable because its diagonal dominates; zeros cost nothing. `standing` is found by
 * inverse iteration on the same factors; it is the distribution "conditional on no signal so far".
 *
 * Throws `RangeError` when the chain never ends from some state, so that the mean is infinite.
 */
export function absorbingChain(kept: Float64Array, size: number): AbsorbingChain {
  const factors = new Float64Array(size * size);
  for (let i = 0; i < size * size; i++) factors[i] = -(kept[i] ?? 0);
  for (let i = 0; i < size; i++) factors[i * size + i] = 1 - (kept[i * size + i] ?? 0);
  const columns = new Int32Array(size);
  for (let k = 0; k < size; k++) {
    const pivotRow = k * size;
    const pivot = factors[pivotRow + k] ?? 0;
    if (!(pivot > 1e-14)) throw new RangeError('the chain never ends: its mean length is infinite');
    let count = 0;
    for (let j = k + 1; j < size; j++) if (factors[pivotRow + j] !== 0) columns[count++] = j;
    for (let row = (k + 1) * size; row < size * size; row += size) {
      const below = factors[row + k] ?? 0;
      if (below === 0) continue;
      const factor = below / pivot;
      factors[row + k] = factor;
      for (let c = 0; c < count; c++) {
        const j = columns[c] ?? 0;
        factors[row + j] = (factors[row + j] ?? 0) - factor * (factors[pivotRow + j] ?? 0);
      }
    }
  }
  return {
    steps: () => solved(factors, size, new Float64Array(size).fill(1)),
    standing: () => {
      let share = new Float64Array(size).fill(1 / size);
      for (let round = 0; round < 200; round++) {
        const next = scaled(solvedTransposed(factors, size, share.slice()));
        const moved = next.reduce((sum, value, i) => sum + Math.abs(value - (share[i] ?? 0)), 0);
        share = next;
        if (moved < 1e-12) break;
      }
      return share;
    },
  };
}

/** x of L·U·x = b, in place. */
function solved(
  factors: Float64Array,
  size: number,
  b: Float64Array<ArrayBuffer>,
): Float64Array<ArrayBuffer> {
  for (let i = 0; i < size; i++) {
    let sum = b[i] ?? 0;
    for (let j = 0; j < i; j++) sum -= (factors[i * size + j] ?? 0) * (b[j] ?? 0);
    b[i] = sum;
  }
  for (let i = size - 1; i >= 0; i--) {
    let sum = b[i] ?? 0;
    for (let j = i + 1; j < size; j++) sum -= (factors[i * size + j] ?? 0) * (b[j] ?? 0);
    b[i] = sum / (factors[i * size + i] ?? 1);
  }
  return b;
}

/** x of xᵀ·L·U = bᵀ, in place. */
function solvedTransposed(
  factors: Float64Array,
  size: number,
  b: Float64Array<ArrayBuffer>,
): Float64Array<ArrayBuffer> {
  for (let i = 0; i < size; i++) {
    const value = (b[i] ?? 0) / (factors[i * size + i] ?? 1);
    b[i] = value;
    for (let j = i + 1; j < size; j++) b[j] = (b[j] ?? 0) - value * (factors[i * size + j] ?? 0);
  }
  for (let i = size - 1; i >= 0; i--) {
    const value = b[i] ?? 0;
    for (let j = 0; j < i; j++) b[j] = (b[j] ?? 0) - value * (factors[i * size + j] ?? 0);
  }
  return b;
}

function scaled(values: Float64Array<ArrayBuffer>): Float64Array<ArrayBuffer> {
  const total = values.reduce((sum, value) => sum + value, 0);
  return values.map((value) => value / total);
}
