/** The dopants whose conversion is published for silicon wafers; boron makes it p-type, the others n-type. */
export type Dopant = 'boron' | 'phosphorus' | 'arsenic' | 'antimony';

/** Every dopant, in the order in which a person is offered them. */
export const DOPANTS: readonly Dopant[] = ['boron', 'phosphorus', 'arsenic', 'antimony'];

/**
 * The conduction type a dopant gives: boron takes an electron (`'p'`), the donors give one (`'n'`).
 *
 * @example conductionType('boron') // 'p'
 */
export function conductionType(dopant: Dopant): 'p' | 'n' {
  return dopant === 'boron' ? 'p' : 'n';
}
