import { benchQuestion, benchWords } from '@/app/(line)/expected/bench-question';
import { routeActor } from '@/app/route-actor';
import { csvResponse } from '@/lib/csv-response';
import { conversionCurve } from '@/lib/physics/conversion-curve';
import { DOPANTS } from '@/lib/physics/dopant';

const COLUMNS = ['dopant', 'fit', 'density_per_cm3', 'temperature_c', 'resistivity_ohm_cm'];
const PER_DECADE = 20;

/** Resistivity against doping for every dopant at a temperature as a file; fits of one dopant are numbered, they do not meet. */
export async function GET(request: Request): Promise<Response> {
  const actor = await routeActor(request, 'see-line');
  if (actor instanceof Response) return actor;
  const asked = Object.fromEntries(new URL(request.url).searchParams);
  const { temperatureC } = benchQuestion(benchWords(asked));
  const rows = DOPANTS.flatMap((dopant) =>
    conversionCurve(dopant, temperatureC, PER_DECADE).flatMap((piece, i) =>
      piece.map(({ densityPerCm3, resistivityOhmCm }) => [
        dopant,
        i + 1,
        densityPerCm3,
        temperatureC,
        resistivityOhmCm,
      ]),
    ),
  );
  return csvResponse('doping-and-resistivity.csv', COLUMNS, rows);
}
