import type { LimitSet } from '@/lib/control/limit-set';

export type LimitState = 'draft' | 'provisional' | 'approved' | 'discarded';
export type LimitOrigin = 'first-baseline' | 'chosen-span' | 'inherited' | 'screening';

/** A revision of a stream's control limits. Its numbers never change; who drew it up, who approved it, and why. */
export interface LimitRevision {
  id: string;
  revision: number;
  state: LimitState;
  origin: LimitOrigin;
  /** In force for subgroups later than this instant, until the next revision that judges. */
  effectiveFrom: Date;
  /** Of a provisional revision, from when on another that was approved since judges. */
  supersededFrom: Date | null;
  limits: LimitSet;
  baselineIds: string[];
  author: string;
  reason: string;
  draftedAt: Date;
  approvedBy: string | null;
  approvedAt: Date | null;
  approvalReason: string | null;
}

export const ORIGIN_WORDS: Record<LimitOrigin, string> = {
  'first-baseline': 'first baseline',
  'chosen-span': 'chosen span',
  inherited: 'inherited',
  screening: 'screening changed',
};
