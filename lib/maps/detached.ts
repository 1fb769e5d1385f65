/** V8 keeps a piece of at least so many characters as a window on the text it was cut from. */
const SHORTEST_WINDOW = 13;

/** A copy of its own: a piece of a larger text would keep the whole of that text in memory. */
export function detached(text: string): string {
  return text.length < SHORTEST_WINDOW ? text : Buffer.from(text).toString();
}
