import { causeOf, tellingLine } from './causes.mjs';
import { has, run } from './run.mjs';
import { Stop, say } from './say.mjs';

/**
 * Installs Debian packages, as root or through sudo. `before` is a shell line run first with the same rights.
 * Every way it can fail is one sentence.
 */
export async function aptInstall(packages, what, before = '') {
  const names = packages.join(' ');
  const prefix = await rights(what, names);
  say(`Installing ${what} from Debian’s packages (${names}); this can take a few minutes …`);
  if (before) await as(prefix, ['sh', '-c', before], what, names);
  // An install cut short, by a power cut say, has to be finished first; else this does nothing.
  await attempt([...prefix, ...QUIETLY, 'dpkg', '--configure', '-a']);
  // A first list of packages that fails still may leave what is needed within reach.
  await attempt([...prefix, ...APT, 'update']);
  await as(prefix, [...APT, 'install', '-y', '--no-install-recommends', ...packages], what, names);
}

const QUIETLY = ['env', 'DEBIAN_FRONTEND=noninteractive'];
const APT = [...QUIETLY, 'apt-get', '-o', 'DPkg::Lock::Timeout=300'];

async function rights(what, names) {
  if (!(await has('apt-get')))
    throw new Stop(
      `${what} is missing and there is no apt-get here. Install ${names} the way this system does, then run the command again.`,
    );
  if (process.getuid() === 0) return [];
  if (await has('sudo')) return ['sudo'];
  throw new Stop(
    `${what} is missing, and installing it needs root or sudo. Run “apt-get install ${names}” as root, then run the command again.`,
  );
}

async function as(prefix, command, what, names) {
  const { code, output } = await attempt([...prefix, ...command]);
  if (code === 0) return;
  if (/a (terminal|password) is required|not in the sudoers|not allowed to/i.test(output))
    throw new Stop(
      `${what} is missing, and sudo does not let this user install it. Run “apt-get install ${names}” as root, then run the command again.`,
    );
  if (/Unable to locate package|Failed to fetch|Temporary failure|Could not resolve/i.test(output))
    throw new Stop(
      `${what} could not be installed: Debian’s packages cannot be reached. Check the network and /etc/apt/sources.list, then run the command again.`,
    );
  throw new Stop(
    causeOf(output) ??
      `${what} could not be installed (${tellingLine(output)}). Run “apt-get install ${names}” as root, then run the command again.`,
  );
}

/** Where this run is killed, the install goes on; the next one waits for it. */
function attempt([program, ...args]) {
  return run(program, args, { outlives: true });
}
