import { formatCount, formatDateTime, formatDensity, formatNumber } from '@/lib/format';
import type { AuditFacts } from './audit-entry';
import type { ListedEntry } from './audit-trail';

type Named = Pick<ListedEntry, 'subjectKind' | 'subjectId' | 'subjectName' | 'before' | 'after'>;

/**
 * What an entry is about, to stand after what was done.
 *
 * @example "approved limits" + "revision 3"; "closed a case" + "case 12"; "recorded maps" + "monday.csv"
 */
export function subjectWords({ subjectKind, subjectId, subjectName, before, after }: Named): string {
  const fact = (key: string) => after?.[key] ?? before?.[key] ?? null;
  switch (subjectKind) {
    case 'batch':
      return String(fact('source') ?? `batch ${subjectId}`);
    case 'excursion':
      return `case ${subjectId}`;
    case 'wafer':
      return `wafer ${subjectName ?? subjectId}`;
    case 'limit-revision':
    case 'target-revision':
    case 'specification-revision':
      return `revision ${fact('revision') ?? `with number ${subjectId}`}`;
    case 'setting':
      return subjectId.replaceAll('-', ' ');
    default:
      return subjectName ?? String(fact('name') ?? `${subjectKind.replaceAll('-', ' ')} ${subjectId}`);
  }
}

/** Facts that `subjectWords` has said. */
const SAID = ['source', 'revision', 'name'];

/**
 * What was before and is after, a phrase for each fact.
 *
 * @example factWords({ state: 'open' }, { state: 'closed' }, 'UTC') // ['state: open → closed']
 */
export function factWords(before: AuditFacts | null, after: AuditFacts | null, timeZone: string): string[] {
  const keys = [...new Set([...Object.keys(before ?? {}), ...Object.keys(after ?? {})])];
  return keys.flatMap((key) => {
    const [was, is] = [before?.[key], after?.[key]];
    if (SAID.includes(key) && (was === undefined || is === undefined || was === is)) return [];
    const words = [was, is].flatMap((value) => (value === undefined ? [] : [valueWords(value, timeZone)]));
    const gone = is === undefined && after !== null ? ' → —' : '';
    return [`${keyWords(key)}: ${[...new Set(words)].join(' → ')}${gone}`];
  });
}

function keyWords(key: string): string {
  return key.replace(/[A-Z]/g, (letter) => ` ${letter.toLowerCase()}`);
}

const INSTANT = /^\d{4}-\d\d-\d\dT\d\d:\d\d:\d\d(\.\d+)?(Z|[+-]\d\d:\d\d)$/;

function valueWords(value: AuditFacts[string], timeZone: string): string {
  if (value === null || value === '') return '—';
  if (typeof value === 'boolean') return value ? 'yes' : 'no';
  if (typeof value === 'number') return numberWords(value);
  if (typeof value === 'string')
    return INSTANT.test(value) ? formatDateTime(new Date(value), timeZone) : value;
  return value.length === 0 ? 'none' : value.join(', ');
}

/** Dopant densities are the only large numbers there are. */
function numberWords(value: number): string {
  if (Math.abs(value) >= 1e10) return formatDensity(value);
  return Number.isInteger(value) ? formatCount(value) : formatNumber(value, 5);
}
