import { CRYSTAL_STREAMS } from './crystal-streams';
import type { DemoStream } from './demo-stream';
import { EPI_STREAMS } from './epi-streams';
import { FURNACE_STREAMS } from './furnace-streams';
import { IMPLANT_STREAMS } from './implant-streams';
import type { Mishap } from './mishap';
import { MISHAPS } from './mishaps';

/** The invented plant of the demonstration line. */
export const PLANT: {
  name: string;
  days: number;
  seed: number;
  streams: readonly DemoStream[];
  mishaps: readonly Mishap[];
} = {
  name: 'Demonstration line',
  days: 90,
  seed: 1,
  streams: [...CRYSTAL_STREAMS, ...EPI_STREAMS, ...FURNACE_STREAMS, ...IMPLANT_STREAMS],
  mishaps: MISHAPS,
};
