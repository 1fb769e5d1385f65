/** What the system's reasons for not opening a file mean to the one who named it. */
const WORDS = new Map([
  ['ENOENT', 'there is no such file'],
  ['ENOTDIR', 'there is no such file'],
  ['EISDIR', 'this is a folder, not a file'],
  ['EACCES', 'this file may not be read'],
  ['EPERM', 'this file may not be read'],
]);

/**
 * One line on a file that cannot be opened or read, from what the system threw (error codes: POSIX.1, errno.h).
 *
 * @example fileFailure('a.csv', Object.assign(new Error(), { code: 'ENOENT' })) // "a.csv: there is no such file."
 */
export function fileFailure(file: string, error: unknown): string {
  const { code } = error as { code?: string };
  const words = code === undefined ? undefined : WORDS.get(code);
  return `${file}: ${words ?? (error instanceof Error ? error.message : String(error))}.`;
}
