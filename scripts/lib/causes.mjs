import { ROOT } from './places.mjs';

const CAUSES = [
  [
    /ENOSPC|No space left on device|enough free space|EDQUOT|quota exceeded/i,
    'The disk is full. Free some space, then run the command again.',
  ],
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
  return CAUSES.find(([pattern]) => pattern.test(output))?.[1] ?? null;
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
