import { Stop } from './say.mjs';

/** The one version line of Node.js that the packages are pinned for. */
export function checkNode(version = process.versions.node) {
  const [major = 0, minor = 0] = version.split('.').map(Number);
  if (major === 20 && minor >= 19) return;
  throw new Stop(
    `Evenrun needs Node.js 20.19 or a later 20, and this is ${version}. Install Node.js 20, then run the command again.`,
  );
}
