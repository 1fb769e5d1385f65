/**
 * Wafer `w` waits to be measured again: it was recorded (not as history) and not judged, no other measurement stands
 * for it in its subgroup, and no later measurement of the same wafer has been judged since. It leaves by such a
 * measurement, or by being judged itself after all.
 */
export const TO_MEASURE = `w.not_judged_reason IS NOT NULL AND NOT w.history AND EXISTS (
  SELECT FROM subgroup place WHERE place.stream_id = w.stream_id AND place.id = w.subgroup_id
    AND w.id = ANY(place.wafer_ids)) AND NOT EXISTS (
  SELECT FROM wafer_measurement later WHERE later.stream_id = w.stream_id AND later.run_or_lot = w.run_or_lot
    AND later.wafer = w.wafer AND later.measured_at > w.measured_at AND later.not_judged_reason IS NULL)`;
