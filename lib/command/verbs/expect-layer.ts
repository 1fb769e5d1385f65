import { carriers } from '@/lib/physics/carriers';
import { conductionType } from '@/lib/physics/dopant';
import { expectedValue } from '@/lib/physics/expected-value';
import type { Layer } from '@/lib/physics/layer';
import { sheetResistance, type LayerFigures } from '@/lib/physics/sheet-resistance';
import { standardResistivity } from '@/lib/physics/standard-resistivity';
import type { ExpectAnswer } from './expect-bulk';

/** The answer of `expect` for a layer: density, resistivity and carriers are those at its surface. */
export type LayerAnswer = ExpectAnswer & LayerFigures;

/** Answers `expect` for a box, gaussian or erfc layer. Throws RangeError where the conversion ends. */
export function expectLayer(layer: Layer): LayerAnswer {
  const figures = sheetResistance(layer);
  const expected = expectedValue({
    quantity: 'sheet_resistance',
    dopant: layer.dopant,
    densityPerCm3: layer.peakDensityPerCm3,
    tolerancePercent: null,
    alongCrystal: false,
    profile: layer.profile,
    lengthUm: layer.lengthUm,
    backgroundDopant: layer.backgroundDopant,
    backgroundDensityPerCm3: layer.backgroundDensityPerCm3,
    calibrationFactor: null,
    calibrationPercent: null,
  });
  const type = conductionType(layer.dopant);
  const [own, other] = [layer.peakDensityPerCm3, layer.backgroundDensityPerCm3 ?? 0];
  return {
    type,
    densityPerCm3: own,
    resistivityOhmCm: standardResistivity(layer.dopant, own),
    temperatureC: 23,
    model: expected.model,
    uncertaintyPercent: expected.uncertaintyPercent,
    carriers: type === 'n' ? carriers(own, other, 296.15) : carriers(other, own, 296.15),
    notes: [...expected.notes, 'Density, resistivity and carriers are those at the surface.'],
    ...figures,
  };
}
