import styles from './stream-boxes.module.css';

/** A stream that can be chosen. */
export interface StreamChoice {
  id: string;
  name: string;
}

/** Boxes to choose streams by, each sent under one name. */
export function StreamBoxes(props: {
  name: string;
  legend: string;
  streams: readonly StreamChoice[];
  chosen: readonly string[];
}) {
  return (
    <fieldset className={styles.streams}>
      <legend>{props.legend}</legend>
      {props.streams.map(({ id, name }) => (
        <label key={id}>
          <input type="checkbox" name={props.name} value={id} defaultChecked={props.chosen.includes(id)} />
          {name}
        </label>
      ))}
    </fieldset>
  );
}
