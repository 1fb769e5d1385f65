/**
 * What happened and when, in one line; a sentence that asks something ends before it.
 *
 * @example toldWhen('8 in a row below the centre line', 'since run R1177') // '8 in a row below the centre line, since run R1177'
 * @example toldWhen('stuck gauge?', 'at run R0042') // 'stuck gauge? At run R0042'
 */
export function toldWhen(sentence: string, when: string): string {
  if (!sentence.endsWith('?')) return `${sentence}, ${when}`;
  return `${sentence} ${when.charAt(0).toUpperCase()}${when.slice(1)}`;
}
