import { decimalNumber } from './decimal-number';
import { readColumns, type Cell, type FileFault } from './read-columns';

/**
 * Which columns make a subgroup: one value a row, values gathered by a group's name (and within it by a wafer's), or
 * several values a row.
 */
export type SubgroupColumns =
  { value: string; group?: string; wafer?: string } | { values: readonly string[] };

/**
 * Subgroups in the order in which they first appear, each with the name of its group (one a run where each subgroup is
 * a wafer), or the faults of the file.
 */
export type Subgroups =
  { ok: true; subgroups: number[][]; groups: string[] } | { ok: false; faults: FileFault[] };

/**
 * The subgroups of a CSV file. With several values a row an empty cell is a value that was not taken, as long as
 * one other is there; everywhere else an empty cell, and always a cell that is no number, is a fault.
 */
export async function studySubgroups(file: string, columns: SubgroupColumns): Promise<Subgroups> {
  const faults: FileFault[] = [];
  const refuse = ({ line, column }: Cell, reason: string) => void faults.push({ file, line, column, reason });
  const read = (cell: Cell): number[] => {
    const value = decimalNumber(cell.text);
    if (value !== null) return [value];
    refuse(cell, cell.text === '' ? 'the cell is empty' : `not a number: "${cell.text}"`);
    return [];
  };
  if ('values' in columns) {
    const table = await readColumns(file, columns.values);
    if (!table.ok) return table;
    const subgroups = table.rows.map((cells) => {
      const filled = cells.filter((cell) => cell.text !== '');
      const [first] = cells;
      if (filled.length === 0 && first) refuse(first, 'the row has no value');
      return filled.flatMap(read);
    });
    return faults.length > 0 ? { ok: false, faults } : { ok: true, subgroups, groups: [] };
  }
  const { value, group, wafer } = columns;
  const names = [group, wafer].filter((name) => name !== undefined);
  const table = await readColumns(file, [value, ...names]);
  if (!table.ok) return table;
  const subgroups = new Map<string, { group: string; values: number[] }>();
  table.rows.forEach(([cell, ...groupCells], row) => {
    if (!cell) return;
    for (const name of groupCells) if (name.text === '') refuse(name, 'the cell is empty');
    const key = names.length === 0 ? String(row) : JSON.stringify(groupCells.map(({ text }) => text));
    const subgroup = subgroups.get(key) ?? { group: groupCells[0]?.text ?? '', values: [] };
    subgroup.values.push(...read(cell));
    subgroups.set(key, subgroup);
  });
  if (faults.length > 0) return { ok: false, faults };
  const found = [...subgroups.values()];
  return {
    ok: true,
    subgroups: found.map(({ values }) => values),
    groups: found.map(({ group: name }) => name),
  };
}
