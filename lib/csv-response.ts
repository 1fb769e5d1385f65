import Papa from 'papaparse';

/**
 * Text that a spreadsheet would run as a formula, by how it begins (OWASP, "CSV Injection"): whatever follows, line ends
 * among it, and the full-width forms of the same signs too.
 */
const FORMULA = /^[=+\-@\t\r\n＝＋－＠]/;

export type CsvCell = string | number | boolean | Date | null;

/**
 * Rows as a CSV file to keep (RFC 4180, UTF-8). Times are ISO 8601 in UTC, numbers as they are stored, an undefined
 * figure is an empty cell. Text that a spreadsheet would run as a formula begins with an apostrophe; numbers stay numbers.
 */
export function csvResponse(
  name: string,
  columns: readonly string[],
  rows: readonly (readonly CsvCell[])[],
): Response {
  const data = rows.map((row) => row.map((cell) => (cell instanceof Date ? cell.toISOString() : cell)));
  const text = Papa.unparse({ fields: [...columns], data }, { escapeFormulae: FORMULA, newline: '\r\n' });
  return new Response(rows.length === 0 ? text : `${text}\r\n`, {
    headers: {
      'content-type': 'text/csv; charset=utf-8; header=present',
      'content-disposition': `attachment; filename="${name.replace(/[^\w.-]+/g, '-')}"`,
      'cache-control': 'no-store',
    },
  });
}
