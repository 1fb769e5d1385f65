'use client';

import { useState } from 'react';
import { Button } from '@/app/_ui/button';
import { formWords } from '@/app/_ui/form-state';
import { PageHead } from '@/app/_ui/page-head';
import { expectedOrNull } from '@/lib/physics/expected-or-null';
import { ExpectedNote } from '../setup/expected-note';
import { expectedWords } from '../setup/expected-rows';
import { targetWords } from '../setup/words';
import { BenchAnswer } from './bench-answer';
import { BenchFields } from './bench-fields';
import { benchAddress, benchQuestion, type BenchQuestion, type BenchWords } from './bench-question';

/** The bench: what stands in its fields is its address, and everything below follows as it is typed. */
export function Bench({ first }: { first: BenchWords }) {
  const [words, setWords] = useState<BenchWords>(first);
  const question = benchQuestion(words);
  const address = benchAddress(words);
  return (
    <>
      <PageHead
        answer={answerOf(question)}
        sub="What silicon should measure, by published physics, and how well that is known. The address of this page holds all that stands in its fields."
      />
      <form
        method="get"
        action="/expected"
        aria-label="What is asked"
        onInput={(event) => {
          const typed = formWords(new FormData(event.currentTarget));
          setWords(typed);
          window.history.replaceState(null, '', benchAddress(typed));
        }}
        onSubmit={(event) => event.preventDefault()}
      >
        <div className="with-beside">
          <div>
            <BenchFields first={first} words={words} question={question} />
            <noscript>
              <Button type="submit">Show</Button>
            </noscript>
          </div>
          <ExpectedNote words={words} quantity={question.quantity} />
        </div>
      </form>
      {question.target !== null && (
        <BenchAnswer target={question.target} question={question} query={address.split('?')[1] ?? ''} />
      )}
    </>
  );
}

/** The page's answer in one sentence. */
function answerOf({ target, fault, wafer, quantity }: BenchQuestion): string {
  if (target === null) return `Nothing is expected yet: ${fault ?? ''}`;
  const expected = expectedOrNull(target, wafer);
  const what = targetWords(target);
  if (expected === null) return `Of ${what} only the order of magnitude is known`;
  const where =
    wafer.ingotFraction === undefined || wafer.ingotFraction === null
      ? ''
      : `, at a solidified fraction of ${wafer.ingotFraction}`;
  const thick =
    quantity === 'sheet_resistance' && wafer.layerThicknessUm ? `, ${wafer.layerThicknessUm} µm thick` : '';
  return `${expectedWords(target, expected)} at 23 °C from ${what}${where}${thick}`;
}
