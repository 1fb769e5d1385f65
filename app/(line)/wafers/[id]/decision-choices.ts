import { waferReadings } from '@/lib/maps/wafer-readings';
import { formatSite } from './format-site';
import type { WaferShown } from './wafer-shown';

/** One thing a person may decide about one reading; `value` is what the form sends. */
export interface DecisionChoice {
  value: string;
  action: 'in' | 'out';
  label: string;
}

/** What may be decided: a reading that counts may be taken out, one that is out put back, if it is possible at all. */
export function decisionChoices(shown: WaferShown): DecisionChoice[] {
  return waferReadings(shown, shown.study).flatMap(({ site, decision }) =>
    decision === null
      ? []
      : { value: `${decision}-${site - 1}`, action: decision, label: formatSite(shown, site - 1) },
  );
}
