import { describe, expect, it } from 'vitest';
import { csvResponse, type CsvCell } from '@/lib/csv-response';

const cellOf = async (cell: CsvCell) => {
  const text = await csvResponse('x.csv', ['first', 'second'], [[cell, 'end']]).text();
  return text.slice('first,second\r\n'.length, -',end\r\n'.length);
};

describe('csvResponse', () => {
  it.each(['=1+1', '+1', '-1', '@SUM(A1)', '\tx', '\rx', '\nx', '＝1', '=1\n=2', '=HYPERLINK("x")'])(
    'defuses text that begins as a formula: %j',
    async (text) => {
      expect(await cellOf(text)).toBe(`"'${text.replaceAll('"', '""')}"`);
    },
  );

  it('defuses headings too, and ends each row once where there are none', async () => {
    expect(await csvResponse('x.csv', ['=1'], []).text()).toBe('"\'=1"\r\n');
  });

  it('leaves numbers numbers, and text that is no formula as it is', async () => {
    expect(await cellOf(-1.5)).toBe('-1.5');
    expect(await cellOf(-1e-7)).toBe('-1e-7');
    expect(await cellOf(null)).toBe('');
    expect(await cellOf('n-epi = 5')).toBe('n-epi = 5');
    expect(await cellOf(new Date(0))).toBe('1970-01-01T00:00:00.000Z');
  });

  it('keeps what was sent out of the header that names the file', () => {
    const { headers } = csvResponse('a"b\r\nx: y/../../etc.csv', [], []);
    expect(headers.get('content-disposition')).toBe('attachment; filename="a-b-x-y-..-..-etc.csv"');
    expect(headers.get('x')).toBeNull();
  });
});
