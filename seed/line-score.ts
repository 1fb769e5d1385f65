import { getPool } from '@/lib/database/client';
import { PLANT } from './plant';
import type { Mishap } from './mishap';

/** How the charts did against the truth of the demonstration line. */
export interface LineScore {
  /** Subgroups from the onset to the first signal of the chart that should find it; null where it never came. */
  mishaps: { mishap: Mishap; found: number | null; rule: string | null }[];
  /** Signals on the streams on which nothing happens, among how many judged subgroups. */
  quiet: { slug: string; subgroups: number; signals: number }[];
  /** The same on the others, before their mishap or without one. */
  elsewhere: { slug: string; subgroups: number; signals: number }[];
}

/** Holds the recorded demonstration line, whose last day ends at `endAt`, against what truly happened on it. */
export async function lineScore(endAt: Date): Promise<LineScore> {
  const startMs = endAt.getTime() - PLANT.days * 86_400_000;
  const onsetOf = (mishap: Mishap) => new Date(startMs + mishap.onsetDay * 86_400_000);
  const mishaps = await Promise.all(PLANT.mishaps.map((mishap) => foundAfter(mishap, onsetOf(mishap))));
  const others = PLANT.streams.filter((stream) => !stream.quiet);
  return {
    mishaps,
    quiet: await Promise.all(
      PLANT.streams.filter((s) => s.quiet).map(({ slug }) => signalsUntil(slug, endAt)),
    ),
    elsewhere: await Promise.all(
      others.map(({ slug }) => {
        const mishap = PLANT.mishaps.find((one) => one.streamSlug === slug);
        return signalsUntil(slug, mishap === undefined ? endAt : onsetOf(mishap));
      }),
    ),
  };
}

async function foundAfter(mishap: Mishap, onset: Date): Promise<LineScore['mishaps'][number]> {
  const { rows } = await getPool().query<{ rule: string; found: number }>(
    `SELECT x.rule, (SELECT count(*)::integer FROM subgroup h WHERE h.stream_id = g.stream_id AND h.position_at >= $2
         AND (h.position_at, h.key) <= (g.position_at, g.key)) AS found
     FROM signal x JOIN stream s ON s.id = x.stream_id
     JOIN subgroup g ON g.stream_id = x.stream_id AND g.id = x.first_subgroup_id
     WHERE s.slug = $1 AND x.chart = $3 AND g.position_at >= $2 AND x.withdrawn_at IS NULL
     ORDER BY g.position_at, g.key LIMIT 1`,
    [mishap.streamSlug, onset, mishap.chart],
  );
  return { mishap, found: rows[0]?.found ?? null, rule: rows[0]?.rule ?? null };
}

async function signalsUntil(slug: string, until: Date): Promise<LineScore['quiet'][number]> {
  const { rows } = await getPool().query<{ subgroups: number; signals: number }>(
    `SELECT (SELECT count(*)::integer FROM subgroup g WHERE g.stream_id = s.id AND g.position_at < $2
         AND g.limit_revision_id IS NOT NULL) AS subgroups,
       (SELECT count(*)::integer FROM signal x JOIN subgroup g ON g.stream_id = x.stream_id AND g.id = x.first_subgroup_id
         WHERE x.stream_id = s.id AND g.position_at < $2 AND x.withdrawn_at IS NULL) AS signals
     FROM stream s WHERE s.slug = $1`,
    [slug, until],
  );
  return { slug, subgroups: rows[0]?.subgroups ?? 0, signals: rows[0]?.signals ?? 0 };
}
