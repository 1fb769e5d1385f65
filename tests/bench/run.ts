import { figureLine, holds, type Figure } from './figure';
import { intakeBench } from './intake-bench';
import { oneWaferBench } from './one-wafer-bench';
import { pageBench } from './page-bench';
import { scratchServer, type ScratchServer } from './scratch-database';

/** `npm run bench [part…]`: every figure is a ratio of two things measured in the same run; absolutes stand beside. */
const parts: Record<string, (server: ScratchServer) => Promise<Figure[]>> = {
  wafer: oneWaferBench,
  intake: intakeBench,
  pages: pageBench,
};

const wanted = process.argv.slice(2);
const unknown = wanted.find((part) => !(part in parts));
if (unknown !== undefined) {
  console.log(`There is no part "${unknown}"; there are ${Object.keys(parts).join(', ')}.`);
  process.exit(2);
}
const server = await scratchServer();
const missed: Figure[] = [];
try {
  for (const [name, part] of Object.entries(parts)) {
    if (wanted.length > 0 && !wanted.includes(name)) continue;
    for (const figure of await part(server)) {
      console.log(figureLine(figure));
      if (!holds(figure)) missed.push(figure);
    }
  }
} finally {
  await server.stop();
}
process.exitCode = missed.length > 0 ? 1 : 0;
