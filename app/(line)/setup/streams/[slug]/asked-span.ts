import { faultsOf } from '@/app/_ui/form-state';
import { baselineSpan } from '@/lib/limits/schema';
import { siteTimeField } from '@/lib/site-time';

export interface AskedSpan {
  /** Null where none was asked for and the stream has too few subgroups, or what was asked makes no span. */
  span: { from: Date; to: Date } | null;
  typed: { from: string; to: string };
  errors: Record<string, string>;
}

/** The span of subgroups that an address asks for; without one, the latest. */
export function askedSpan(
  asked: Record<string, string | string[] | undefined>,
  latest: { from: Date; to: Date } | null,
  timeZone: string,
): AskedSpan {
  const first = (value: string | string[] | undefined) => (Array.isArray(value) ? value[0] : value) ?? '';
  const field = (moment: Date | undefined) => (moment === undefined ? '' : siteTimeField(moment, timeZone));
  const isAsked = asked['from'] !== undefined || asked['to'] !== undefined;
  const typed = isAsked
    ? { from: first(asked['from']), to: first(asked['to']) }
    : { from: field(latest?.from), to: field(latest?.to) };
  if (!isAsked && latest === null) return { span: null, typed, errors: {} };
  const parsed = baselineSpan(timeZone).safeParse(typed);
  if (parsed.success) return { span: parsed.data, typed, errors: {} };
  const errors: Record<string, string> = {};
  for (const { field: name, reason } of faultsOf(parsed.error)) errors[name] ??= reason;
  return { span: null, typed, errors };
}
