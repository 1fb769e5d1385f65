/**
 * The hatchings that drawings share, defined once a page.
 * `url(#hatch-expected)` fills what physics expects: violet wash with diagonal lines, so that the band is told
 * from a plain grey area without colour. `url(#hatch-quiet)` fills where nothing is known.
 * The element has no size but is not `display: none`: a pattern inside a hidden element paints nothing.
 */
export function Hatches() {
  return (
    <svg width="0" height="0" aria-hidden="true" focusable="false" style={{ position: 'absolute' }}>
      <defs>
        <pattern
          id="hatch-expected"
          width="5"
          height="5"
          patternUnits="userSpaceOnUse"
          patternTransform="rotate(45)"
        >
          <rect width="5" height="5" style={{ fill: 'var(--physwash)' }} />
          <line y2="5" style={{ stroke: 'var(--phys)', strokeOpacity: 0.45, strokeWidth: 1 }} />
        </pattern>
        <pattern
          id="hatch-quiet"
          width="6"
          height="6"
          patternUnits="userSpaceOnUse"
          patternTransform="rotate(-45)"
        >
          <line y2="6" style={{ stroke: 'var(--edge)', strokeOpacity: 0.5, strokeWidth: 1 }} />
        </pattern>
      </defs>
    </svg>
  );
}
