import styles from './finder.module.css';

/** A search field that works without script: it sends what was typed to `action`. The key / brings the reader here. */
export function Finder({ action, name, label }: { action: string; name: string; label: string }) {
  return (
    <form action={action} role="search" className={styles.finder}>
      <input
        type="search"
        name={name}
        aria-label={label}
        aria-keyshortcuts="/"
        placeholder={`${label}  /`}
        autoComplete="off"
      />
    </form>
  );
}
