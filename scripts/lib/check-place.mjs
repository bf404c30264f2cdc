import { ROOT } from './places.mjs';
import { Stop } from './say.mjs';

/** Signs that a shell or a file pattern takes for its own: under them migrations are not found, or PostgreSQL fails. */
const AWKWARD = /['"`$\\()[\]{}*?!|<>;&]/;

/** The project’s folder may be called almost anything. */
export function checkPlace(folder = ROOT) {
  const sign = AWKWARD.exec(folder)?.[0];
  if (sign)
    throw new Stop(
      `The project lies in ${folder}, and the sign ${sign} in that name keeps its database from starting. Move or rename the folder, then run the command again.`,
    );
}
