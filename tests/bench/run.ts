import { auditBench } from './audit-bench';
import { controlBench } from './control-bench';
import { coverageBench } from './coverage-bench';
import { figureLine, holds, type Figure } from './figure';
import { intakeBench } from './intake-bench';
import { oneWaferBench } from './one-wafer-bench';
import { pageBench } from './page-bench';
import { physicsBench } from './physics-bench';
import { statisticsBench } from './statistics-bench';
import { scratchServer, type ScratchServer } from './scratch-database';

/** Starts the scratch server when a part first asks for it. */
const scratch: { server?: Promise<ScratchServer> } = {};
const server = (): Promise<ScratchServer> => (scratch.server ??= scratchServer());

/**
 * `npm run bench [part…]`: every figure is a ratio of two things measured in the same run, absolutes beside; of physics
 * and control processor time.
 */
const parts: Record<string, () => Promise<Figure[]> | Figure[]> = {
  physics: physicsBench,
  statistics: statisticsBench,
  coverage: coverageBench,
  control: controlBench,
  wafer: async () => oneWaferBench(await server()),
  audit: async () => auditBench(await server()),
  intake: async () => intakeBench(await server()),
  pages: async () => pageBench(await server()),
};

const wanted = process.argv.slice(2);
const unknown = wanted.find((part) => !(part in parts));
if (unknown !== undefined) {
  console.log(`There is no part "${unknown}"; there are ${Object.keys(parts).join(', ')}.`);
  process.exit(2);
}
const missed: Figure[] = [];
try {
  for (const [name, part] of Object.entries(parts)) {
    if (wanted.length > 0 && !wanted.includes(name)) continue;
    for (const figure of await part()) {
      console.log(figureLine(figure));
      if (!holds(figure)) missed.push(figure);
    }
  }
} finally {
  await (await scratch.server)?.stop();
}
process.exitCode = missed.length > 0 ? 1 : 0;
