import { UsageError } from '@/lib/command/verb';
import { DOPANTS } from '@/lib/physics/dopant';
import type { Target } from '@/lib/physics/target';
import { bulkQuestion, type BulkQuestion } from './expect-bulk-question';
import { expectFlags, number, refuse, word, type Flags } from './expect-flags';
import { epiTarget, layerTarget } from './expect-layer-target';

/** What goes with every question: the wafer's temperature, what is known of the measurement, and what it measured. */
export interface Circumstances {
  temperatureC: number;
  temperatureUncertaintyC: number | null;
  thicknessUncertaintyPercent: number | null;
  /** What was measured, of which an explanation is asked. */
  measured: number | null;
}

/** What the flags of `expect` ask. */
export type ExpectQuestion = { json: boolean; budget: boolean; circumstances: Circumstances } & (
  { bulk: BulkQuestion } | { layer: Target }
);

const PROFILES = ['box', 'gaussian', 'erfc', 'implant', 'pairs'] as const;

async function subject(flags: Flags): Promise<{ bulk: BulkQuestion } | { layer: Target }> {
  const dopant = word(flags, 'dopant', DOPANTS);
  if (dopant === null) throw new UsageError(`--dopant is needed: ${DOPANTS.join(', ')}`);
  const named = word(flags, 'profile', PROFILES);
  const profile = named ?? (flags['range-um'] !== undefined ? 'implant' : null);
  if (profile !== null) return { layer: await layerTarget(flags, dopant, profile) };
  refuse(
    flags,
    [
      'peak-density',
      'dose-per-cm2',
      'length-um',
      'straggle-um',
      'drive-in-c',
      'drive-in-min',
      'pairs-file',
      'background-dopant',
      'background-density',
    ],
    'goes with --profile box, gaussian, erfc, implant or pairs',
  );
  if (flags['thickness-um'] !== undefined) return { layer: epiTarget(flags, dopant) };
  refuse(flags, ['substrate-dopant', 'substrate-density', 'method'], 'goes with --thickness-um');
  return { bulk: bulkQuestion(flags, dopant) };
}

/** Reads the flags of `expect`; throws `UsageError` for what does not go together. */
export async function expectQuestion(args: string[]): Promise<ExpectQuestion> {
  const flags = expectFlags(args);
  const conversion = word(flags, 'conversion', ['23c', '300k']);
  return {
    json: flags.json === true,
    budget: flags.uncertainty === true,
    ...(await subject(flags)),
    circumstances: {
      temperatureC: number(flags, 'temperature-c') ?? (conversion === '300k' ? 26.85 : 23),
      temperatureUncertaintyC: number(flags, 'temperature-uncertainty-c'),
      thicknessUncertaintyPercent: number(flags, 'thickness-uncertainty-percent'),
      measured: number(flags, 'measured'),
    },
  };
}
