import { benchBudget } from '@/app/(line)/expected/bench-budget';
import { benchQuestion, benchWords } from '@/app/(line)/expected/bench-question';
import { routeActor } from '@/app/route-actor';
import { csvResponse } from '@/lib/csv-response';
import { AppError, problemResponse } from '@/lib/errors';

const COLUMNS = ['part', 'kind', 'bound_percent', 'standard_percent', 'common_to_all_wafers', 'source'];

/** The uncertainty budget of a question of the bench as a file. */
export async function GET(request: Request): Promise<Response> {
  const actor = await routeActor(request, 'see-line');
  if (actor instanceof Response) return actor;
  const asked = Object.fromEntries(new URL(request.url).searchParams);
  const question = benchQuestion(benchWords(asked));
  const budget = question.target && benchBudget(question.target, question);
  if (!budget) {
    return problemResponse(new AppError('invalid', question.fault ?? 'The model ends before this question.'));
  }
  return csvResponse('expected-uncertainty.csv', COLUMNS, [
    ...budget.parts.map((part) => [
      part.name,
      part.kind,
      part.boundPercent,
      part.standardPercent,
      part.isCommon,
      part.source,
    ]),
    ['standard', 'k = 1', null, budget.standardPercent, null, 'JCGM 100:2008, 5.1.2'],
    ['expanded', 'k = 2', null, budget.expandedPercent, null, 'JCGM 100:2008, 6.2'],
    [
      'between wafers',
      'k = 1',
      null,
      budget.betweenWafersPercent,
      null,
      'without the parts common to a stream',
    ],
  ]);
}
