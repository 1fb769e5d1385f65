import type { Target } from '@/lib/physics/target';
import type { SpanWafer } from './span-wafers';
import { type TargetModel, targetModel } from './target-model';

/** What physics expected of the wafers of one subgroup. */
export interface PointExpected {
  targetId: string;
  /** In the unit of the quantity; null where its wafers differ in what is expected of them. */
  value: number | null;
  uncertaintyPercent: number;
  /** Null where the target as it stands has no model for these wafers. */
  model: TargetModel | null;
}

/** The model of a target revision, along a crystal at a place. */
export type ModelOf = (targetId: string, ingotFraction: number | null) => TargetModel | null;

/** The models of a stream's targets, each asked for once where it is the same for all wafers. */
export function modelsOf(revisions: readonly { id: string; target: Target }[]): ModelOf {
  const targetOf = new Map(revisions.map(({ id, target }) => [id, target]));
  const found = new Map<string, TargetModel | null>();
  return (targetId, ingotFraction) => {
    const target = targetOf.get(targetId);
    if (target === undefined) return null;
    if (target.alongCrystal) return targetModel(target, ingotFraction);
    const known = found.get(targetId);
    if (known !== undefined) return known;
    const model = targetModel(target, null);
    found.set(targetId, model);
    return model;
  };
}

/**
 * What was expected of a subgroup when its wafers were recorded, and the model behind it, at their mean place along
 * the crystal. Null without an expected value.
 */
export function pointExpected(wafers: readonly SpanWafer[], modelOf: ModelOf): PointExpected | null {
  const charted = wafers.filter((wafer) => wafer.level !== null && wafer.expected !== null);
  const last = charted.at(-1);
  if (last?.targetId == null || last.expectedUncertaintyPercent === null) return null;
  const fractions = charted.map((wafer) => wafer.ingotFraction).filter((fraction) => fraction !== null);
  const fraction =
    fractions.length === 0 ? null : fractions.reduce((sum, one) => sum + one, 0) / fractions.length;
  return {
    targetId: last.targetId,
    value: charted.every((wafer) => wafer.expected === last.expected) ? last.expected : null,
    uncertaintyPercent: last.expectedUncertaintyPercent,
    model: modelOf(last.targetId, fraction),
  };
}
