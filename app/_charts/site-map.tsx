import type { Site } from '@/lib/wafer/site';
import { waferOutline } from './wafer-outline';

const R = 100;

/** Where the sites of a plan lie on its wafer; the quality area's border is dashed, sites beyond it are hollow. */
export function SiteMap(props: {
  sites: readonly Site[];
  diameterMm: number;
  edgeExclusionMm: number;
  orientation: 'notch' | 'flat';
}) {
  const { sites, diameterMm, edgeExclusionMm, orientation } = props;
  const scale = R / (diameterMm / 2);
  const quality = diameterMm / 2 - edgeExclusionMm;
  const size = sites.length > 400 ? 0.8 : 1.6;
  return (
    <svg
      role="img"
      aria-label={`${sites.length} sites on a wafer of ${diameterMm} mm`}
      viewBox={`${-R - 2} ${-R - 2} ${2 * R + 4} ${2 * R + 4}`}
      style={{ width: '100%', maxWidth: 420 }}
    >
      <path
        d={waferOutline(diameterMm, orientation, R)}
        style={{ fill: 'var(--sheet)', stroke: 'var(--ink)', strokeWidth: 0.8 }}
      />
      {edgeExclusionMm > 0 && (
        <circle
          r={quality * scale}
          style={{ fill: 'none', stroke: 'var(--stat)', strokeWidth: 0.5, strokeDasharray: '3 3' }}
        />
      )}
      {sites.map(({ xMm, yMm }, i) => {
        const isOut = Math.hypot(xMm, yMm) > quality * (1 + 1e-6);
        return (
          <circle
            key={i}
            cx={xMm * scale}
            cy={-yMm * scale}
            r={size}
            style={{ fill: isOut ? 'none' : 'var(--ink)', stroke: 'var(--ink)', strokeWidth: 0.4 }}
          />
        );
      })}
    </svg>
  );
}
