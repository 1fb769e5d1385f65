/** An average run length by simulation, and the standard error of it. */
export interface SimulatedRunLength {
  averageRunLength: number;
  standardError: number;
}

/**
 * The average run length of whatever has no exact one: trends and alternations, values that follow each other,
 * limits that widen from the start. `newRun` begins a run and returns what makes its next point and says whether it
 * signals; chance comes from the seeded source it holds, so that the same seed gives the same figure.
 *
 * Throws `RangeError` unless there are at least two runs, and when a run is longer than `longest` points, for which
 * more patience would be needed.
 */
export function simulatedRunLength(
  newRun: () => () => boolean,
  runs: number,
  longest = 1_000_000,
): SimulatedRunLength {
  if (!Number.isInteger(runs) || runs < 2) throw new RangeError(`two runs or more, not ${runs}`);
  let sum = 0;
  let squares = 0;
  for (let run = 0; run < runs; run++) {
    const signals = newRun();
    let length = 1;
    while (!signals()) {
      if (++length > longest) throw new RangeError(`no signal in ${longest} points`);
    }
    sum += length;
    squares += length * length;
  }
  const averageRunLength = sum / runs;
  const variance = (squares - runs * averageRunLength * averageRunLength) / (runs - 1);
  return { averageRunLength, standardError: Math.sqrt(Math.max(0, variance) / runs) };
}
