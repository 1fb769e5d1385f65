import type { Figure } from '@/app/_ui/figures';
import { formatDensityPerCm3, formatPercent } from '@/lib/format';
import { carriers } from '@/lib/physics/carriers';
import { compensatedDoping, isCompensated } from '@/lib/physics/compensated-target';
import type { Doping } from '@/lib/physics/conduction-resistivity';
import { ionizedCarriers } from '@/lib/physics/ionized-carriers';
import { isUniform } from '@/lib/physics/is-uniform';
import type { ExpectedWafer, Target } from '@/lib/physics/target';

/** Kelvin at 0 °C. */
const ZERO_C = 273.15;

/** Electrons and holes of uniform silicon at a temperature, and the share of dopants that gave them; none of a graded layer. */
export function carrierRows(
  target: Target,
  densityPerCm3: number,
  temperatureC: number,
  wafer: ExpectedWafer = {},
): Figure[] {
  if (!isUniform(target)) return [];
  const doping = dopingOf(target, densityPerCm3, wafer);
  const kelvin = ZERO_C + temperatureC;
  const all = carriers(doping.donorsPerCm3, doping.acceptorsPerCm3, kelvin);
  const partly = ionizedCarriers(doping, kelvin);
  const ionized = target.dopant === 'boron' ? partly?.ionizedAcceptors : partly?.ionizedDonors;
  const definition =
    'Charge neutrality with both carriers, every dopant ionized; n·p by Misiakos and Tsamakis (1993).';
  return [
    { name: 'electrons', value: formatDensityPerCm3(all.electronsPerCm3), definition },
    { name: 'holes', value: formatDensityPerCm3(all.holesPerCm3), definition },
    {
      name: 'share ionized',
      value: ionized == null ? '—' : formatPercent(100 * ionized, 1),
      definition:
        'Altermatt and others (2006), for carriers only: the conversion of resistivity holds it already. Nothing is published for antimony.',
    },
  ];
}

function dopingOf(target: Target, densityPerCm3: number, wafer: ExpectedWafer): Doping {
  if (isCompensated(target)) return compensatedDoping(target, densityPerCm3, wafer);
  return target.dopant === 'boron'
    ? { donor: 'phosphorus', donorsPerCm3: 0, acceptorsPerCm3: densityPerCm3 }
    : { donor: target.dopant, donorsPerCm3: densityPerCm3, acceptorsPerCm3: 0 };
}
