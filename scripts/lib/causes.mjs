import { statfsSync } from 'node:fs';
import { ROOT } from './places.mjs';

const FULL =
  /ENOSPC|No space left on device|enough free space|EDQUOT|quota exceeded|wrote only \d+ of \d+ bytes/i;
const BROKEN_OFF = /Connection terminated|server closed the connection|ECONNRESET/i;
const LITTLE_BYTES = 32 * 1024 * 1024;

const CAUSES = [
  [
    /EACCES|EPERM|Permission denied/i,
    `This user may not read or write some of this project’s files, often because they were fetched or made as root. Run the command as root, or end what runs from this folder and give it to this user: as root, “chown -R ${process.getuid()} ${ROOT}”.`,
  ],
  [
    /EAI_AGAIN|ENOTFOUND|ETIMEDOUT|ENETUNREACH|EHOSTUNREACH|ECONNREFUSED|network connectivity/i,
    'The network cannot be reached. Check the connection, then run the command again.',
  ],
];

/** The plain sentence, cause and remedy, for what a program printed; null where none is known. */
export function causeOf(output) {
  return fullDisk(output) ?? CAUSES.find(([pattern]) => pattern.test(output))?.[1] ?? null;
}

/** The sentence for a full disk, which a database server may show by breaking off; else null. */
export function fullDisk(output) {
  const full = FULL.test(output) || (BROKEN_OFF.test(output) && freeBytes() < LITTLE_BYTES);
  return full ? 'The disk is full. Free some space, then run the command again.' : null;
}

function freeBytes() {
  const { bavail, bsize } = statfsSync(ROOT);
  return bavail * bsize;
}

/** The line of a program's output that most likely says what went wrong. */
export function tellingLine(output) {
  const lines = output
    .split('\n')
    .map((line) => line.trim())
    .filter(Boolean);
  const telling = lines.findLast((line) => /FATAL|ERROR|\berror\b|^E:/i.test(line));
  return telling ?? lines.at(-1) ?? 'no reason given';
}
