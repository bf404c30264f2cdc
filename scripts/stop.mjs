import { stopCluster } from './lib/cluster.mjs';
import { DATA } from './lib/places.mjs';
import { endProcess } from './lib/processes.mjs';
import { theOneRunning } from './lib/running.mjs';
import { runMain, say } from './lib/say.mjs';

await runMain(async () => {
  const running = theOneRunning();
  if (running) {
    await endProcess(running.pid);
    say(`The web server${running.address ? ` at ${running.address}` : ''} has stopped.`);
  }
  const ended = await stopCluster(DATA);
  say(
    ended
      ? 'The database of this project has stopped; its data stays in .data.'
      : 'No database of this project was running.',
  );
});
