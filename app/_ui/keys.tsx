'use client';

import { useEffect, useRef } from 'react';
import { keyTarget } from './key-target';
import styles from './keys.module.css';
import { useRemembered } from './use-remembered';

/**
 * The keyboard of the whole site. A page takes part by marking its links and fields with `aria-keyshortcuts`
 * ("ArrowLeft", "Escape", "/"): the key then does what a click there would, so nothing is reachable by key alone.
 * Single characters can be switched off in the same dialog (WCAG 2.2, success criterion 2.1.4).
 */
export function Keys({ keys }: { keys: readonly { key: string; does: string }[] }) {
  const dialog = useRef<HTMLDialogElement>(null);
  const [single, setSingle] = useRemembered('single-keys', 'on');

  useEffect(() => {
    const onKey = (event: KeyboardEvent) => {
      const target = keyTarget(event, { singleKeys: single === 'on' });
      if (target === null) return;
      event.preventDefault();
      if (target === 'help') dialog.current?.showModal();
      else if (target instanceof HTMLInputElement) target.focus();
      else target.click();
    };
    document.addEventListener('keydown', onKey);
    return () => document.removeEventListener('keydown', onKey);
  }, [single]);

  return (
    <dialog ref={dialog} className={styles.dialog} aria-labelledby="keys-title">
      <h2 id="keys-title">Keys</h2>
      <dl>
        {keys.map(({ key, does }) => (
          <div key={key}>
            <dt>
              {key.split(' ').map((one) => (
                <kbd key={one}>{one}</kbd>
              ))}
            </dt>
            <dd>{does}</dd>
          </div>
        ))}
      </dl>
      <label>
        <input
          type="checkbox"
          checked={single === 'on'}
          onChange={(event) => setSingle(event.target.checked ? 'on' : 'off')}
        />
        Single-character keys (/ + −) act on the page
      </label>
      <form method="dialog">
        <button type="submit">Close</button>
      </form>
    </dialog>
  );
}
