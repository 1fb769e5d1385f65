import { describe, expect, test } from 'vitest';
import { factWords, subjectWords } from '@/lib/access/audit-words';

const entry = { subjectId: '12', subjectName: null, before: null, after: null };

describe('what an entry of the audit trail is about', () => {
  test.each([
    [{ ...entry, subjectKind: 'excursion' }, 'case 12'],
    [{ ...entry, subjectKind: 'batch', after: { source: 'monday.csv' } }, 'monday.csv'],
    [{ ...entry, subjectKind: 'batch' }, 'batch 12'],
    [{ ...entry, subjectKind: 'wafer', subjectName: 'W-2207' }, 'wafer W-2207'],
    [{ ...entry, subjectKind: 'limit-revision', after: { revision: 3 } }, 'revision 3'],
    [{ ...entry, subjectKind: 'setting', subjectId: 'four-eyes' }, 'four eyes'],
    [{ ...entry, subjectKind: 'token', before: { name: 'gauge 4' } }, 'gauge 4'],
    [{ ...entry, subjectKind: 'site-plan' }, 'site plan 12'],
  ])('%o is read as %s', (given, words) => {
    expect(subjectWords(given)).toBe(words);
  });
});

describe('what was before and is after', () => {
  test.each([
    [{ state: 'open' }, { state: 'closed' }, ['state: open → closed']],
    [{ state: 'open' }, null, ['state: open']],
    [{ note: 'x' }, {}, ['note: x → —']],
    [{ name: 'Ada' }, { name: 'Ada L.' }, ['name: Ada → Ada L.']],
    [null, { name: 'Ada', siteIndex: 4, level: 10.12345 }, ['site index: 4', 'level: 10.123']],
    [null, { effectiveFrom: '2031-07-05T04:07:00.000Z' }, ['effective from: 2031-07-05 06:07']],
    [
      null,
      { streams: ['a', 'b'], roles: [], on: true, at: null },
      ['streams: a, b', 'roles: none', 'on: yes', 'at: —'],
    ],
    [
      { revision: 2, densityPerCm3: 1.3e15 },
      { revision: 3, densityPerCm3: 1.34e15 },
      ['revision: 2 → 3', 'density per cm3: 1.30\u00a0×\u00a010¹⁵ → 1.34\u00a0×\u00a010¹⁵'],
    ],
    [null, null, []],
  ])('%o and %o are read as %o', (before, after, words) => {
    expect(factWords(before, after, 'Europe/Berlin')).toEqual(words);
  });
});
