/**
 * The signal that speaks for excursion `e`, in the order of `leadSignal`: of those that hold the one whose last subgroup
 * is the latest, then the one that counts the most subgroups, then the newest.
 */
export const LEAD_SIGNAL = `SELECT held.* FROM signal held
  JOIN subgroup reached ON reached.stream_id = held.stream_id AND reached.id = held.last_subgroup_id
  WHERE held.stream_id = e.stream_id AND held.excursion_id = e.id AND held.withdrawn_at IS NULL
  ORDER BY reached.position_at DESC, reached.key DESC, cardinality(held.participant_ids) + held.completions DESC,
    held.id DESC LIMIT 1`;
