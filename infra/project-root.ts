import { fileURLToPath } from 'node:url';

/** The checkout's folder. */
export const projectRoot = fileURLToPath(new URL('..', import.meta.url));
