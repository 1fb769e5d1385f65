import type { Verb } from '@/lib/command/verb';
import { expectBulk } from './expect-bulk';
import { expectLayer } from './expect-layer';
import { expectQuestion } from './expect-question';
import { expectWords } from './expect-words';

const USAGE = `evenohm expect --dopant boron|phosphorus|arsenic|antimony
               --density PER_CM3 | --resistivity OHM_CM [--inverse numeric|direct]
               [--temperature-c C] [--model standard|masetti|arora|klaassen]
               [--conversion 23c|300k]
               [--counter-dopant DOPANT --counter-density PER_CM3] [--fraction G]
evenohm expect --dopant DOPANT --density PER_CM3 | --resistivity OHM_CM
               --thickness-um UM [--substrate-dopant DOPANT --substrate-density PER_CM3]
               [--method four-point|other]
evenohm expect --dopant DOPANT --profile box|gaussian|erfc --length-um UM
               --peak-density PER_CM3 | --dose-per-cm2 DOSE
               [--background-dopant DOPANT --background-density PER_CM3]
evenohm expect --dopant DOPANT --dose-per-cm2 DOSE --range-um UM --straggle-um UM
               [--drive-in-c C --drive-in-min MINUTES]
               --background-dopant DOPANT --background-density PER_CM3
evenohm expect --dopant DOPANT --profile pairs --pairs-file CSV
               [--background-dopant DOPANT --background-density PER_CM3]
with any: [--temperature-c C] [--measured VALUE] [--uncertainty]
          [--temperature-uncertainty-c C] [--thickness-uncertainty-percent P] [--json]

What physics expects a probe to read.

  --density        dopant atoms per cm³, as 1e15
  --resistivity    Ω·cm at the temperature; asks for the doping instead. With
                   --thickness-um at 23 °C
  --inverse        numeric (closes a round trip) or the published direct fit
  --temperature-c  of the wafer (23)
  --model          standard: ASTM F723 / SEMI MF723; or a mobility model. With a
                   counter dopant masetti unless another model is named
  --conversion     300k: the standard's fits made at 300 K instead of 23 °C
  --counter-*      the dopant of the other type in compensated silicon
  --fraction       solidified fraction of the crystal; densities or resistivity
                   are then the seed end's, and each dopant segregates by itself
  --thickness-um   a grown layer: Rs = ρ/(t − w), w what its junction depletes
  --substrate-*    what it is grown on: of the other type, or a four-point probe
                   measures the substrate, unless --method other
  --profile        a layer: box of a thickness, peak·exp(-(x/L)²), peak·erfc(x/L),
                   an implant, or pairs from a file
  --length-um      thickness of a box, L of gaussian and erfc
  --range-um, --straggle-um
                   projected range and straggle of an implant
  --drive-in-*     furnace temperature and time after it (classical diffusion)
  --pairs-file     CSV with the columns depth_um and density_per_cm3
  --background-*   what lies under the layer; it must be of the other type
  --measured       what was measured, in the unit of the answer: what would
                   explain the difference
  --uncertainty    print the uncertainty budget part by part
  --*-uncertainty-*
                   standard uncertainty of temperature and thickness, for it
  --json           one JSON object on standard output`;

/** `evenohm expect`: resistivity from doping, doping from resistivity, layers and crystals. */
export const expect: Verb = {
  name: 'expect',
  summary: 'what physics expects a probe to read',
  usage: USAGE,
  async run(args, output) {
    try {
      const question = await expectQuestion(args);
      const { circumstances, budget, json } = question;
      const answer =
        'bulk' in question
          ? expectBulk(question.bulk, circumstances)
          : expectLayer(question.layer, circumstances);
      output.out(json ? JSON.stringify(answer) : expectWords(answer, budget).join('\n'));
      return 0;
    } catch (error) {
      if (!(error instanceof RangeError)) throw error;
      output.say(error.message);
      return 3;
    }
  },
};
