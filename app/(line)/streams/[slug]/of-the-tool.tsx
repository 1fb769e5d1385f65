import Link from 'next/link';
import { CurvePlot } from '@/app/_charts/curve-plot';
import { DataTable } from '@/app/_ui/data-table';
import { SectionHead } from '@/app/_ui/section-head';
import type { Actor } from '@/lib/access/actor';
import { listToolWafers } from '@/lib/excursions/data';
import { formatCount, formatPercent, formatSignedPercent } from '@/lib/format';
import { listToolSettings } from '@/lib/streams/data';
import type { Stream } from '@/lib/streams/types';
import { toolPlot, toolScale } from './tool-scale';

/** All recipes of the stream's tool on one scale; nothing where it runs this one alone. */
export async function OfTheTool({ actor, stream }: { actor: Actor; stream: Stream }) {
  const settings = stream.tool === '' ? [] : await listToolSettings(actor, stream);
  if (settings.length < 2) return null;
  const ids = settings.map((one) => one.stream.id);
  const recipes = toolScale(settings, await listToolWafers(actor, ids), stream.id);
  if (recipes.length < 2) return null;
  const word = stream.kind === 'implant' || stream.kind === 'diffusion' ? 'dose' : 'dopant';
  return (
    <section aria-labelledby="of-the-tool">
      <SectionHead id="of-the-tool">
        All recipes of {[stream.tool, stream.chamber].filter(Boolean).join(', ')}
      </SectionHead>
      <p className="quiet small">
        100·ln(measured/expected) over what a percent of {word} is worth. What moves all of them together is
        the tool’s; a recipe that stands off as a whole says so of its target, which is known no better than
        the last column.
      </p>
      <CurvePlot {...toolPlot(recipes, word)} />
      <DataTable
        caption="Recipes of the tool"
        captionUnseen
        rows={recipes}
        rowKey={(recipe) => recipe.slug}
        columns={[
          {
            key: 'recipe',
            head: 'stream',
            cell: ({ slug, name, letter }) => (
              <>
                {letter === null ? '● ' : `${letter} `}
                {letter === null ? name : <Link href={`/streams/${slug}`}>{name}</Link>}
              </>
            ),
          },
          { key: 'wafers', head: 'wafers', align: 'right', cell: ({ wafers }) => formatCount(wafers.length) },
          {
            key: 'mean',
            head: 'mean',
            align: 'right',
            cell: ({ meanPercent }) => formatSignedPercent(meanPercent, 2),
          },
          {
            key: 's',
            head: 's',
            align: 'right',
            cell: ({ standardDeviationPercent }) => formatPercent(standardDeviationPercent),
          },
          {
            key: 'expected',
            head: 'expected known to, k = 1',
            align: 'right',
            cell: ({ expectedPercent }) => `± ${formatPercent(expectedPercent)}`,
          },
        ]}
      />
    </section>
  );
}
