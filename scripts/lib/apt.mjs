import { Stop, say } from './say.mjs';
import { has, run } from './run.mjs';

/** Installs Debian packages, as root or through sudo; every way it can fail is one sentence. */
export async function aptInstall(packages, what) {
  const names = packages.join(' ');
  if (!(await has('apt-get')))
    throw new Stop(
      `${what} is missing and there is no apt-get here. Install the packages ${names} of your system, then run the command again.`,
    );
  const prefix = await rootPrefix(what, names);
  say(`Installing ${what} from Debian’s packages (${names}) …`);
  await asRoot(prefix, ['apt-get', 'update']);
  const { code, output } = await asRoot(prefix, [
    'apt-get',
    'install',
    '-y',
    '--no-install-recommends',
    ...packages,
  ]);
  if (code === 0) return;
  if (/No space left on device/i.test(output))
    throw new Stop(
      `The disk is full: ${what} could not be installed. Free some space and run the command again.`,
    );
  const last = output.trim().split('\n').at(-1) ?? '';
  throw new Stop(
    `apt-get could not install ${names} (${last}). Check the network and the package sources, or install them by hand, then run the command again.`,
  );
}

/** Writes a file that only root may write. */
export async function writeAsRoot(path, text, what) {
  const prefix = await rootPrefix(what, path);
  const [program, ...args] = [
    ...prefix,
    'sh',
    '-c',
    `mkdir -p "$(dirname ${path})" && cat > ${path}`,
  ];
  const { spawnSync } = await import('node:child_process');
  spawnSync(program, args, { input: text });
}

async function rootPrefix(what, names) {
  if (process.getuid?.() === 0) return [];
  if (await has('sudo')) return ['sudo'];
  throw new Stop(
    `${what} is missing, and installing it needs root or sudo. As root run “apt-get install ${names}”, then run the command again.`,
  );
}

function asRoot(prefix, command) {
  const withEnvironment = ['env', 'DEBIAN_FRONTEND=noninteractive', ...command];
  const [program, ...args] = [...prefix, ...withEnvironment];
  return run(program, args);
}
