'use client';

import { ActionForm } from '@/app/_ui/action-form';
import { Beside } from '@/app/_ui/beside';
import type { CalibrationFactor } from '@/lib/limits/calibration-study';
import type { ExpectedWafer, Target } from '@/lib/physics/target';
import { wordsOfTarget } from '@/lib/streams/words-of-target';
import { ExpectedFigures } from '../../expected-figures';
import { RevisionFields } from '../../revision-fields';
import { ShiftNote } from '../../shift-note';
import { reviseTargetAction } from './target-actions';
import styles from '../../expected-note.module.css';

/** Makes the factor that a baseline gave part of the target: a new revision, otherwise as the one in force. */
export function CalibrationForm(props: {
  slug: string;
  /** The latest wafers, where these are charted against what is expected of them. */
  wafers: readonly ExpectedWafer[] | null;
  target: Target;
  found: CalibrationFactor;
  now: string;
  timeZone: string;
}) {
  const { target, found } = props;
  const calibrated: Target = {
    ...target,
    calibrationFactor: Number(found.factor.toPrecision(6)),
    calibrationPercent: Number(found.percent.toPrecision(3)),
  };
  return (
    <Beside summary="Make it the target’s calibration">
      <ActionForm
        action={reviseTargetAction.bind(null, props.slug)}
        label="Calibrate the target"
        submit="Record the calibrated target"
        working="Recording it…"
        weight="plain"
      >
        {({ errors }) => (
          <>
            {Object.entries(wordsOfTarget(calibrated)).map(([name, value]) => (
              <input key={name} type="hidden" name={name} value={value} />
            ))}
            <input type="hidden" name="calibrationWafers" value={found.wafers} />
            <div className={styles.note}>
              <ExpectedFigures target={calibrated} />
            </div>
            <RevisionFields
              id="calibration"
              now={props.now}
              timeZone={props.timeZone}
              errors={errors}
              hint="For wafers processed from then on, and after those on record: these keep what was expected of them."
            />
            {props.wafers !== null && (
              <ShiftNote
                id="calibration-restart"
                before={target}
                after={calibrated}
                wafers={props.wafers}
                toolFollows={false}
              />
            )}
          </>
        )}
      </ActionForm>
    </Beside>
  );
}
