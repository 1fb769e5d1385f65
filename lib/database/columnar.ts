import { binaryArray } from './binary-array';

/** One column of a bulk statement: its name, its PostgreSQL type, and where a row keeps it. */
export interface Column<Row> {
  name: string;
  type: string;
  value: (row: Row) => unknown;
}

/**
 * Rows as a subquery over `unnest`, one array parameter per column: one statement carries thousands of rows, and its
 * text does not depend on their number. Every column travels as one array; a column of arrays as text of such literals
 * (`arrayLiteral`), and is cast.
 * Appends to `parameters` and returns `(SELECT …)`.
 */
export function rowsAsQuery<Row>(
  columns: readonly Column<Row>[],
  rows: readonly Row[],
  parameters: unknown[],
): string {
  const query = columnsAsQuery(columns, parameters.length + 1);
  parameters.push(...columnLiterals(columns, rows));
  return query;
}

/** The same subquery alone: its text, with parameters numbered from `first` on. */
export function columnsAsQuery<Row>(columns: readonly Column<Row>[], first: number): string {
  const sources = columns.map(({ type }, i) => `$${first + i}::${type.endsWith('[]') ? 'text' : type}[]`);
  const selected = columns.map(({ name, type }) => (type.endsWith('[]') ? `${name}::${type}` : name));
  return `(SELECT ${selected.join(', ')} FROM unnest(${sources.join(', ')}) AS given (${columnNames(columns)}))`;
}

/** The parameters of that subquery: for each column its values as one array, in binary form or as a literal. */
export function columnLiterals<Row>(
  columns: readonly Column<Row>[],
  rows: readonly Row[],
): (string | Buffer)[] {
  return columns.map(({ type, value }) => {
    const values = rows.map(value);
    return binaryArray(type, values) ?? `{${values.map((one) => element(one, type)).join()}}`;
  });
}

/** Only free text needs escaping; an element that is an array itself travels as text. */
function element(value: unknown, type: string): string {
  if (value === null || value === undefined) return 'NULL';
  const text = String(value);
  if (type === 'text') return `"${/[\\"]/.test(text) ? text.replace(/[\\"]/g, '\\$&') : text}"`;
  return type.endsWith('[]') ? `"${text.replaceAll('"', '\\"')}"` : text;
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
