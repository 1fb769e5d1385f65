/**
 * Does something that may take long: says what after a second, and every five seconds that it still goes on.
 * What is quick stays silent.
 */
export async function withProgress<T>(
  say: (text: string) => void,
  what: string,
  work: () => Promise<T>,
): Promise<T> {
  const began = Date.now();
  const seconds = () => Math.round((Date.now() - began) / 1000);
  let every: NodeJS.Timeout | undefined;
  const first = setTimeout(() => {
    say(`${what}…`);
    every = setInterval(() => say(`${what}… ${seconds()} s`), 5000);
  }, 1000);
  try {
    return await work();
  } finally {
    clearTimeout(first);
    clearInterval(every);
    if (every !== undefined) say(`${what}: done in ${seconds()} s.`);
  }
}
