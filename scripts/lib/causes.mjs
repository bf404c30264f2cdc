const CAUSES = [
  [
    /ENOSPC|No space left on device/i,
    'The disk is full. Free some space, then run the command again.',
  ],
  [
    /EACCES|EPERM|Permission denied/i,
    'A file or folder here may not be read or written by this user, often because an earlier run was made as root. Run the command as the user who owns the folder .data, or remove that folder to begin anew.',
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
