import type { DemoStream } from './demo-stream';
import { diffusionLengthPercentPerC } from './diffusion-length-percent-per-c';
import type { MishapOnWafer } from './mishap-on-wafer';
import type { SeededRandom } from '@/lib/stats/seeded-random';
import { spreadAtSite } from './spread-at-site';

/** One deviation of each cause, in the causes' units. */
export interface Causes {
  dopingPercent: number;
  lengthPercent: number;
  temperatureC: number;
}

/** A wafer as it truly is: its values at the sites, and the mean thickness of its layer where it has one. */
export interface MadeWafer {
  values: number[];
  layerThicknessUm: number | null;
}

/**
 * Makes one wafer: the run's and its own deviations, its patterns, and what a mishap adds, through the physics of the
 * stream's target. `densityPerCm3` is the density meant for this wafer.
 */
export function makeWafer(
  stream: DemoStream,
  reading: (densityPerCm3: number, lnLength: number) => number,
  circumstances: { densityPerCm3: number; run: Causes; mishap: MishapOnWafer; random: SeededRandom },
): MadeWafer {
  const { making, target } = stream;
  const { run, mishap, random } = circumstances;
  const radiusMm = stream.diameterMm / 2;
  const doping =
    run.dopingPercent + making.dopingPercent.waferToWafer * random.normal() + mishap.dopingPercent;
  const length = run.lengthPercent + making.lengthPercent.waferToWafer * random.normal();
  const temperature = run.temperatureC + making.temperatureC.waferToWafer * random.normal();
  const strength = Math.exp(making.patternVariation * random.normal());
  const lengthPerC =
    making.setPointC === null ? 0 : diffusionLengthPercentPerC(target.dopant, making.setPointC);

  const values = stream.sites.map((site) => {
    const at = (cause: 'dopingPercent' | 'lengthPercent' | 'temperatureC'): number =>
      strength * spreadAtSite(making[cause].spread, site, radiusMm);
    const siteTemperature = temperature + at('temperatureC') + mishap.temperatureC(site, radiusMm);
    const siteLength = length + at('lengthPercent') + lengthPerC * siteTemperature;
    const density = circumstances.densityPerCm3 * (1 + (doping + at('dopingPercent')) / 100);
    return making.trueOverModel * reading(density, siteLength / 100);
  });
  const isLayer = stream.kind === 'epi' && target.lengthUm !== null;
  return { values, layerThicknessUm: isLayer ? (target.lengthUm ?? 0) * Math.exp(length / 100) : null };
}
