import { expectedValue } from '@/lib/physics/expected-value';
import { missingForExpected } from '@/lib/physics/missing-for-expected';
import { limitAge } from '@/lib/control/limit-age';
import { formatReading } from '@/lib/format';
import type { LimitsInForce } from '@/lib/limits/data';
import { inForce } from '@/lib/streams/in-force';
import type { StreamSettings } from '@/lib/streams/types';
import { specificationWords, targetWords } from './words';

export interface SetupRow {
  slug: string;
  name: string;
  place: string;
  plan: string;
  target: string;
  expected: string;
  specification: string;
  limits: string;
  retired: boolean;
}

/** One row a stream: what it aims at, what is accepted and what judges it now; those out of use last. */
export function setupRows(
  settings: readonly StreamSettings[],
  limits: readonly LimitsInForce[],
  now: Date,
): SetupRow[] {
  const limitsOf = new Map(limits.map((one) => [one.streamId, one]));
  return settings
    .map(({ stream, targets, specifications }) => {
      const target = inForce(targets, now)?.target ?? null;
      const specification = inForce(specifications, now)?.specification ?? null;
      return {
        slug: stream.slug,
        name: stream.name,
        place: [stream.step, stream.tool, stream.chamber].filter((part) => part !== '').join(' · '),
        plan: stream.plan.name,
        target: target === null ? 'none' : targetWords(target),
        expected: target === null ? '—' : expectedWords(target),
        specification:
          specification === null
            ? 'nothing is specified'
            : specificationWords(specification, stream.quantity),
        limits: limitWords(limitsOf.get(stream.id)),
        retired: stream.retiredAt !== null,
      };
    })
    .sort((a, b) => Number(a.retired) - Number(b.retired) || a.name.localeCompare(b.name, 'en'));
}

function expectedWords(target: Parameters<typeof expectedValue>[0]): string {
  const ingotFraction = target.alongCrystal ? 0 : null;
  if (missingForExpected(target, { ingotFraction }) !== null) return 'by each wafer’s thickness';
  try {
    const words = formatReading(target.quantity, expectedValue(target, { ingotFraction }).value);
    return target.alongCrystal ? `${words} at the seed end` : words;
  } catch (error) {
    if (error instanceof RangeError) return '—';
    throw error;
  }
}

function limitWords(limits: LimitsInForce | undefined): string {
  if (limits === undefined) return 'none yet';
  const age = limits.state === 'provisional' ? 'provisional' : limitAge(limits.subgroups);
  return `revision ${limits.revision}, ${age}, from ${limits.subgroups} subgroups`;
}
