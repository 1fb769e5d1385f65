import type { BoardStream } from './types';

/** The streams in whose name, place or recipe every word of `find` occurs, in any case and order. */
export function foundStreams<
  Found extends Pick<BoardStream, 'name' | 'slug' | 'tool' | 'chamber' | 'step' | 'recipe'>,
>(streams: readonly Found[], find: string): Found[] {
  const words = find.toLowerCase().split(/\s+/).filter(Boolean);
  return streams.filter(({ name, slug, tool, chamber, step, recipe }) => {
    const text = [name, slug, tool, chamber, step, recipe].join(' ').toLowerCase();
    return words.every((word) => text.includes(word));
  });
}
