-- Wafers that were recorded and not judged are few: the list of those to measure again reads these alone.
CREATE INDEX wafer_measurement_not_judged ON wafer_measurement (stream_id, measured_at DESC)
  WHERE not_judged_reason IS NOT NULL AND NOT history;
