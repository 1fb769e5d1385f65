import { Notice } from '@/app/_ui/notice';
import { PageHead } from '@/app/_ui/page-head';
import type { Actor } from '@/lib/access/actor';
import { checkedFile } from '@/lib/maps/checked-file';
import type { MapHeader } from '@/lib/maps/map-columns';
import { wordsQuery, type GivenWords } from '@/lib/maps/schema';
import type { WaitingFile } from '@/lib/maps/waiting-file';
import type { Stream } from '@/lib/streams/types';
import { checkSentence } from './check-sentence';
import { PreviewMaps } from './preview-maps';
import { ProblemTable } from './problem-table';
import { RecordForm } from './record-form';
import { WordsForm } from './words-form';

/** The check of a file: what it holds, what is wrong, the maps, and the way to record it. */
export async function CheckResult(props: {
  actor: Actor;
  file: WaitingFile;
  given: GivenWords;
  timeZone: string;
  header: MapHeader | null;
  streams: readonly Stream[];
}) {
  const { file, given } = props;
  const check = await checkedFile(props.actor, file, given.words);
  const { answer, sub } = checkSentence(file.name, check);
  const query = wordsQuery(given.typed);
  return (
    <>
      <PageHead answer={answer} sub={sub} back={{ href: '/intake', label: 'Intake' }} />
      {check.notices.map((notice) => (
        <Notice key={notice} kind="note">
          {notice}.
        </Notice>
      ))}
      <RecordForm
        token={file.token}
        query={query}
        fresh={check.fresh}
        faulty={check.spoilt ? 1 : check.faulty.size}
        large={file.bytes > 20e6}
      />
      {check.problems.length > 0 && (
        <ProblemTable
          problems={check.problems}
          count={check.problemCount}
          href={`/api/intake/${file.token}/problems?${query}`}
        />
      )}
      {props.header && (
        <WordsForm
          header={props.header}
          streams={props.streams}
          given={given}
          timeZone={props.timeZone}
          asked={new Set(check.problems.map((problem) => problem.column))}
        />
      )}
      {check.previews.length > 0 && (
        <PreviewMaps
          previews={check.previews}
          of={check.measurements - check.faulty.size}
          timeZone={props.timeZone}
        />
      )}
    </>
  );
}
