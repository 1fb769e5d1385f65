import type { IntakeBatch } from '@/lib/maps/data';

type Counts = Pick<IntakeBatch, 'recorded' | 'repeated' | 'refused'>;

/** What became of the newest batch: a file that was sent once more brought nothing, and that is no fault. */
export function newestSentence(batch: Counts): string {
  const words = batchSentence(batch);
  return `The newest file: ${words.charAt(0).toLowerCase()}${words.slice(1)}`;
}

/** What became of a batch, in one sentence. */
export function batchSentence(batch: Counts): string {
  const { recorded, repeated, refused } = batch;
  const were = (count: number) => (count === 1 ? 'was' : 'were');
  const maps = (count: number) => `${count} wafer ${count === 1 ? 'map' : 'maps'}`;
  const parts = [
    recorded > 0 && `${maps(recorded)} ${were(recorded)} recorded`,
    repeated > 0 && `${recorded > 0 ? repeated : maps(repeated)} ${were(repeated)} on record before`,
    refused > 0 && `${recorded + repeated > 0 ? refused : maps(refused)} ${were(refused)} refused`,
  ].filter((part) => part !== false);
  if (parts.length === 0) return 'Nothing was recorded';
  return parts.length < 3 ? parts.join(', ') : `${parts[0]}, ${parts[1]}, ${parts[2]}`;
}
