import { CurvePlot } from '@/app/_charts/curve-plot';
import { SectionHead } from '@/app/_ui/section-head';
import { formatReading } from '@/lib/format';
import { crystalPlot } from '../../crystal-plot';
import type { StreamView } from './stream-view';

/** The wafers of a crystal on the curve that physics expects along it; nothing for other streams. */
export function AlongCrystal({ view }: { view: StreamView }) {
  const { wafers, settings } = view;
  const placed = wafers.filter(
    (wafer) => wafer.ingotFraction !== null && wafer.value !== null && wafer.value > 0,
  );
  const newest = placed.findLast((wafer) => wafer.targetId !== null);
  const target = settings.targets.find(({ id }) => id === newest?.targetId)?.target;
  if (target === undefined || !target.alongCrystal) return null;
  const own = placed.filter((wafer) => wafer.targetId === newest?.targetId);
  return (
    <section aria-labelledby="along-crystal">
      <SectionHead id="along-crystal">Along the crystal</SectionHead>
      <p className="quiet small">
        The {own.length} drawn wafers of the newest target, on the curve that it expects: Scheil’s law, each
        dopant by its own segregation.
      </p>
      <CurvePlot
        {...crystalPlot(
          target,
          own.map((wafer) => ({
            x: wafer.ingotFraction ?? 0,
            y: wafer.value ?? 0,
            label: `${wafer.runOrLot} ${wafer.wafer}, ${formatReading('resistivity', wafer.value)}`,
            kind: 'measured' as const,
          })),
        )}
      />
    </section>
  );
}
