import Papa from 'papaparse';

export type CsvCell = string | number | boolean | Date | null;

/**
 * Rows as a CSV file to keep (RFC 4180, UTF-8). Times are ISO 8601 in UTC, numbers as they are stored, an undefined
 * figure is an empty cell; text that a spreadsheet would run as a formula is quoted away.
 */
export function csvResponse(
  name: string,
  columns: readonly string[],
  rows: readonly (readonly CsvCell[])[],
): Response {
  const data = rows.map((row) => row.map((cell) => (cell instanceof Date ? cell.toISOString() : cell)));
  const text = Papa.unparse({ fields: [...columns], data }, { escapeFormulae: true, newline: '\r\n' });
  return new Response(`${text}\r\n`, {
    headers: {
      'content-type': 'text/csv; charset=utf-8; header=present',
      'content-disposition': `attachment; filename="${name.replace(/[^\w.-]+/g, '-')}"`,
      'cache-control': 'no-store',
    },
  });
}
