import { CheckField } from '@/app/_ui/check-field';
import { chartedShift } from '@/lib/physics/charted-shift';
import type { ExpectedWafer, Target } from '@/lib/physics/target';
import { shiftWords } from './shift-words';

/** What a revised target does to charts of 100·ln(measured/expected), and the choice whether rules look across it. */
export function ShiftNote(props: {
  before: Target;
  /** Null while what is typed is no target. */
  after: Target | null;
  /** The latest wafers of the stream, by which the shift is told. */
  wafers: readonly ExpectedWafer[];
  /** Whether a tool may be set to the new target: then it moves the wafers, and the shift is taken up. */
  toolFollows: boolean;
  id: string;
}) {
  const { before, after, wafers, toolFollows } = props;
  const shift = after === null ? null : chartedShift(before, after, wafers);
  return (
    <>
      <p aria-live="polite">
        The charts show measured against expected.{' '}
        {after === null
          ? 'By how much they move stands here as soon as the target is whole.'
          : shift === null
            ? 'By how much they move cannot be told: no wafer is charted yet of which both targets expect something.'
            : `Wafers made as the latest were ${shiftWords(shift)} from then on.`}{' '}
        {toolFollows
          ? 'A tool that is set to the new target makes up for it, and nothing moves; one that is not stands off by as much.'
          : 'No wafer changes by it.'}{' '}
        The limits stay as they are.
      </p>
      <CheckField
        id={props.id}
        name="restart"
        label="The rules begin afresh where it takes force"
        hint="No rule then looks across it, and no moving range spans it. Where the points are to lie elsewhere for good, draw up new limits from subgroups after it."
      />
    </>
  );
}
