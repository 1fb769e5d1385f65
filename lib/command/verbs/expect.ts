import type { Verb } from '@/lib/command/verb';
import { expectBulk, type ExpectAnswer } from './expect-bulk';
import { expectQuestion } from './expect-question';
import { expectLayer, type LayerAnswer } from './expect-layer';

const USAGE = `evenohm expect --dopant boron|phosphorus|arsenic|antimony
               --density PER_CM3 | --resistivity OHM_CM [--inverse numeric|direct]
               [--temperature-c C] [--model standard|masetti|arora|klaassen]
               [--counter-dopant DOPANT --counter-density PER_CM3]
               [--fraction G] [--json]
evenohm expect --dopant DOPANT --profile box|gaussian|erfc
               --peak-density PER_CM3 --length-um UM
               [--background-dopant DOPANT --background-density PER_CM3] [--json]

What physics expects a probe to read.

  --density        dopant atoms per cm³, as 1e15
  --resistivity    Ω·cm at the temperature; asks for the doping instead
  --inverse        numeric (closes a round trip) or the published direct fit
  --temperature-c  of the wafer (23)
  --model          standard: ASTM F723 / SEMI MF723; or a mobility model. With a
                   counter dopant masetti unless another model is named
  --counter-*      the dopant of the other type in compensated silicon
  --fraction       solidified fraction of the crystal; density or resistivity is
                   then the seed end's
  --profile        a layer: box of a thickness, or peak·exp(-(x/L)²), peak·erfc(x/L)
  --length-um      thickness of a box, L of the other two
  --background-*   what lies under the layer; it must be of the other type
  --json           one JSON object on standard output`;

/** Five digits; large figures as 1.34e15, which can be typed back. */
function figure(value: number): string {
  const rounded = Number(value.toPrecision(5));
  return Math.abs(rounded) >= 1e6 ? rounded.toExponential().replace('e+', 'e') : rounded.toString();
}

function lines(answer: ExpectAnswer | LayerAnswer): string[] {
  const layer =
    'sheetResistanceOhmSq' in answer
      ? [
          `sheet resistance  ${figure(answer.sheetResistanceOhmSq)} Ω/□`,
          `junction depth    ${figure(answer.junctionDepthUm)} µm`,
          `dose              ${figure(answer.dosePerCm2)} per cm²`,
        ]
      : [];
  return [
    ...layer,
    `resistivity       ${figure(answer.resistivityOhmCm)} Ω·cm at ${answer.temperatureC} °C`,
    `doping            ${figure(answer.densityPerCm3)} per cm³, ${answer.type === 'intrinsic' ? 'as good as intrinsic' : `${answer.type}-type`}`,
    `uncertainty       ${answer.uncertaintyPercent.toFixed(1)} % (k = 1), model ${answer.model}`,
    `carriers          ${figure(answer.carriers.electronsPerCm3)} electrons, ${figure(answer.carriers.holesPerCm3)} holes per cm³`,
    ...answer.notes.map((note) => `note: ${note}`),
  ];
}

/** `evenohm expect`: resistivity from doping, doping from resistivity, layers and crystals. */
export const expect: Verb = {
  name: 'expect',
  summary: 'what physics expects a probe to read',
  usage: USAGE,
  async run(args, output) {
    const question = expectQuestion(args);
    try {
      const answer = 'bulk' in question ? expectBulk(question.bulk) : expectLayer(question.layer);
      output.out(question.json ? JSON.stringify(answer) : lines(answer).join('\n'));
      return 0;
    } catch (error) {
      if (!(error instanceof RangeError)) throw error;
      output.say(error.message);
      return 3;
    }
  },
};
