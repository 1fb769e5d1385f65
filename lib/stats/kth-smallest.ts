/**
 * The value with k others below it, by parting the list around a guess (C. A. R. Hoare, Comm. ACM 4, 321 (1961)): the
 * half million slopes of a thousand wafers need not be sorted for their median. Rearranges `values`.
 *
 * Throws `RangeError` unless k is a place in the list, counted from 0.
 *
 * @example kthSmallest(Float64Array.of(3, 1, 2), 1) // 2
 */
export function kthSmallest(values: Float64Array, k: number): number {
  if (!Number.isInteger(k) || k < 0 || k >= values.length) throw new RangeError(`no place ${k} in the list`);
  let low = 0;
  let high = values.length - 1;
  while (low < high) {
    const guess = values[(low + high) >>> 1] ?? 0;
    let i = low;
    let j = high;
    while (i <= j) {
      while ((values[i] ?? 0) < guess) i++;
      while ((values[j] ?? 0) > guess) j--;
      if (i > j) break;
      const kept = values[i] ?? 0;
      values[i++] = values[j] ?? 0;
      values[j--] = kept;
    }
    if (k <= j) high = j;
    else if (k >= i) low = i;
    else break;
  }
  return values[k] ?? 0;
}
