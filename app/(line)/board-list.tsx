import Link from 'next/link';
import { BoardHead, BoardRow } from '@/app/_charts/board-row';
import { SectionHead } from '@/app/_ui/section-head';
import type { BoardRow as Row } from '@/lib/excursions/board-rows';
import { boardRowProps, commonReach } from './board-row-props';

const GROUPS = [
  { group: 'needs-someone', head: 'Needs someone' },
  { group: 'steady', head: 'Steady' },
  { group: 'not-judged', head: 'Not judged yet' },
] as const;

/** The board's rows under their heads, in the order they come. */
export function BoardList({ rows, now }: { rows: readonly Row[]; now: Date }) {
  const reach = commonReach(rows);
  return (
    <>
      <BoardHead />
      {GROUPS.map(({ group, head }) => {
        const seen = rows.filter((row) => row.state.group === group);
        if (seen.length === 0) return null;
        return (
          <section key={group} aria-labelledby={group}>
            <SectionHead id={group}>{head}</SectionHead>
            <ul className="plain-list">
              {seen.map((row) => {
                const { cases, also, ...props } = boardRowProps(row, now, reach);
                return (
                  <BoardRow
                    key={row.stream.id}
                    {...props}
                    cases={cases && <Cases {...cases} also={also} />}
                  />
                );
              })}
            </ul>
          </section>
        );
      })}
    </>
  );
}

function Cases({ id, words, also }: { id: string; words: string; also: string | null }) {
  return (
    <>
      <Link href={`/excursions/${id}`} prefetch={false}>
        case {id}
      </Link>{' '}
      · {words}
      {also !== null && ` · ${also}`}
    </>
  );
}
