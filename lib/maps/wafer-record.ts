import type { SignalWords } from '@/lib/excursions/types';
import type { BadReason, Screen } from '@/lib/wafer/measure-wafer';
import type { MeasurementFacts } from './types';

/** One measured wafer as it stands on record. */
export interface WaferRecord {
  id: string;
  streamId: string;
  facts: MeasurementFacts;
  correctedBy: string;
  batch: { id: string; source: string };
  history: boolean;
  recordedAt: Date;
  recordedBy: string;
  screening: Screen;
  notJudgedReason: string | null;
  /** As sent, in the order of the site plan. */
  readings: (number | null)[];
  badSites: { siteIndex: number; reason: BadReason }[];
  targetRevisionId: string | null;
  /** `rule:side` for each way out of specification. */
  specification: string[];
  subgroup: {
    id: string;
    key: string;
    positionAt: Date;
    state: 'judged' | 'open' | 'not-judged';
    wafers: number;
    limitRevisionId: string | null;
    /** `chart:rule:side` of each rule it completes. */
    completions: string[];
  };
}

/** A wafer beside another, as lists name it. */
export interface WaferNeighbour {
  id: string;
  wafer: string;
  slot: number | null;
  runOrLot: string;
  processedAt: Date;
  areaMean: number | null;
  mean: number | null;
  median: number | null;
  relativeStandardDeviationPercent: number | null;
  notJudgedReason: string | null;
  isOutOfSpecification: boolean;
}

/** A person's word on one reading. */
export interface ReadingDecision {
  siteIndex: number;
  action: 'out' | 'in';
  actor: string;
  reason: string;
  at: Date;
}

/** Which wafers make up what is usual: those of the limits' baseline, else the latest before this one. */
export interface UsualWafers {
  from: 'baseline' | 'latest';
  /** The limit revision whose baseline it is. */
  revision: number | null;
  wafers: {
    readings: (number | null)[];
    badSites: number[];
    correctionsApplied: string[];
    temperatureC: number | null;
  }[];
}

/** A signal that the wafer's subgroup completes or carries on. */
export interface CompletedSignal extends SignalWords {
  id: string;
  excursion: { id: string; state: string } | null;
}
