import { setFlagsFromString } from 'node:v8';
import { runInNewContext } from 'node:vm';

const LARGE = 230e6;
const GROWTH = 40e6;

/**
 * Keeps a long run's memory small while `work` goes on: beyond some 230 MB resident, what earlier batches left behind is
 * collected before the heap grows for it. Node alone would let it grow, as the machine has memory to spare.
 */
export async function withSmallMemory<Result>(work: () => Promise<Result>): Promise<Result> {
  setFlagsFromString('--expose-gc');
  const collect = runInNewContext('gc') as () => void;
  let floor = 0;
  const watch = setInterval(() => {
    const { rss, heapUsed } = process.memoryUsage();
    if (rss < LARGE || heapUsed < floor + GROWTH) return;
    collect();
    floor = process.memoryUsage().heapUsed;
  }, 25);
  try {
    return await work();
  } finally {
    clearInterval(watch);
  }
}
