import type { Need, WalkPlace } from './walk-expectations';

/** One way to call a server action: what it needs, and arguments that lead to the write itself. */
export interface ActionCall {
  needs: Need;
  /** It acts on one stream, and so asks for the permission on that stream. */
  ofOwn?: boolean;
  args: (place: WalkPlace) => unknown[];
  fields?: (place: WalkPlace) => Record<string, string>;
  /** It has no form that answers: a refusal by its write leaves no trace but that nothing was written. */
  silent?: boolean;
}

const why = { reason: 'the walk' };
const from = { effectiveFrom: '2021-04-02T00:00' };
const none = () => [];
const slug = ({ own }: WalkPlace) => [own.slug];
const person = ({ spare }: WalkPlace) => [spare.id];
const step = (needs: Need, fields: Record<string, string>): ActionCall => ({
  needs,
  ofOwn: true,
  args: ({ own }) => [own.excursionId],
  fields: () => fields,
});
const plant = (
  needs: Need,
  args: ActionCall['args'] = none,
  fields: Record<string, string> = {},
): ActionCall => ({
  needs,
  args,
  fields: () => fields,
});
const stream = (
  needs: Need,
  fields: Record<string, string>,
  args: ActionCall['args'] = slug,
): ActionCall => ({
  needs,
  ofOwn: true,
  args,
  fields: () => fields,
});

const LINE = 'app/(line)';
const OF_STREAM = `${LINE}/setup/streams/[slug]`;
const OF_PERSON = `${LINE}/setup/people/[id]/actions.ts`;

/** Every server action, by its file and name, with each permission that it asks for. */
export const ACTIONS: Record<string, readonly ActionCall[]> = {
  [`${LINE}/excursions/[id]/actions.ts takeStep`]: [
    step('comment-case', { to: 'noted', note: 'the walk' }),
    step('acknowledge-case', { to: 'acknowledged', note: '' }),
    step('investigate-case', { to: 'under-investigation', note: '' }),
    step('close-case', { to: 'closed', cause: 'the walk', note: '' }),
  ],
  [`${LINE}/intake/[token]/actions.ts recordFile`]: [
    plant('record-maps', () => [{ token: 'f'.repeat(32), query: '', faulty: 0 }]),
  ],
  [`${LINE}/intake/[token]/actions.ts discardFile`]: [
    { ...plant('record-maps', () => ['f'.repeat(32)]), silent: true },
  ],
  [`${LINE}/setup/people/actions.ts addPersonAction`]: [
    plant('manage-people', none, { name: 'x', email: 'spare@plant.example', 'role-viewer': 'all' }),
  ],
  [`${OF_PERSON} changeRolesAction`]: [plant('manage-people', person, { 'role-viewer': 'all' })],
  [`${OF_PERSON} deactivatePersonAction`]: [plant('manage-people', ({ spare }) => [spare.id, false])],
  [`${OF_PERSON} endSessionsAction`]: [plant('manage-people', person)],
  [`${OF_PERSON} invitePersonAction`]: [plant('manage-people', person)],
  [`${LINE}/setup/permissions/actions.ts setFourEyesAction`]: [plant('change-settings', () => [false])],
  [`${LINE}/setup/tokens/actions.ts makeTokenAction`]: [
    plant('manage-tokens', none, { name: 'x', scope: 'read', days: '30' }),
  ],
  [`${LINE}/setup/tokens/actions.ts revokeTokenAction`]: [
    plant('manage-tokens', ({ spareToken }) => [spareToken.id]),
  ],
  [`${LINE}/setup/plans/new/actions.ts createPlanAction`]: [plant('create-stream')],
  [`${LINE}/setup/streams/new/actions.ts createStreamAction`]: [plant('create-stream')],
  [`${OF_STREAM}/target-actions.ts reviseTargetAction`]: [
    stream('revise-target', {
      dopant: 'boron',
      densityPerCm3: '1.3e15',
      profile: 'uniform',
      ...from,
      ...why,
    }),
  ],
  [`${OF_STREAM}/specification/actions.ts reviseSpecificationAction`]: [
    stream('revise-specification', { meanLower: '1', meanUpper: '20', ...from, ...why }),
  ],
  [`${OF_STREAM}/events/actions.ts recordEventAction`]: [
    stream('record-event', { kind: 'adjustment', at: '2021-04-01T00:30', text: 'the walk' }),
  ],
  [`${OF_STREAM}/limits/actions.ts draftLimitsAction`]: [
    stream('draft-limits', why, ({ own }) => [
      own.slug,
      { from: '2021-04-01T00:00', to: '2021-04-01T03:00' },
    ]),
  ],
  [`${OF_STREAM}/limits/actions.ts enterInheritedAction`]: [
    stream('draft-limits', { lower: '9.7', centre: '10', upper: '10.3', ...from, ...why }),
  ],
  [`${OF_STREAM}/limits/actions.ts discardLimitsAction`]: [
    stream('draft-limits', {}, ({ own }) => [own.draftId]),
  ],
  [`${OF_STREAM}/limits/actions.ts approveLimitsAction`]: [
    {
      ...stream('approve-limits', {}, ({ other }) => [other.slug]),
      fields: ({ own }) => ({ revisionId: own.draftId, ...from, ...why }),
    },
  ],
  [`${OF_STREAM}/use/actions.ts changeScreeningAction`]: [
    stream('change-rules', { screening: 'impossible', ...why }),
  ],
  [`${OF_STREAM}/use/actions.ts retireStreamAction`]: [
    stream('retire-stream', {}, ({ own }) => [own.slug, false]),
  ],
  [`${LINE}/wafers/[id]/actions.ts decide`]: [
    stream('exclude-reading', { site: 'out-1', ...why }, ({ own }) => [own.waferId]),
  ],
  ['app/first-administrator/actions.ts enterFirstAdministrator']: [
    plant('anyone', none, { name: 'x', email: 'x@plant.example', password: 'eleven quiet furnaces' }),
  ],
};
