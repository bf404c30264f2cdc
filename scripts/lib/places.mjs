import { fileURLToPath } from 'node:url';

/** The project's folder, with a slash at its end. */
export const ROOT = fileURLToPath(new URL('../../', import.meta.url));

/** Everything the project makes while running; ignored by git. */
export const DATA = `${ROOT}.data`;
