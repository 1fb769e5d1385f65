import { middle } from './figure';

/** Processor time of one call in µs, the middle of nine runs of `count` calls after one to warm up. */
export function microseconds(count: number, call: (i: number) => unknown): number {
  const run = (): number => {
    const before = process.cpuUsage();
    for (let i = 0; i < count; i++) call(i);
    const { user, system } = process.cpuUsage(before);
    return (user + system) / count;
  };
  run();
  return middle(Array.from({ length: 9 }, run));
}
