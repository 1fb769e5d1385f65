import { carriers } from '@/lib/physics/carriers';
import { conductingThicknessUm } from '@/lib/physics/conducting-thickness';
import { conductionType } from '@/lib/physics/dopant';
import { expectedNotes } from '@/lib/physics/expected-notes';
import { ionizedCarriers } from '@/lib/physics/ionized-carriers';
import { implantPeakShare } from '@/lib/physics/layer-extent';
import { layerOfTarget, targetDriveIn } from '@/lib/physics/layer-of-target';
import { modelValue } from '@/lib/physics/model-value';
import { resistivityAtTemperature } from '@/lib/physics/resistivity-at-temperature';
import { sheetResistance, type LayerFigures } from '@/lib/physics/sheet-resistance';
import { standardResistivity } from '@/lib/physics/standard-resistivity';
import type { Target } from '@/lib/physics/target';
import { valueAtTemperature } from '@/lib/physics/value-at-temperature';
import type { ExpectAnswer } from './expect-bulk';
import { budgetIn, extras } from './expect-extras';
import type { Circumstances } from './expect-question';

/** The answer of `expect` for a layer: density, resistivity and carriers are those of its heaviest part. */
export type LayerAnswer = ExpectAnswer & LayerFigures;

function figuresOf(target: Target): LayerFigures {
  const { densityPerCm3, lengthUm } = target;
  if (target.profile !== 'uniform') return sheetResistance(layerOfTarget(target, densityPerCm3));
  return {
    sheetResistanceOhmSq: modelValue(target, densityPerCm3),
    junctionDepthUm: lengthUm ?? 0,
    dosePerCm2: densityPerCm3 * (lengthUm ?? 0) * 1e-4,
    topUm: 0,
  };
}

function notesOf(target: Target): string[] {
  const notes = expectedNotes(target, target.densityPerCm3);
  const drive = targetDriveIn(target, target.densityPerCm3);
  if (drive !== null) {
    notes.push(
      `The drive-in adds ${Math.sqrt(drive.spreadUm2).toPrecision(3)} µm to the straggle in quadrature (textbook diffusivity, from memory).`,
    );
  }
  if (target.profile === 'uniform') {
    const conducting = conductingThicknessUm(target, target.densityPerCm3, target.lengthUm ?? 0);
    notes.push(`${conducting.toPrecision(4)} µm of the layer conduct.`);
  } else {
    notes.push('Density, resistivity and carriers are those of the layer at its heaviest.');
  }
  return notes;
}

/** The highest density of the layer as it is, after the drive-in. */
function heaviest(target: Target): number {
  if (target.profile !== 'implant') return target.densityPerCm3;
  const layer = layerOfTarget(target, target.densityPerCm3);
  return target.densityPerCm3 * (layer.profile === 'implant' ? implantPeakShare(layer) : 1);
}

/** Answers `expect` for a layer, grown, implanted or diffused. Throws RangeError where the conversion ends. */
export function expectLayer(target: Target, circumstances: Circumstances): LayerAnswer {
  const { temperatureC } = circumstances;
  const figures = figuresOf(target);
  const density = heaviest(target);
  const isKnown = targetDriveIn(target, target.densityPerCm3)?.isClassical !== false;
  const budget = isKnown ? budgetIn(target, circumstances, null) : null;
  const type = conductionType(target.dopant);
  const other = target.profile === 'uniform' ? 0 : (target.backgroundDensityPerCm3 ?? 0);
  const [donors, acceptors] = type === 'n' ? [density, other] : [other, density];
  const { dopant, backgroundDopant } = target;
  const donor = dopant !== 'boron' ? dopant : backgroundDopant === 'boron' ? null : backgroundDopant;
  const temperatureK = temperatureC + 273.15;
  const sheet =
    temperatureC === 23
      ? figures.sheetResistanceOhmSq
      : valueAtTemperature(target, figures.sheetResistanceOhmSq, temperatureC);
  return {
    type,
    densityPerCm3: density,
    resistivityOhmCm: resistivityAtTemperature(
      dopant,
      density,
      standardResistivity(dopant, density),
      temperatureC,
    ),
    temperatureC,
    model: 'standard',
    uncertaintyPercent: budget?.standardPercent ?? null,
    carriers: carriers(donors, acceptors, temperatureK),
    ionizedCarriers: ionizedCarriers(
      { donor: donor ?? 'phosphorus', donorsPerCm3: donors, acceptorsPerCm3: acceptors },
      temperatureK,
    ),
    notes: notesOf(target),
    ...figures,
    sheetResistanceOhmSq: sheet,
    ...extras(target, sheet, circumstances, budget),
  };
}
