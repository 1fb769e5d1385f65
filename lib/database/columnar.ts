/** One column of a bulk statement: its name, its PostgreSQL type, and where a row keeps it. */
export interface Column<Row> {
  name: string;
  type: string;
  value: (row: Row) => unknown;
}

/**
 * Rows as a subquery over `unnest`, one array parameter per column: one statement carries thousands of rows, and its
 * text does not depend on their number. Array columns travel as text literals (`arrayLiteral`) and are cast.
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
    parameters.push(rows.map(value));
    const isArray = type.endsWith('[]');
    sources.push(`$${parameters.length}::${isArray ? 'text' : type}[]`);
    selected.push(isArray ? `${name}::${type}` : name);
  }
  const names = columns.map((column) => column.name).join(', ');
  return `(SELECT ${selected.join(', ')} FROM unnest(${sources.join(', ')}) AS given (${names}))`;
}

/** A PostgreSQL array literal of numbers, ids or words without quotes or backslashes; null elements stay null. */
export function arrayLiteral(values: readonly (number | string | null)[]): string {
  let literal = '{';
  for (let i = 0; i < values.length; i += 1) {
    const value = values[i];
    if (i > 0) literal += ',';
    literal +=
      value === null || value === undefined
        ? 'NULL'
        : typeof value === 'number'
          ? String(value)
          : `"${value}"`;
  }
  return literal + '}';
}

/** The names of columns, for an INSERT's list. */
export function columnNames<Row>(columns: readonly Column<Row>[]): string {
  return columns.map((column) => column.name).join(', ');
}
