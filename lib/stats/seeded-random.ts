/** A stream of numbers that is the same for the same seed on every machine. */
export interface SeededRandom {
  /** Evenly from 0 up to, not reaching, 1. */
  uniform(): number;
  /** Standard normal. */
  normal(): number;
}

/**
 * A small seeded generator for simulations and the demonstration line: a 32-bit counter through a mixing function (the
 * finalizer of A. Appleby's public-domain hash), normals by Box and Muller, Ann. Math. Statist. 29, 610 (1958). Good
 * enough for wafers, not for secrets.
 *
 * `seed` any text. Throws nothing.
 */
export function seededRandom(seed: string): SeededRandom {
  let state = 0;
  for (const character of seed) state = mixed(state ^ character.charCodeAt(0));
  let spare: number | null = null;
  const uniform = (): number => {
    state = (state + 0x9e3779b9) | 0;
    return (mixed(state) >>> 0) / 4294967296;
  };
  const normal = (): number => {
    if (spare !== null) {
      const kept = spare;
      spare = null;
      return kept;
    }
    const radius = Math.sqrt(-2 * Math.log(1 - uniform()));
    const angle = 2 * Math.PI * uniform();
    spare = radius * Math.sin(angle);
    return radius * Math.cos(angle);
  };
  return { uniform, normal };
}

function mixed(value: number): number {
  let h = value | 0;
  h = Math.imul(h ^ (h >>> 16), 0x85ebca6b);
  h = Math.imul(h ^ (h >>> 13), 0xc2b2ae35);
  return h ^ (h >>> 16);
}
