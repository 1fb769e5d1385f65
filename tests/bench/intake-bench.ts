import { mkdtempSync, rmSync, statSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { programActor } from '@/lib/access/local-actor';
import { getPool } from '@/lib/database/client';
import { fileBytes } from '@/lib/maps/file-bytes';
import { intakeFile } from '@/lib/maps/intake-file';
import { benchStreams } from '@/seed/bench-streams';
import { createDemoStreams } from '@/seed/seed-demo';
import type { Figure } from './figure';
import { copyText, keyedCopySeconds } from './keyed-copy';
import { middle } from './figure';
import { peakMemoryMb } from './peak-memory';
import type { ScratchServer } from './scratch-database';
import { writeWaferFile } from './wafer-file';

const WAFERS = 20_000;
const STREAMS = 40;

/**
 * Bulk intake by the whole path (parse, check, screen, measure, judge, store) of 20 000 wafers of 49 readings, against a
 * bare COPY of the same rows into the same keyed tables; and the peak memory of the command that takes such a file.
 */
export async function intakeBench(server: ScratchServer): Promise<Figure[]> {
  const folder = mkdtempSync(path.join(tmpdir(), 'evenohm-file-'));
  try {
    const streams = benchStreams(STREAMS);
    const file = path.join(folder, 'wafers.csv');
    await writeWaferFile(file, streams, WAFERS, new Date('2026-05-17T06:00:00Z'));
    const seconds: number[] = [];
    const bare: number[] = [];
    for (let round = 0; round < 3; round += 1) {
      await server.use();
      const actor = programActor();
      await createDemoStreams(actor, streams);
      const start = performance.now();
      const result = await intakeFile(
        actor,
        { name: 'wafers.csv', open: () => fileBytes(file) },
        { origin: 'command', history: false, sound: false, defaults: {} },
      );
      seconds.push((performance.now() - start) / 1000);
      if (result.recorded !== WAFERS)
        throw new Error(`${result.recorded} of ${WAFERS} wafers were recorded.`);
      const text = await copyText(getPool());
      for (let i = 0; i < 3; i += 1) bare.push(await keyedCopySeconds(getPool(), text));
    }
    const url = await server.use();
    await createDemoStreams(programActor(), streams);
    const peak = await peakMemoryMb(['intake', file], { DATABASE_URL: url });
    const whole = middle(seconds);
    const copy = middle(bare);
    return [
      { name: `file of ${WAFERS} wafers`, value: statSync(file).size / 1e6, unit: 'MB' },
      { name: 'bare keyed COPY of the same rows', value: WAFERS / copy, unit: 'wafers/s' },
      { name: 'file taken through everything', value: WAFERS / whole, unit: 'wafers/s' },
      { name: 'intake against bare keyed COPY', value: copy / whole, unit: '', atLeast: 0.15 },
      ...(peak === null
        ? []
        : [{ name: 'peak memory of the intake command', value: peak, unit: 'MB', atMost: 300 }]),
    ];
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}
