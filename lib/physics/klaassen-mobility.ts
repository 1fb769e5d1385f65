import { monotoneRoot } from './monotone-root';

/** What the carriers meet, all per cm³. */
export interface Scattering {
  donorsPerCm3: number;
  acceptorsPerCm3: number;
  electronsPerCm3: number;
  holesPerCm3: number;
  donor: 'phosphorus' | 'arsenic';
}

const LATTICE = {
  phosphorus: { max: 1414, min: 68.5, reference: 9.2e16, alpha: 0.711, theta: 2.285 },
  arsenic: { max: 1417, min: 52.2, reference: 9.68e16, alpha: 0.68, theta: 2.285 },
  boron: { max: 470.5, min: 44.9, reference: 2.23e17, alpha: 0.719, theta: 2.247 },
} as const;

const MASS = { electron: 1, hole: 1.258 } as const;

function clustered(density: number, floor: number, reference: number): number {
  return density === 0 ? 0 : density * (1 + 1 / (floor + (reference / density) ** 2));
}

function minorityFactor(p: number, t: number, mass: number): number {
  return (
    1 -
    0.89233 / (0.41372 + p * (t / mass) ** 0.28227) ** 0.19778 +
    0.005978 / (p * (mass / t) ** 0.72169) ** 1.80618
  );
}

/** The slope of `minorityFactor` against ln P: negative below its minimum, positive above. */
function minorityRise(p: number, t: number, mass: number): number {
  const pull = p * (t / mass) ** 0.28227;
  return (
    (0.89233 * 0.19778 * pull) / (0.41372 + pull) ** 1.19778 -
    (0.005978 * 1.80618) / (p * (mass / t) ** 0.72169) ** 1.80618
  );
}

/** P, or where the minority factor is least if that is more: below it the published formula turns up and is not used. */
function clampedP(p: number, t: number, mass: number): number {
  if (minorityRise(p, t, mass) >= 0) return p;
  return Math.exp(monotoneRoot((ln) => minorityRise(Math.exp(ln), t, mass), Math.log(p), 5, 1e-9) ?? 0);
}

/**
 * The mobility, in cm²/(V·s), of electrons or holes by the unified model, which tells majority from minority
 * carriers and screens impurities by the carriers themselves.
 *
 * Source: D. B. M. Klaassen, Solid-State Electronics 35, 953 and 961 (1992); the constant −0.8552 in F as in
 * general use, printed −0.01552 in the paper's table. Throws RangeError for a negative density, no carriers at
 * all, or a temperature that is not positive.
 *
 * @example klaassenMobility('electron', lightly doped phosphorus, 300) // 1414
 */
export function klaassenMobility(
  carrier: 'electron' | 'hole',
  scattering: Scattering,
  temperatureK: number,
): number {
  const {
    donorsPerCm3: donors,
    acceptorsPerCm3: acceptors,
    electronsPerCm3: n,
    holesPerCm3: holes,
  } = scattering;
  const carriers = n + holes;
  if (![donors, acceptors, n, holes].every((d) => d >= 0 && Number.isFinite(d)) || !(carriers > 0)) {
    throw new RangeError('Densities are not negative, and there are carriers.');
  }
  if (!(temperatureK > 0 && Number.isFinite(temperatureK))) {
    throw new RangeError(`A temperature is a positive number of kelvin, not ${temperatureK}.`);
  }
  const t = temperatureK / 300;
  const set = LATTICE[carrier === 'electron' ? scattering.donor : 'boron'];
  const mass = MASS[carrier];
  const massRatio = mass / MASS[carrier === 'electron' ? 'hole' : 'electron'];
  const donorCentres = clustered(donors, 0.21, 4e20);
  const acceptorCentres = clustered(acceptors, 0.5, 7.2e20);
  const opposite = carrier === 'electron' ? holes : n;
  const own = carrier === 'electron' ? donorCentres : acceptorCentres;
  const other = carrier === 'electron' ? acceptorCentres : donorCentres;
  const centres = donorCentres + acceptorCentres + opposite;
  const lattice = set.max * t ** -set.theta;
  if (centres === 0) return lattice;

  const screened = 3.97e13 * (t ** 3 / centres) ** (2 / 3);
  const unscreened = (1.36e20 * mass * t * t) / carriers;
  const p = 1 / (2.459 / screened + 3.828 / unscreened);
  const p64 = p ** 0.6478;
  const f = (0.7643 * p64 + 2.2999 + 6.5502 * massRatio) / (p64 + 2.367 - 0.8552 * massRatio);
  const g = minorityFactor(clampedP(p, t, mass), t, mass);
  const effective = own + g * other + opposite / f;
  const impurity = (set.max ** 2 / (set.max - set.min)) * t ** (3 * set.alpha - 1.5);
  const carrierTerm = ((set.max * set.min) / (set.max - set.min)) * t ** -0.5;
  const scattered =
    impurity * (centres / effective) * (set.reference / centres) ** set.alpha +
    (carrierTerm * carriers) / effective;
  return 1 / (1 / lattice + 1 / scattered);
}
