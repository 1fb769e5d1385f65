const typesText = (element: Element | null) =>
  element !== null &&
  element.matches('input:not([type=checkbox]):not([type=radio]), textarea, select, [contenteditable]');

/** A part that scrolls sideways keeps the arrows for that while it has the focus. */
const scrollsBy = (element: Element | null, key: string) =>
  (key === 'ArrowLeft' || key === 'ArrowRight') &&
  element !== null &&
  element.scrollWidth > element.clientWidth &&
  element.matches('[role=region][tabindex]');

/**
 * What a key press asks for: the link or field of the page that carries it in `aria-keyshortcuts`, `help` for the
 * list of keys, or null when the press belongs to someone else: a field being typed in, an open dialog, a chart
 * that has taken it, a table that scrolls sideways, a browser shortcut. Escape in a field only leaves the field.
 */
export function keyTarget(
  event: KeyboardEvent,
  options: { singleKeys: boolean },
): HTMLElement | 'help' | null {
  if (event.defaultPrevented || event.ctrlKey || event.metaKey || event.altKey || event.isComposing)
    return null;
  if (document.querySelector('dialog[open]') !== null) return null;
  const focused = document.activeElement;
  if (typesText(focused)) {
    if (event.key === 'Escape') (focused as HTMLElement).blur();
    return null;
  }
  if (event.key === '?') return 'help';
  if (event.key.length === 1 && !options.singleKeys) return null;
  if (scrollsBy(focused, event.key)) return null;
  if (event.key === 'Enter' || event.key === ' ' || event.key === 'Tab') return null;
  return document.querySelector<HTMLElement>(`[aria-keyshortcuts="${CSS.escape(event.key)}"]`);
}
