import { listStreamEvents } from '@/lib/streams/data';
import { streamCsv } from '../../../stream-csv';

const COLUMNS = ['at', 'kind', 'restart', 'text', 'recorded_by', 'recorded_at'];

/** The adjustments and maintenance of a stream as a file. */
export const GET = streamCsv('events', COLUMNS, async (actor, { stream }) => {
  const events = await listStreamEvents(actor, stream.id);
  return events.map((one) => [one.at, one.kind, one.restart, one.text, one.actor, one.recordedAt]);
});
