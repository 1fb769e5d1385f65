'use client';

import { useState } from 'react';
import { ActionForm } from '@/app/_ui/action-form';
import { formWords } from '@/app/_ui/form-state';
import { SectionHead } from '@/app/_ui/section-head';
import { KINDS } from '@/lib/streams/schema';
import type { Stream } from '@/lib/streams/types';
import { ExpectedNote } from '../../expected-note';
import { SpecificationFields } from '../../specification-fields';
import { TargetFields } from '../../target-fields';
import { createStreamAction } from './actions';
import { ChartingFields } from './charting-fields';
import { IdentityFields } from './identity-fields';

/** Everything a new stream needs, on one page; the expected value follows what is typed. */
export function NewStreamForm({ plans }: { plans: readonly { id: string; name: string }[] }) {
  const [words, setWords] = useState<Record<string, string>>({});
  const quantity: Stream['quantity'] =
    words['quantity'] === 'sheet_resistance' ? 'sheet_resistance' : 'resistivity';
  const kind = KINDS.find((one) => one === words['kind']) ?? 'substrate';
  return (
    <ActionForm
      action={createStreamAction}
      label="New stream"
      submit="Set up this stream"
      working="Setting it up…"
      onInput={(form) => setWords(formWords(form))}
    >
      {({ errors }) => (
        <>
          <SectionHead>What it is</SectionHead>
          <IdentityFields errors={errors} plans={plans} name={words['name'] ?? ''} />
          <SectionHead>How it is charted</SectionHead>
          <ChartingFields errors={errors} />
          <SectionHead>What it aims at</SectionHead>
          <div className="with-beside">
            <div>
              <TargetFields initial={{}} words={words} errors={errors} kind={kind} quantity={quantity} />
            </div>
            <ExpectedNote words={words} quantity={quantity} />
          </div>
          <SectionHead>What is accepted</SectionHead>
          <SpecificationFields specification={null} quantity={quantity} errors={errors} />
        </>
      )}
    </ActionForm>
  );
}
