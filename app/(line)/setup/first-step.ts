/**
 * What somebody does first where no stream is set up yet. Whoever may not set one up reads who may: the first
 * administrator of a line of its own has no such role, and gives it.
 */
export function firstStep(mayCreate: boolean, plans: number): string {
  if (!mayCreate) {
    return 'A process owner for all streams sets them up. An administrator gives that role, to themselves too, under People.';
  }
  return plans === 0
    ? 'A stream needs a site plan: draw one up first.'
    : 'Set up the first one, then send its wafer maps.';
}
