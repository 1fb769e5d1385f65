import type { ComponentProps } from 'react';
import styles from './button.module.css';

/** A button. `weight` is `main` for the one action a page is for, else `plain`. */
export function Button({
  weight = 'plain',
  type = 'button',
  ...rest
}: ComponentProps<'button'> & { weight?: 'main' | 'plain' }) {
  return <button {...rest} type={type} className={weight === 'main' ? styles.main : styles.plain} />;
}
