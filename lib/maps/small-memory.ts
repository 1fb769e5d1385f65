import { setFlagsFromString } from 'node:v8';
import { runInNewContext } from 'node:vm';

const LARGE = 230e6;
const GROWTH = 40e6;

/**
 * Keeps memory small while a file is read, however long it is: beyond some 230 MB resident, what earlier pieces of it
 * left behind is collected before the heap grows for it by more than 40 MB. Node alone would let it grow, as the machine
 * has memory to spare.
 */
export async function withSmallMemory<Result>(work: () => Promise<Result>): Promise<Result> {
  setFlagsFromString('--expose-gc');
  const collect = runInNewContext('gc') as () => void;
  let floor = process.memoryUsage().heapUsed;
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
