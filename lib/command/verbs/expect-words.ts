import type { ExpectAnswer } from './expect-bulk';
import type { LayerAnswer } from './expect-layer';

/** Five digits; large figures as 1.34e15, which can be typed back. */
function figure(value: number): string {
  const rounded = Number(value.toPrecision(5));
  return Math.abs(rounded) >= 1e6 ? rounded.toExponential().replace('e+', 'e') : rounded.toString();
}

const signed = (value: number, digits: number): string =>
  `${value < 0 ? '−' : '+'}${Math.abs(value).toFixed(digits)}`;

function layerWords(answer: LayerAnswer): string[] {
  return [
    `sheet resistance  ${figure(answer.sheetResistanceOhmSq)} Ω/□ at ${answer.temperatureC} °C`,
    `junction depth    ${figure(answer.junctionDepthUm)} µm`,
    `dose              ${figure(answer.dosePerCm2)} per cm²`,
  ];
}

function movedWords(answer: ExpectAnswer | LayerAnswer): string[] {
  const moved = answer.sensitivities;
  if (moved === null) return [];
  const words = [`${signed(moved.perPercentDopant, 3)} % for 1 % more dopant`];
  if (moved.perMeasurementC !== null)
    words.push(`${signed(moved.perMeasurementC, 3)} % for 1 °C of the wafer`);
  if (moved.perPercentThickness !== null) {
    const whose = 'sheetResistanceOhmSq' in answer ? 'thickness' : 'the thickness it is computed by';
    words.push(`${signed(moved.perPercentThickness, 3)} % for 1 % of ${whose}`);
  }
  if (moved.perDriveInC !== null) words.push(`${signed(moved.perDriveInC, 3)} % for 1 °C of the drive-in`);
  return [`it moves          ${words.join(', ')}`];
}

function budgetWords({ budget }: ExpectAnswer): string[] {
  if (budget === null) return ['uncertainty       none: an order of magnitude only'];
  return [
    'uncertainty budget (JCGM 100:2008), in percent, k = 1',
    ...budget.parts.map(({ name, kind, boundPercent, standardPercent, isCommon, source }) => {
      const how = boundPercent === null ? kind : `±${boundPercent.toPrecision(3)} ${kind}`;
      const whose = isCommon ? 'common to the stream' : 'of one wafer';
      return `  ${standardPercent.toFixed(3).padStart(7)}  ${name}: ${how}, ${whose}; ${source}`;
    }),
    `  ${budget.standardPercent.toFixed(3).padStart(7)}  together; ${budget.expandedPercent.toFixed(2)} with k = 2; ${budget.betweenWafersPercent.toFixed(3)} between wafers`,
  ];
}

const CAUSE_WORDS = {
  dopant: 'more dopant',
  'measurement-temperature': 'warmer wafer at the measurement',
  thickness: 'more thickness',
  'drive-in-temperature': 'hotter drive-in',
} as const;

function causeWords({ causes }: ExpectAnswer): string[] {
  if (causes === undefined) return [];
  return [
    'each would by itself explain the difference; a reading alone tells none from the other',
    ...causes.map(
      ({ cause, unit, size, uncertainty, timesUsual, isOnSlope }) =>
        `  ${signed(size, 2)} ± ${uncertainty.toFixed(2)} ${unit} ${CAUSE_WORDS[cause]}, ${timesUsual.toFixed(1)} times what is usual (common practice, no source)${isOnSlope ? '' : '; farther than the slope carries'}`,
    ),
    'Before any equipment is touched: site procedures, change control, qualified staff.',
  ];
}

/** An answer of `expect` in lines for a person; the budget where it is asked for. */
export function expectWords(answer: ExpectAnswer | LayerAnswer, withBudget: boolean): string[] {
  const uncertainty =
    answer.uncertaintyPercent === null
      ? 'order of magnitude only, no band'
      : `${answer.uncertaintyPercent.toFixed(1)} % (k = 1)`;
  return [
    ...('sheetResistanceOhmSq' in answer ? layerWords(answer) : []),
    `resistivity       ${figure(answer.resistivityOhmCm)} Ω·cm at ${answer.temperatureC} °C`,
    `doping            ${figure(answer.densityPerCm3)} per cm³, ${answer.type === 'intrinsic' ? 'as good as intrinsic' : `${answer.type}-type`}`,
    `uncertainty       ${uncertainty}, model ${answer.model}`,
    `carriers          ${figure(answer.carriers.electronsPerCm3)} electrons, ${figure(answer.carriers.holesPerCm3)} holes per cm³`,
    ...movedWords(answer),
    ...(withBudget ? budgetWords(answer) : []),
    ...causeWords(answer),
    ...answer.notes.map((note) => `note: ${note}`),
  ];
}
