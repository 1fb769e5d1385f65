import { createWriteStream } from 'node:fs';
import { once } from 'node:events';
import type { DemoStream } from '@/seed/demo-stream';
import { benchWafers } from '@/seed/bench-wafers';

/** Writes a wafer-map file of `wafers` wafers over the given streams, as a gauge would send it. */
export async function writeWaferFile(
  path: string,
  streams: readonly DemoStream[],
  wafers: number,
  endAt: Date,
): Promise<void> {
  const file = createWriteStream(path);
  file.write(
    'stream,lot,run,wafer,measured_at,processed_at,gauge,temperature_c,x_mm,y_mm,sheet_resistance_ohm_sq\n',
  );
  for (const { stream, wafer } of benchWafers(streams, wafers, endAt, 1)) {
    const head = [
      stream.slug,
      wafer.lot ?? '',
      wafer.run ?? '',
      wafer.wafer,
      wafer.measuredAt.toISOString(),
      wafer.processedAt.toISOString(),
      wafer.gauge,
      wafer.temperatureC,
    ].join();
    const rows = stream.sites.map(({ xMm, yMm }, i) => `${head},${xMm},${yMm},${wafer.values[i]}\n`).join('');
    if (!file.write(rows)) await once(file, 'drain');
  }
  file.end();
  await once(file, 'close');
}
