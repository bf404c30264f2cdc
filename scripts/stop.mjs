import { stopCluster } from './lib/cluster.mjs';
import { DATA } from './lib/places.mjs';
import { endTheOne } from './lib/running.mjs';
import { runMain, say } from './lib/say.mjs';

await runMain(async () => {
  const ended = await endTheOne();
  if (ended) say(`The web server${ended.address ? ` at ${ended.address}` : ''} has stopped.`);
  const stopped = await stopCluster(DATA);
  say(
    stopped
      ? 'The database of this project has stopped; its data is kept.'
      : 'No database of this project was running.',
  );
});
