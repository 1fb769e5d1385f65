import { existsSync, readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';

const folder = fileURLToPath(new URL('../../../shared/reference/data/', import.meta.url));

/** Whether the published data sets lie beside the project; where they do not, tests on them skip and say so. */
export const referenceDataPresent = existsSync(folder);

/** The path of one published data file. */
export function referencePath(name: string): string {
  return folder + name;
}

/** The rows of one published data file as records of text, by its header. */
export function referenceRows(name: string): Record<string, string>[] {
  const [header = '', ...lines] = readFileSync(folder + name, 'utf8')
    .split(/\r?\n/)
    .filter((line) => line !== '' && !line.startsWith('#'));
  const names = header.split(',');
  return lines.map((line) => {
    const cells = line.split(',');
    return Object.fromEntries(names.map((n, i) => [n, cells[i] ?? '']));
  });
}
