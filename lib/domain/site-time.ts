import { fail, ok, type Failure, type Result } from './result';

/** An instant as a person gave it. */
export type TypedInstant = {
  /** Milliseconds since 1970-01-01T00:00Z. */
  readonly atMs: number;
  /** Whether the text named its zone; otherwise the site's clock was taken. */
  readonly zoneStated: boolean;
  /** The site's clock shows this hour twice on that day; the first of the two was taken. */
  readonly doubled: boolean;
};

const SHAPE =
  /^(\d{4})-(\d{2})-(\d{2})(?:[T ](\d{2}):(\d{2})(?::(\d{2})(\.\d{1,3})?)?)?\s*(Z|[+-]\d{2}:?\d{2})?$/;

/**
 * The instant of a time written as ISO 8601. With a zone (`Z`, `+01:00`) that zone counts; without
 * one the text is read on the clock of `timeZone` (an IANA name). A date alone is its first minute.
 * Fails on text of another shape, on days and hours that do not exist, and on an hour that the
 * site's clock skips when summer time begins.
 *
 * Example: `2026-02-03T14:05` in `Europe/Berlin` is 2026-02-03T13:05Z.
 */
export function instantOfTyped(
  text: string,
  timeZone: string,
): Result<TypedInstant, Failure<'TIME_SHAPE' | 'TIME_SKIPPED'>> {
  const match = SHAPE.exec(text.trim());
  const wallMs = match === null ? NaN : wallClockMs(match);
  if (match === null || Number.isNaN(wallMs)) return wrongShape(text);
  const zone = match[8];
  if (zone !== undefined) {
    return ok({ atMs: wallMs - zoneOffsetMs(zone), zoneStated: true, doubled: false });
  }
  const fitting = candidates(wallMs, timeZone);
  const first = fitting[0];
  if (first === undefined) {
    return fail(
      'TIME_SKIPPED',
      `The clock of ${timeZone} skips ${text.trim()} (summer time begins): write the time with its zone, such as +01:00.`,
    );
  }
  return ok({ atMs: first, zoneStated: false, doubled: fitting.length > 1 });
}

function wrongShape(text: string) {
  const cause = text.trim() === '' ? 'The time is missing' : `“${text.trim()}” is not a time`;
  return fail('TIME_SHAPE', `${cause}: write it as 2026-02-03T14:05.`);
}

function wallClockMs(match: RegExpExecArray): number {
  const [year, month, day, hour, minute, second] = [1, 2, 3, 4, 5, 6].map((group) =>
    Number(match[group] ?? 0),
  ) as [number, number, number, number, number, number];
  const fraction = Math.round(Number(`0${match[7] ?? '.0'}`) * 1000);
  const ms = Date.UTC(year, month - 1, day, hour, minute, second, fraction);
  // Date.UTC lets 31 February run over into March: such a day does not exist.
  const read = new Date(ms);
  const wanted = [month, day, hour, minute].join(' ');
  const shown = [
    read.getUTCMonth() + 1,
    read.getUTCDate(),
    read.getUTCHours(),
    read.getUTCMinutes(),
  ].join(' ');
  return shown === wanted ? ms : NaN;
}

function zoneOffsetMs(zone: string): number {
  if (zone === 'Z') return 0;
  const [hours, minutes] = [Number(zone.slice(1, 3)), Number(zone.slice(-2))];
  return (zone.startsWith('-') ? -1 : 1) * (hours * 60 + minutes) * 60_000;
}

// Zones lie within a day of UTC and shift by a few hours at most: both offsets around the time are tried.
function candidates(wallMs: number, timeZone: string): number[] {
  const clock = new Intl.DateTimeFormat('en-GB', { ...FIELDS, timeZone });
  const offsets = [-24, 24].map((hours) => offsetMs(clock, wallMs + hours * 3_600_000));
  return [...new Set(offsets)]
    .map((offset) => wallMs - offset)
    .filter((atMs) => atMs + offsetMs(clock, atMs) === wallMs)
    .sort((a, b) => a - b);
}

const FIELDS = {
  year: 'numeric',
  month: '2-digit',
  day: '2-digit',
  hour: '2-digit',
  minute: '2-digit',
  second: '2-digit',
  hourCycle: 'h23',
} as const;

function offsetMs(clock: Intl.DateTimeFormat, atMs: number): number {
  const parts = new Map(clock.formatToParts(atMs).map(({ type, value }) => [type, Number(value)]));
  const part = (type: Intl.DateTimeFormatPartTypes): number => parts.get(type) ?? 0;
  const shown = Date.UTC(
    part('year'),
    part('month') - 1,
    part('day'),
    part('hour'),
    part('minute'),
    part('second'),
  );
  return shown - Math.floor(atMs / 1000) * 1000;
}
