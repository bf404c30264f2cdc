import { existsSync } from 'node:fs';
import { stopCluster } from './lib/cluster.mjs';
import { DATA } from './lib/places.mjs';
import { runMain, say } from './lib/say.mjs';

await runMain(async () => {
  const ended = existsSync(DATA) && (await stopCluster(`${DATA}pg`));
  say(
    ended
      ? 'The database of this project has stopped.'
      : 'No database of this project was running.',
  );
});
