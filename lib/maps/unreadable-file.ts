/** A fault of a file and its place; lines count from 1, `column` is the header's word. */
export interface PlacedFault {
  line: number | null;
  column: string | null;
  reason: string;
}

/** The file as a whole cannot be read: it is no CSV text, its header cannot serve, or no row matches the header. */
export class UnreadableFile extends Error {
  readonly faults: readonly PlacedFault[];

  constructor(faults: readonly PlacedFault[]) {
    super(faults.map((fault) => fault.reason).join('; '));
    this.faults = faults;
  }
}

/** The same for a single fault. */
export function unreadable(reason: string, line: number | null = null): UnreadableFile {
  return new UnreadableFile([{ line, column: null, reason }]);
}
