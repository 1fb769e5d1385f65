import { fileURLToPath } from 'node:url';

/** The folder of the clone. */
export const projectRoot = fileURLToPath(new URL('../../', import.meta.url));
