import Link from 'next/link';
import { ButtonLink } from '@/app/_ui/button-link';
import { EmptyState } from '@/app/_ui/empty-state';
import { PageHead } from '@/app/_ui/page-head';
import { signedIn } from '@/app/page-actor';
import { readEnvironment } from '@/lib/env';
import { boardAnswer } from '@/lib/excursions/board-answer';
import { boardRows } from '@/lib/excursions/board-rows';
import { listBoardStreams } from '@/lib/excursions/data';
import { foundStreams } from '@/lib/excursions/found-streams';
import { BoardList } from './board-list';
import { BoardMeasureAgain } from './board-measure-again';
import { boardSub } from './board-sub';

export default async function BoardPage(props: { searchParams: Promise<{ find?: string | string[] }> }) {
  const asked = (await props.searchParams).find;
  const find = (Array.isArray(asked) ? asked[0] : asked)?.trim().slice(0, 100) ?? '';
  const streams = await listBoardStreams(await signedIn('see-line'));
  const rows = boardRows(foundStreams(streams, find));
  const now = new Date();
  const download = `/api/board${find === '' ? '' : `?find=${encodeURIComponent(find)}`}`;
  return (
    <>
      <PageHead answer={boardAnswer(rows, find)} sub={boardSub(rows, now)}>
        {find !== '' && (
          <p>
            <Link href="/" aria-keyshortcuts="Escape">
              Show all {streams.length} streams
            </Link>
          </p>
        )}
      </PageHead>
      {streams.length === 0 && (
        <EmptyState
          what="Each stream will be one row here: its last levels, its level against expected, its evenness and its state."
          how="A stream is one step, tool, chamber, recipe, target and site plan. Set one up, then send its wafer maps."
        >
          <ButtonLink href="/setup" weight="main">
            Go to the setup
          </ButtonLink>
        </EmptyState>
      )}
      {streams.length > 0 && rows.length === 0 && (
        <EmptyState
          what="No stream has these words in its name, tool, chamber, step or recipe."
          how="Try fewer words, or a part of one."
        />
      )}
      {rows.length > 0 && (
        <>
          <BoardList rows={rows} now={now} />
          <p className="small">
            <a href={download} download>
              Board as CSV
            </a>
            {' · '}
            <Link href="/measure-again">Wafers to measure again</Link>
          </p>
          <BoardMeasureAgain rows={rows} timeZone={readEnvironment().siteTimeZone} />
        </>
      )}
    </>
  );
}
