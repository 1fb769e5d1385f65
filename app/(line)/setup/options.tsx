/** The options of a choice, from its words; `none` adds an empty one in front. */
export function Options<Word extends string>(props: {
  words: Record<Word, string>;
  order: readonly Word[];
  none?: string;
}) {
  return (
    <>
      {props.none !== undefined && <option value="">{props.none}</option>}
      {props.order.map((word) => (
        <option key={word} value={word}>
          {props.words[word]}
        </option>
      ))}
    </>
  );
}
