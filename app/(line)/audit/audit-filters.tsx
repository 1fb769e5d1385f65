import { Button } from '@/app/_ui/button';
import { Field, SelectField } from '@/app/_ui/field';
import { AUDIT_ACTIONS } from '@/lib/access/audit-action';
import type { AuditQuery } from '@/lib/access/schema';
import { siteTimeField } from '@/lib/site-time';
import styles from './audit-filters.module.css';

/** Which entries are shown: by whom, on which stream, what, and when. All of it lives in the address. */
export function AuditFilters(props: {
  query: AuditQuery;
  streams: readonly { slug: string; name: string }[];
  timeZone: string;
}) {
  const { query, streams, timeZone } = props;
  const time = (moment: Date | null) => (moment === null ? '' : siteTimeField(moment, timeZone));
  return (
    <form action="/audit" className={styles.filters} key={JSON.stringify(query)}>
      <Field name="who" label="Who" defaultValue={query.who ?? ''} maxLength={100} />
      <SelectField name="action" label="What" defaultValue={query.action ?? ''}>
        <option value="">anything</option>
        {AUDIT_ACTIONS.map((action) => (
          <option key={action} value={action}>
            {action}
          </option>
        ))}
      </SelectField>
      <SelectField name="stream" label="Stream" defaultValue={query.stream ?? ''}>
        <option value="">any, or none</option>
        {streams.map(({ slug, name }) => (
          <option key={slug} value={slug}>
            {name}
          </option>
        ))}
      </SelectField>
      <Field name="from" label="From" type="datetime-local" defaultValue={time(query.from)} />
      <Field name="to" label="Until" type="datetime-local" defaultValue={time(query.to)} />
      <Button type="submit">Show</Button>
    </form>
  );
}
