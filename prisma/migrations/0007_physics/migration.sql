-- Targets by what is known of them: an implant's range, straggle and drive-in, a profile of pairs, a dopant that
-- counters the first, the owner's own temperature coefficient, and how the wafer is measured.
ALTER TABLE target_revision
  DROP CONSTRAINT target_revision_profile_check,
  ADD CONSTRAINT target_revision_profile_check
    CHECK (profile IN ('uniform', 'box', 'gaussian', 'erfc', 'implant', 'pairs')),
  ADD COLUMN range_um double precision CHECK (range_um >= 0),
  ADD COLUMN drive_in_c double precision,
  ADD COLUMN drive_in_min double precision CHECK (drive_in_min > 0),
  ADD COLUMN profile_pairs jsonb CHECK (jsonb_typeof(profile_pairs) = 'array'),
  ADD COLUMN temperature_coefficient_percent_per_c double precision
    CHECK (abs(temperature_coefficient_percent_per_c) <= 2),
  ADD COLUMN method text CHECK (method IN ('four-point', 'other')),
  ADD COLUMN counter_dopant text CHECK (counter_dopant IN ('boron', 'phosphorus', 'arsenic', 'antimony')),
  ADD COLUMN counter_density_per_cm3 double precision CHECK (counter_density_per_cm3 > 0),
  ADD CONSTRAINT target_revision_drive_in CHECK ((drive_in_c IS NULL) = (drive_in_min IS NULL)),
  ADD CONSTRAINT target_revision_pairs CHECK ((profile_pairs IS NOT NULL) = (profile = 'pairs')),
  ADD CONSTRAINT target_revision_counter CHECK ((counter_dopant IS NULL) = (counter_density_per_cm3 IS NULL));
