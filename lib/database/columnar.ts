/** One column of a bulk statement: its name, its PostgreSQL type, and where a row keeps it. */
export interface Column<Row> {
  name: string;
  type: string;
  value: (row: Row) => unknown;
}

/**
 * Rows as a subquery over `unnest`, one array parameter per column: one statement carries thousands of rows, and its
 * text does not depend on their number. Every column travels as one array literal; a column of arrays as text of such
 * literals (`arrayLiteral`), and is cast.
 * Appends to `parameters` and returns `(SELECT …)`.
 */
export function rowsAsQuery<Row>(
  columns: readonly Column<Row>[],
  rows: readonly Row[],
  parameters: unknown[],
): string {
  const sources: string[] = [];
  const selected: string[] = [];
  for (const { name, type, value } of columns) {
    parameters.push(columnLiteral(rows.map(value), type));
    const isArray = type.endsWith('[]');
    sources.push(`$${parameters.length}::${isArray ? 'text' : type}[]`);
    selected.push(isArray ? `${name}::${type}` : name);
  }
  const names = columns.map((column) => column.name).join(', ');
  return `(SELECT ${selected.join(', ')} FROM unnest(${sources.join(', ')}) AS given (${names}))`;
}

/** The values of one column as an array literal. Only free text needs escaping. */
function columnLiteral(values: readonly unknown[], type: string): string {
  const isText = type === 'text';
  const isArray = type.endsWith('[]');
  const elements = values.map((value) => {
    if (value === null || value === undefined) return 'NULL';
    if (isText) return `"${String(value).replace(/[\\"]/g, '\\$&')}"`;
    return isArray ? `"${String(value).replaceAll('"', '\\"')}"` : String(value);
  });
  return `{${elements.join(',')}}`;
}

/** A PostgreSQL array literal of numbers, ids or words without quotes or backslashes; null elements stay null. */
export function arrayLiteral(values: readonly (number | string | null)[]): string {
  const elements = values.map((value) =>
    value === null ? 'NULL' : typeof value === 'number' ? value : `"${value}"`,
  );
  return `{${elements.join(',')}}`;
}

/** The names of columns, for an INSERT's list. */
export function columnNames<Row>(columns: readonly Column<Row>[]): string {
  return columns.map((column) => column.name).join(', ');
}
