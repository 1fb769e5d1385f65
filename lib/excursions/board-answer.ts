import type { BoardRow } from './board-rows';

const WORDS = 'no one two three four five six seven eight nine ten eleven twelve'.split(' ');

/** A small number as a word, a larger one in figures. */
export function countWord(count: number): string {
  return WORDS[count] ?? String(count);
}

/**
 * The board's answer in plain sentences, made from its rows: "Three streams need someone. Nine are steady."
 * `find` is what the reader looked for, when these may not be all streams.
 *
 * @example boardAnswer(rows) // 'All twelve streams are steady.'
 */
export function boardAnswer(rows: readonly Pick<BoardRow, 'state'>[], find = ''): string {
  const total = rows.length;
  const found =
    find === ''
      ? ''
      : sentence(`${countWord(total)} ${total < 2 ? 'stream matches' : 'streams match'} “${find}”`);
  if (total === 0) return found || 'There is no stream yet.';
  const said = parts(rows, find === '');
  return found === '' ? said : `${found} ${said}`;
}

function parts(rows: readonly Pick<BoardRow, 'state'>[], named: boolean): string {
  const total = rows.length;
  const of = (group: BoardRow['state']['group']) => rows.filter((row) => row.state.group === group).length;
  const counts = [
    { count: of('needs-someone'), one: 'needs someone', many: 'need someone' },
    { count: of('steady'), one: 'is steady', many: 'are steady' },
    { count: of('not-judged'), one: 'is not judged yet', many: 'are not judged yet' },
  ];
  const whole = counts.find(({ count }) => count === total);
  if (whole !== undefined) {
    if (total === 1) return sentence(`${named ? 'the one stream' : 'it'} ${whole.one}`);
    const all = total === 2 ? 'both' : named ? `all ${countWord(total)}` : 'all';
    return sentence(`${all}${named ? ' streams' : ''} ${whole.many}`);
  }
  const said = counts.filter(({ count }) => count > 0);
  if (said[0] !== counts[0]) said.unshift({ count: 0, one: '', many: 'needs someone' });
  return said
    .map(({ count, one, many }, at) => {
      const noun = at > 0 || !named ? '' : count < 2 ? ' stream' : ' streams';
      const number = count === 0 && !named ? 'none' : countWord(count);
      return sentence(`${number}${noun} ${count === 1 ? one : many}`);
    })
    .join(' ');
}

function sentence(text: string): string {
  return `${text.charAt(0).toUpperCase()}${text.slice(1)}.`;
}
