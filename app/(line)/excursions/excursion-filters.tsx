import { Button } from '@/app/_ui/button';
import { SelectField } from '@/app/_ui/field';
import { Tabs } from '@/app/_ui/tabs';
import type { ExcursionQuery } from '@/lib/excursions/schema';
import type { ExcursionList } from '@/lib/excursions/types';
import { listAddress } from '../list-address';
import styles from './excursion-filters.module.css';

/** Which excursions are shown: by state as tabs, by stream as a choice. Both live in the address. */
export function ExcursionFilters(props: {
  query: ExcursionQuery;
  counts: ExcursionList['counts'];
  streams: ExcursionList['streams'];
}) {
  const { query, counts, streams } = props;
  const { open, acknowledged, closed } = counts;
  const investigated = counts['under-investigation'];
  const tabs = [
    { state: 'unclosed', name: 'not closed', count: open + acknowledged + investigated },
    { state: 'open', name: 'nobody yet', count: open },
    { state: 'acknowledged', name: 'acknowledged', count: acknowledged },
    { state: 'under-investigation', name: 'under investigation', count: investigated },
    { state: 'closed', name: 'closed', count: closed },
    { state: 'all', name: 'all', count: open + acknowledged + investigated + closed },
  ] as const;
  return (
    <div className={styles.filters}>
      <Tabs
        label="By state"
        tabs={tabs.map(({ state, name, count }) => ({
          href: listAddress('/excursions', { ...query, state, page: 1 }),
          name: `${name} ${count}`,
          current: query.state === state,
        }))}
      />
      <form action="/excursions" className={styles.stream}>
        {query.state !== 'unclosed' && <input type="hidden" name="state" value={query.state} />}
        <SelectField key={query.stream} name="stream" label="Stream" defaultValue={query.stream ?? ''}>
          <option value="">all streams</option>
          {streams.map(({ slug, name }) => (
            <option key={slug} value={slug}>
              {name}
            </option>
          ))}
        </SelectField>
        <Button type="submit">Show</Button>
      </form>
    </div>
  );
}
