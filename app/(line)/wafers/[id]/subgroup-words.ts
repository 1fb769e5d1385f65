import type { WaferRecord } from '@/lib/maps/wafer-record';
import type { Stream } from '@/lib/streams/types';

/** What became of the wafer's point on the charts, in a sentence. */
export function subgroupWords({ subgroup, history }: WaferRecord, stream: Stream): string {
  const point = stream.subgroup === 'wafer' ? 'Its point' : `The point of its ${stream.subgroup}`;
  if (subgroup.state === 'not-judged')
    return stream.subgroup === 'wafer'
      ? `${point} is not charted.`
      : `${point} is not charted: no wafer of it was judged.`;
  if (subgroup.state === 'open') {
    return `${point} is not complete yet, ${subgroup.wafers} of ${stream.subgroupSize} wafers: no rule is looked at until it is.`;
  }
  if (subgroup.limitRevisionId === null) return `${point} is charted; it came before the stream had limits.`;
  if (history) return `${point} was recorded as history: it is charted and opens no case.`;
  return subgroup.completions.length === 0
    ? `${point} completes no rule.`
    : `${point} completes or carries on:`;
}
