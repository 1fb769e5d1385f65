import { open } from 'node:fs/promises';

const AT_ONCE = 1 << 16;

/**
 * The bytes of a file, a piece at a time, every piece in the same memory: it holds good until the next is asked for. A
 * stream makes a buffer for each piece, which waits for the collector while the next hundreds of megabytes are read.
 */
export async function* fileBytes(path: string): AsyncGenerator<Uint8Array> {
  const file = await open(path);
  try {
    const buffer = Buffer.allocUnsafe(AT_ONCE);
    for (;;) {
      const { bytesRead } = await file.read(buffer, 0, AT_ONCE);
      if (bytesRead === 0) return;
      yield buffer.subarray(0, bytesRead);
    }
  } finally {
    await file.close();
  }
}
