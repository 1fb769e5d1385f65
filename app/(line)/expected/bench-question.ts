import type { ExpectedWafer, Target } from '@/lib/physics/target';
import { KINDS } from '@/lib/streams/schema';
import { targetFields } from '@/lib/streams/target-fields';
import { typedTarget } from '@/lib/streams/typed-target';
import type { Stream } from '@/lib/streams/types';
import { typedNumberOrNone } from '@/lib/typed';

/** The words of the bench: those of a target, and what the bench adds. They make its address. */
export type BenchWords = Readonly<Record<string, string>>;

const OWN = ['kind', 'quantity', 'at', 'fraction', 'measured', 'knownC', 'knownPercent'] as const;
const NAMES: readonly string[] = [...OWN, ...Object.keys(targetFields.shape)];
const MOST = 200;
const MOST_PROFILE = 20_000;
/** Far enough for every silicon line: the models of temperature end there. */
export const TEMPERATURES_C = { lowest: -23, highest: 66 } as const;

/** What stands on the bench before anyone asked. */
const FIRST: BenchWords = { kind: 'substrate', dopant: 'boron', given: 'density', densityPerCm3: '1e15' };

/** The words of an address, known ones alone; those of the first question where there are none. */
export function benchWords(asked: Readonly<Record<string, string | string[] | undefined>>): BenchWords {
  const words: Record<string, string> = {};
  for (const name of NAMES) {
    const value = asked[name];
    const word = Array.isArray(value) ? value[0] : value;
    if (word === undefined || word === '') continue;
    words[name] = word.slice(0, name === 'pairs' ? MOST_PROFILE : MOST);
  }
  return Object.keys(words).length === 0 ? FIRST : words;
}

/** The address of the words, without what is empty. */
export function benchAddress(words: BenchWords): string {
  const query = new URLSearchParams(
    NAMES.flatMap((name) => (words[name] ? [[name, words[name]] as [string, string]] : [])),
  );
  return `/expected?${query.toString()}`;
}

export interface BenchQuestion {
  kind: Stream['kind'];
  quantity: Target['quantity'];
  /** Of the wafer, for the curves and the value there; the expected value itself is at 23 °C. */
  temperatureC: number;
  /** Null while the words make no target; then `fault` says why. */
  target: Target | null;
  fault: string | null;
  wafer: ExpectedWafer;
  measured: number | null;
  /** Standard uncertainties of the wafer's temperature in °C, and of its thickness in percent. */
  knownC: number | null;
  knownPercent: number | null;
}

/** A layer whose thickness each wafer brings is asked about at this one. */
const THICK_UM = 10;

/** What the words of the bench ask. A number that is none counts as not given. */
export function benchQuestion(words: BenchWords): BenchQuestion {
  const kind = KINDS.find((one) => one === words['kind']) ?? 'substrate';
  const quantity = quantityOf(kind, words['quantity']);
  const number = (name: string, holds: (value: number) => boolean) =>
    typedNumberOrNone({ wish: '', holds }).catch(null).parse(words[name]);
  const profile = kind === 'implant' ? 'implant' : kind === 'diffusion' ? 'erfc' : 'uniform';
  const parsed = typedTarget(quantity).safeParse({ profile, ...words });
  const target = parsed.success ? parsed.data : null;
  const isOwn = target?.profile === 'uniform' && target.lengthUm === null && quantity === 'sheet_resistance';
  const { lowest, highest } = TEMPERATURES_C;
  return {
    kind,
    quantity,
    temperatureC: number('at', (value) => value >= lowest && value <= highest) ?? 23,
    target,
    fault: parsed.success ? null : (parsed.error.issues[0]?.message ?? ''),
    wafer: {
      ...(target?.alongCrystal && { ingotFraction: number('fraction', (g) => g >= 0 && g < 1) ?? 0 }),
      ...(isOwn && { layerThicknessUm: THICK_UM }),
    },
    measured: number('measured', (value) => value > 0),
    knownC: number('knownC', (value) => value >= 0 && value <= 50),
    knownPercent: number('knownPercent', (value) => value >= 0 && value <= 100),
  };
}

function quantityOf(kind: Stream['kind'], word: string | undefined): Target['quantity'] {
  if (kind === 'substrate' || kind === 'crystal') return 'resistivity';
  return kind === 'epi' && word === 'resistivity' ? 'resistivity' : 'sheet_resistance';
}
