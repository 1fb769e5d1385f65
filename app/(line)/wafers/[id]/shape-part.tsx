import { ShapeBars } from '@/app/_charts/shape-bars';
import { Beside } from '@/app/_ui/beside';
import { SectionHead } from '@/app/_ui/section-head';
import { usualNote } from './map-words';
import type { WaferShown } from './wafer-shown';
import styles from './page.module.css';

/** The shapes a wafer is made of, beside where they usually lie. */
export function ShapePart({ shown }: { shown: WaferShown }) {
  const { measure, reaches } = shown.study;
  return (
    <section aria-labelledby="shape">
      <SectionHead id="shape">Shape</SectionHead>
      <ShapeBars
        terms={measure.shape.terms}
        residualPercent={measure.shape.residualPercent}
        usual={reaches}
      />
      {reaches.size > 0 && (
        <p className={styles.note}>
          Grey: three standard deviations of one more wafer about the usual. {usualNote(shown)}
        </p>
      )}
      <Beside summary="What the shapes are">
        <p className="small">
          Least-squares terms on the disc of the quality area, each at most ±1 on it and +1 at its highest
          place on the rim: a bowl of 1 % lies 1 % high at the rim and 1 % low in the centre. A plan of n
          sites carries at most n/3 of them, as many as it can tell apart. The whisker is one standard error.
        </p>
      </Beside>
    </section>
  );
}
