/** A Chromium on this machine; null where there is none. */
export function findChromium(): string | null;
/** The same; installs one where there is none. */
export function ensureChromium(): string;
