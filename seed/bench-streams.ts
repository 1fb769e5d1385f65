import type { DemoStream } from './demo-stream';
import { IMPLANT_STREAMS } from './implant-streams';

/** `count` streams of 49 sites for measuring speed, alike but for their names. */
export function benchStreams(count: number): DemoStream[] {
  const [pattern] = IMPLANT_STREAMS;
  if (pattern === undefined) throw new RangeError('There is no implant stream to measure with.');
  return Array.from({ length: count }, (_, i) => {
    const number = String(i + 1).padStart(3, '0');
    return { ...pattern, slug: `bench-${number}`, name: `Bench ${number}`, quiet: true };
  });
}
