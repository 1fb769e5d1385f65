import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { readEnvironment } from '@/lib/env';
import { mapViewOf } from '@/lib/maps/wafer-map-view';
import { waferStudy } from '@/lib/maps/wafer-study';
import { waferTitle } from '@/lib/maps/wafer-title';
import { ExplainPart } from './explain-part';
import { FactsPart } from './facts-part';
import { FiguresPart } from './figures-part';
import { MapPart } from './map-part';
import { PhysicsPart } from './physics-part';
import { RadiusPart } from './radius-part';
import { ReadingsPart } from './readings-part';
import { readWafer } from './read-wafer';
import { ShapePart } from './shape-part';
import { VerdictPart } from './verdict-part';
import { waferShown } from './wafer-shown';
import { WaferHead } from './wafer-head';
import styles from './page.module.css';

interface WaferPageProps {
  params: Promise<{ id: string }>;
  searchParams: Promise<{ map?: string | string[]; site?: string | string[] }>;
}

export async function generateMetadata({ params }: WaferPageProps): Promise<Metadata> {
  const found = await readWafer((await params).id);
  return { title: found === null ? 'No such wafer' : waferTitle(found.wafer.facts) };
}

export default async function WaferPage({ params, searchParams }: WaferPageProps) {
  const [{ id }, asked] = await Promise.all([params, searchParams]);
  const found = await readWafer(id);
  if (found === null) notFound();
  const shown = waferShown(found, waferStudy(found), {
    view: mapViewOf(asked.map),
    timeZone: readEnvironment().siteTimeZone,
  });
  const site = Array.isArray(asked.site) ? asked.site[0] : asked.site;
  return (
    <>
      <WaferHead shown={shown} />
      <div className={styles.parts}>
        <div className={styles.map}>
          <MapPart shown={shown} />
          <VerdictPart shown={shown} />
        </div>
        <div className={styles.plots}>
          <RadiusPart shown={shown} />
          <ShapePart shown={shown} />
        </div>
        <div className={styles.figures}>
          <PhysicsPart shown={shown} />
          <FiguresPart shown={shown} />
        </div>
      </div>
      <ExplainPart shown={shown} />
      <ReadingsPart shown={shown} site={site ?? ''} />
      <FactsPart shown={shown} />
    </>
  );
}
