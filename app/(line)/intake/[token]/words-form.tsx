import { Beside } from '@/app/_ui/beside';
import { Button } from '@/app/_ui/button';
import { SectionHead } from '@/app/_ui/section-head';
import { WAFER_COLUMNS, type MapHeader, type WaferColumn } from '@/lib/maps/map-columns';
import type { GivenWords } from '@/lib/maps/schema';
import type { Stream } from '@/lib/streams/types';
import { COLUMN_WORDS } from './column-words';
import { WordField } from './word-field';

/**
 * What a person says for all wafers of the file. It is an ordinary form: the words go into the address. It stands open
 * where the check asked for a column that the file does not have, or where something was said.
 */
export function WordsForm(props: {
  header: MapHeader;
  streams: readonly Stream[];
  given: GivenWords;
  timeZone: string;
  /** The columns that problems are about. */
  asked: ReadonlySet<string | null>;
}) {
  const { given, asked } = props;
  const inFile = new Set<WaferColumn>(props.header.wafer.map(({ column }) => column));
  const missing = WAFER_COLUMNS.filter((column) => !inFile.has(column));
  const present = WAFER_COLUMNS.filter((column) => inFile.has(column));
  const isWanted = (column: WaferColumn) => asked.has(column) || given.typed[column] !== undefined;
  const usual = missing.filter((column) => COLUMN_WORDS[column].usual || isWanted(column));
  const seldom = missing.filter((column) => !usual.includes(column));
  const isSaid = (column: WaferColumn) => given.typed[column] !== undefined;
  const fields = (columns: readonly WaferColumn[]) => (
    <div className="columns">
      {columns.map((column) => (
        <WordField key={column} column={column} {...props} />
      ))}
    </div>
  );
  const form = (
    <form method="get" aria-label="What the file does not say" key={JSON.stringify(given)}>
      {fields(usual)}
      {seldom.length > 0 && <Beside summary="More that may be said">{fields(seldom)}</Beside>}
      {present.length > 0 && (
        <Beside summary="Where cells of the file’s own columns are empty" open={present.some(isSaid)}>
          {fields(present)}
        </Beside>
      )}
      <Button type="submit">Check again with these</Button>
    </form>
  );
  if (!missing.some(isWanted) && !present.some(isSaid)) {
    return <Beside summary="Say more for all wafers of this file">{form}</Beside>;
  }
  return (
    <>
      <SectionHead id="words">What the file does not say</SectionHead>
      {form}
    </>
  );
}
