'use client';

import { ActionForm } from '@/app/_ui/action-form';
import { Button } from '@/app/_ui/button';
import { CheckField } from '@/app/_ui/check-field';
import { discardFile, recordFile } from './actions';

interface Props {
  token: string;
  query: string;
  fresh: number;
  faulty: number;
  large: boolean;
}

/** The decision about a checked file: record it, record its sound part, put the refusal on record, or discard it. */
export function RecordForm(props: Props) {
  return (
    <>
      <form id="discard" action={discardFile.bind(null, props.token)} aria-label="Discard this file" />
      {props.fresh > 0 ? <Recording {...props} /> : props.faulty > 0 ? <Refusal {...props} /> : <Discard />}
    </>
  );
}

function Recording({ token, query, fresh, faulty, large }: Props) {
  const maps = fresh === 1 ? '1 map' : `${fresh} maps`;
  return (
    <ActionForm
      action={recordFile.bind(null, { token, query, faulty })}
      label="Record this file"
      submit={faulty > 0 ? `Record the ${maps}` : `Record ${maps}`}
      working={large ? 'Recording… this takes minutes; the batch appears under Intake' : 'Recording…'}
      aside={<Discard />}
    >
      {(state) => (
        <>
          {faulty > 0 && (
            <CheckField
              name="sound"
              label={`Record the sound ones: ${maps}; refuse the other ${faulty}`}
              hint="Without this nothing of a file with problems is recorded."
              error={state.errors['sound'] ?? null}
            />
          )}
          <CheckField
            name="history"
            label="These are old wafers: history"
            hint="They are recorded, shown and can make limits, but open no excursions."
          />
        </>
      )}
    </ActionForm>
  );
}

function Refusal({ token, query, faulty }: Props) {
  return (
    <ActionForm
      action={recordFile.bind(null, { token, query, faulty })}
      label="Put the refusal on record"
      submit="Put the refusal on record"
      working="Writing it down…"
      weight="plain"
      aside={<Discard />}
    >
      <input type="hidden" name="refusal" value="yes" />
    </ActionForm>
  );
}

function Discard() {
  return (
    <Button type="submit" form="discard">
      Discard the file
    </Button>
  );
}
