/** One place at which two records differ, both sides in words. */
export type ContentDifference = {
  /** “runs 2 › vectors 1 › amplitude”: places in lists count from 1. */
  readonly path: string;
  readonly one: string;
  readonly other: string;
};

/**
 * Where two values of plain data differ, in the order of the first, each place once. Members that only
 * one side has are “nothing” on the other.
 *
 * Example: `contentDifferences({ runs: [{ speedRpm: 990 }] }, { runs: [{ speedRpm: 991 }] })` is one
 * difference at `runs 1 › speedRpm`.
 */
export function contentDifferences(one: unknown, other: unknown, at = ''): ContentDifference[] {
  if (Object.is(one, other)) return [];
  if (isGroup(one) && isGroup(other) && Array.isArray(one) === Array.isArray(other)) {
    const keys = new Set([...Object.keys(one), ...Object.keys(other)]);
    return [...keys].flatMap((key) =>
      contentDifferences(memberOf(one, key), memberOf(other, key), pathTo(at, key, one)),
    );
  }
  return [{ path: at === '' ? 'the whole record' : at, one: said(one), other: said(other) }];
}

function isGroup(value: unknown): value is object {
  return typeof value === 'object' && value !== null;
}

function memberOf(group: object, key: string): unknown {
  const members: Readonly<Record<string, unknown>> = { ...group };
  return members[key];
}

function pathTo(at: string, key: string, group: object): string {
  if (Array.isArray(group)) return `${at} ${Number(key) + 1}`.trim();
  return at === '' ? key : `${at} › ${key}`;
}

const LONGEST = 80;

function said(value: unknown): string {
  if (value === undefined) return 'nothing';
  const text = typeof value === 'string' ? value : JSON.stringify(value);
  return text.length <= LONGEST ? text : `${text.slice(0, LONGEST - 1)}…`;
}
