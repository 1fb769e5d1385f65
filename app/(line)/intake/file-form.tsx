import { WAFER_COLUMNS } from '@/lib/maps/map-columns';

/** What may stand in a wafer-map file, for whoever is about to send one. */
export function FileForm() {
  return (
    <>
      <p>
        A CSV file in UTF-8 with a header, one row per reading, a decimal point: <code>x_mm</code> and{' '}
        <code>y_mm</code> from the wafer&#39;s centre, +y away from the notch, and one of{' '}
        <code>resistivity_ohm_cm</code> or <code>sheet_resistance_ohm_sq</code>. One file may hold many
        wafers; their rows follow each other.
      </p>
      <p>
        On a wafer&#39;s rows may also stand <code>{WAFER_COLUMNS.join(', ')}</code>. Times carry their offset
        from UTC. What a file does not say can be typed on the next page, for all its wafers.
      </p>
      <p>
        The same measurement sent twice is recorded once; with other readings it is refused, for readings are
        never changed.
      </p>
    </>
  );
}
