/** A name for addresses and files, made of a stream's own: "N-epi, 200 mm" becomes "n-epi-200-mm". */
export function slugOf(name: string): string {
  return name
    .normalize('NFKD')
    .toLowerCase()
    .replace(/[^a-z0-9]+/g, '-')
    .replace(/^-+|-+$/g, '')
    .slice(0, 60);
}
