import { describe, expect, it } from 'vitest';
import { klaassenMobility, type Scattering } from '@/lib/physics/klaassen-mobility';

/**
 * The unified model written down once more, straight from its equations: D. B. M. Klaassen, Solid-State Electronics 35,
 * 953 and 961 (1992), the minority factor held at its least by looking at every P on a fine grid.
 */
function electronsAgain(s: Scattering, kelvin: number): number {
  const t = kelvin / 300;
  const [max, min, reference, alpha, theta] =
    s.donor === 'phosphorus' ? [1414, 68.5, 9.2e16, 0.711, 2.285] : [1417, 52.2, 9.68e16, 0.68, 2.285];
  const { donorsPerCm3: nd, acceptorsPerCm3: na, electronsPerCm3: n, holesPerCm3: p } = s;
  const donors = nd === 0 ? 0 : nd * (1 + 1 / (0.21 + (4e20 / nd) ** 2));
  const acceptors = na === 0 ? 0 : na * (1 + 1 / (0.5 + (7.2e20 / na) ** 2));
  const [me, mh, c] = [1, 1.258, n + p];
  const nsc = donors + acceptors + p;
  const P = 1 / (2.459 / (3.97e13 * (t ** 3 / nsc) ** (2 / 3)) + 3.828 / ((1.36e20 * me * t * t) / c));
  const G = (x: number): number =>
    1 -
    0.89233 / (0.41372 + x * (t / me) ** 0.28227) ** 0.19778 +
    0.005978 / (x * (me / t) ** 0.72169) ** 1.80618;
  let least = G(P);
  for (let x = P; x < 10; x *= 1.0005) least = Math.min(least, G(x));
  const isBelow = G(P * 1.001) < G(P);
  const F = (0.7643 * P ** 0.6478 + 2.2999 + (6.5502 * me) / mh) / (P ** 0.6478 + 2.367 - (0.8552 * me) / mh);
  const neff = donors + (isBelow ? least : G(P)) * acceptors + p / F;
  const lattice = max * t ** -theta;
  const impurity = (max ** 2 / (max - min)) * t ** (3 * alpha - 1.5);
  const carrier = ((max * min) / (max - min)) * t ** -0.5;
  const scattered = impurity * (nsc / neff) * (reference / nsc) ** alpha + (carrier * c) / neff;
  return 1 / (1 / lattice + 1 / scattered);
}

describe('the Klaassen model', () => {
  // Formulas and constants [2]; every value here [calc].
  it.each([
    [
      'electrons among donors',
      { donorsPerCm3: 1e17, acceptorsPerCm3: 0, electronsPerCm3: 1e17, holesPerCm3: 1e3 },
    ],
    [
      'electrons among acceptors',
      { donorsPerCm3: 0, acceptorsPerCm3: 1e18, electronsPerCm3: 1e2, holesPerCm3: 1e18 },
    ],
    [
      'compensated silicon',
      { donorsPerCm3: 9e16, acceptorsPerCm3: 1e17, electronsPerCm3: 1e4, holesPerCm3: 1e16 },
    ],
    [
      'heavy acceptors, beyond the minority factor’s least',
      { donorsPerCm3: 0, acceptorsPerCm3: 3e20, electronsPerCm3: 1, holesPerCm3: 3e20 },
    ],
    [
      'plenty of both carriers',
      { donorsPerCm3: 1e15, acceptorsPerCm3: 1e14, electronsPerCm3: 1e17, holesPerCm3: 1e17 },
    ],
  ])('comes out as its equations for %s, from 250 to 400 K', (_, densities) => {
    for (const donor of ['phosphorus', 'arsenic'] as const) {
      for (const kelvin of [250, 300, 400]) {
        const scattering = { donor, ...densities };
        const again = electronsAgain(scattering, kelvin);
        expect(klaassenMobility('electron', scattering, kelvin) / again).toBeCloseTo(1, 6);
      }
    }
  });

  it('gives minority electrons more freedom than majority ones at the same doping [calc]', () => {
    const minority = {
      donor: 'phosphorus' as const,
      donorsPerCm3: 0,
      acceptorsPerCm3: 1e18,
      electronsPerCm3: 1,
      holesPerCm3: 1e18,
    };
    const majority = {
      ...minority,
      donorsPerCm3: 1e18,
      acceptorsPerCm3: 0,
      electronsPerCm3: 1e18,
      holesPerCm3: 1,
    };
    expect(klaassenMobility('electron', minority, 300)).toBeGreaterThan(
      klaassenMobility('electron', majority, 300),
    );
  });
});
