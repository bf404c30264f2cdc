import type { Role } from './domain/access/permissions';
import { normaliseDeg } from './domain/units';

/** Everything a person reads as a number, unit, date or fixed word is made here. */
export type DecimalMark = '.' | ',';

export type NumberOptions = {
  /** Significant digits where `decimals` is not given; digits before the mark are never rounded away. */
  significant?: number;
  /** Fixed decimals, for columns. */
  decimals?: number;
  decimalMark?: DecimalMark;
};

const NO_BREAK = '\u00a0';
const MINUS = '\u2212';

export const NOT_MEASURED = 'not measured';
export const NOT_KNOWN = 'not known';

/** 3 significant digits: 3.016 is “3.02”, 1487.4 is “1487”, −0.5 is “−0.500”. */
export function formatNumber(value: number, options: NumberOptions = {}): string {
  if (!Number.isFinite(value)) return NOT_KNOWN;
  const { significant = 3, decimals, decimalMark = '.' } = options;
  const size = Math.abs(value);
  const text = decimals === undefined ? significantText(size, significant) : size.toFixed(decimals);
  const sign = value < 0 && /[1-9]/.test(text) ? MINUS : '';
  return sign + text.replace('.', decimalMark);
}

/** “4.30 mm/s rms”, with no-break spaces, so that a number never parts from its unit. */
export function formatQuantity(value: number, unit: string, options: NumberOptions = {}): string {
  const number = formatNumber(value, options);
  if (number === NOT_KNOWN) return number;
  return unit === '' ? number : `${number}${NO_BREAK}${unit.replaceAll(' ', NO_BREAK)}`;
}

/** A setting as it stands, at most 6 significant digits and no zeros added: “2560 Hz”. */
export function formatExact(value: number, unit: string, decimalMark: DecimalMark = '.'): string {
  const text = String(Number(value.toPrecision(6))).replace('.', decimalMark);
  return unit === '' ? text : `${text}${NO_BREAK}${unit.replaceAll(' ', NO_BREAK)}`;
}

/** Grams to a tenth: “92.2 g”. */
export function formatMass(massG: number, decimalMark: DecimalMark = '.'): string {
  return formatQuantity(massG, 'g', { decimals: 1, decimalMark });
}

/** Whole degrees in [0, 360): 359.6 is “0°”. */
export function formatDegrees(deg: number, decimals = 0, decimalMark: DecimalMark = '.'): string {
  if (!Number.isFinite(deg)) return NOT_KNOWN;
  const rounded = normaliseDeg(Number(normaliseDeg(deg).toFixed(decimals)));
  return `${formatNumber(rounded, { decimals, decimalMark })}°`;
}

/** A phase with its sense: “128° lag”, or for a site that reads lead “232° lead”. */
export function formatLag(lagDeg: number, shown: 'lag' | 'lead' = 'lag'): string {
  return `${formatDegrees(shown === 'lag' ? lagDeg : -lagDeg)}${NO_BREAK}${shown}`;
}

/** “124° against rotation”. */
export function formatRotorAngle(angleDeg: number): string {
  return `${formatDegrees(angleDeg)}${NO_BREAK}against${NO_BREAK}rotation`;
}

/** Hours of a clock face as “7:52”; twelve o'clock is “12:00”. */
export function formatClock(hours: number): string {
  const minutes = Math.round((((hours % 12) + 12) % 12) * 60) % 720;
  const whole = Math.floor(minutes / 60);
  return `${whole === 0 ? 12 : whole}:${String(minutes % 60).padStart(2, '0')}`;
}

/** “1487 r/min”. */
export function formatSpeed(speedRpm: number, decimalMark: DecimalMark = '.'): string {
  return formatQuantity(speedRpm, 'r/min', { decimalMark });
}

/** A share of one as “77 %”. */
export function formatShare(share: number): string {
  return formatQuantity(share * 100, '%', { decimals: 0 });
}

/** “23 of 140”. */
export function formatCount(shown: number, all: number): string {
  return `${shown}${NO_BREAK}of${NO_BREAK}${all}`;
}

/** What a number box starts with: every digit kept, the site's decimal mark. */
export function formatForInput(value: number | null, decimalMark: DecimalMark = '.'): string {
  return value === null ? '' : String(value).replace('.', decimalMark);
}

const BYTE_STEPS = ['kB', 'MB', 'GB', 'TB'] as const;

/** Sizes in powers of ten: “512 B”, “29.9 MB”. */
export function formatBytes(bytes: number, decimalMark: DecimalMark = '.'): string {
  let size = bytes;
  let unit = 'B';
  for (const step of BYTE_STEPS) {
    if (size < 1000) break;
    size /= 1000;
    unit = step;
  }
  return unit === 'B'
    ? formatQuantity(size, unit, { decimals: 0 })
    : formatQuantity(size, unit, { decimalMark });
}

/** A length of time in seconds: “420 ms”, “12.8 s”, “3 min 05 s”, “2 h 10 min”. */
export function formatDuration(seconds: number): string {
  if (!Number.isFinite(seconds)) return NOT_KNOWN;
  if (seconds < 1) return formatQuantity(seconds * 1000, 'ms');
  if (seconds < 60) return formatQuantity(seconds, 's');
  const whole = Math.round(seconds);
  if (whole < 3600) return pair(Math.floor(whole / 60), 'min', whole % 60, 's');
  return pair(Math.floor(whole / 3600), 'h', Math.floor((whole % 3600) / 60), 'min');
}

type Instant = Date | string | number;

/** “3 Feb 2026, 14:05 CET”: in the site's zone, the zone named. */
export function formatDateTime(at: Instant, timeZone: string): string {
  return dateText(at, timeZone, { ...DAY, ...CLOCK, timeZoneName: 'short' });
}

/** “3 Feb 2026”, the day it was in the site's zone. */
export function formatDate(at: Instant, timeZone: string): string {
  return dateText(at, timeZone, DAY);
}

/** “14:05:09”, for tables where the zone stands in the head. */
export function formatTime(at: Instant, timeZone: string): string {
  return dateText(at, timeZone, { ...CLOCK, second: '2-digit' });
}

/** The name of the zone at that instant, for heads of tables: “CET”, “GMT+8”. */
export function formatZoneName(at: Instant, timeZone: string): string {
  const parts = formatter(timeZone, { ...DAY, timeZoneName: 'short' }).formatToParts(asDate(at));
  return parts.find((part) => part.type === 'timeZoneName')?.value ?? timeZone;
}

/** What a date-and-time box starts with: “2026-02-03T14:05” on the site's clock. */
export function formatForDateTimeInput(at: Instant, timeZone: string): string {
  const parts = formatter(timeZone, {
    year: 'numeric',
    month: '2-digit',
    day: '2-digit',
    ...CLOCK,
  }).formatToParts(asDate(at));
  const part = (type: Intl.DateTimeFormatPartTypes) =>
    parts.find((candidate) => candidate.type === type)?.value ?? '';
  return `${part('year')}-${part('month')}-${part('day')}T${part('hour')}:${part('minute')}`;
}

const MINUTE = 60_000;
const HOUR = 60 * MINUTE;
const DAY_LENGTH = 24 * HOUR;

/** Age of data: “just now”, “12 min ago”, “2 h ago”, “9 d ago”; ahead of now “in 3 d”. */
export function formatAge(at: Instant, now: Instant): string {
  const span = asDate(now).getTime() - asDate(at).getTime();
  if (!Number.isFinite(span)) return NOT_KNOWN;
  const size = Math.abs(span);
  if (size < MINUTE) return 'just now';
  const text =
    size < HOUR
      ? `${Math.floor(size / MINUTE)}${NO_BREAK}min`
      : size < 2 * DAY_LENGTH
        ? `${Math.floor(size / HOUR)}${NO_BREAK}h`
        : `${Math.floor(size / DAY_LENGTH)}${NO_BREAK}d`;
  return span > 0 ? `${text}${NO_BREAK}ago` : `in${NO_BREAK}${text}`;
}

/** Whole days between two instants, for “days since balance”. */
export function formatDays(from: Instant, to: Instant): string {
  const days = Math.floor((asDate(to).getTime() - asDate(from).getTime()) / DAY_LENGTH);
  return formatQuantity(days, 'd', { decimals: 0 });
}

export type ZoneLetter = 'A' | 'B' | 'C' | 'D';

export const ZONE_WORDS: Readonly<Record<ZoneLetter, string>> = {
  A: 'as new',
  B: 'fine',
  C: 'put right soon',
  D: 'act',
};

/** “C, put right soon”; without a zone “not judged”. */
export function formatZone(zone: ZoneLetter | null): string {
  return zone === null ? 'not judged' : `${zone}, ${ZONE_WORDS[zone]}`;
}

export const ROLE_NAMES: Readonly<Record<Role, string>> = {
  reader: 'Reader',
  technician: 'Technician',
  engineer: 'Reliability engineer',
  planner: 'Planner',
  administrator: 'Administrator',
};

/** Seen from which end, in the words that stand on a drawing. */
export const END_WORDS = {
  'drive-end': 'seen from the drive end',
  'other-end': 'seen from the other end',
} as const;

/** Labels of a number axis, all with the decimals that its step needs. */
export function formatTick(
  value: number,
  stepSize: number,
  decimalMark: DecimalMark = '.',
): string {
  const decimals = stepSize > 0 ? Math.max(0, Math.ceil(-Math.log10(stepSize) - 1e-9)) : 0;
  return formatNumber(value, { decimals: Math.min(decimals, 9), decimalMark });
}

/** Labels of a time axis: hours on the site's clock, days, or months, as the span asks for. */
export function formatTimeTick(at: Instant, spanMs: number, timeZone: string): string {
  if (spanMs < 2 * DAY_LENGTH) return dateText(at, timeZone, CLOCK);
  // Ticks of days and months stand at midnight UTC; read elsewhere they would name the day before.
  if (spanMs < 120 * DAY_LENGTH) return dateText(at, 'UTC', { day: 'numeric', month: 'short' });
  return dateText(at, 'UTC', { month: 'short', year: 'numeric' });
}

/** “1 weight”, “3 weights”. */
export function formatPlural(count: number, one: string, many = `${one}s`): string {
  return `${count}${NO_BREAK}${count === 1 ? one : many}`;
}

const DAY = { day: 'numeric', month: 'short', year: 'numeric' } as const;
const CLOCK = { hour: '2-digit', minute: '2-digit', hourCycle: 'h23' } as const;
const formatters = new Map<string, Intl.DateTimeFormat>();

function dateText(at: Instant, timeZone: string, options: Intl.DateTimeFormatOptions): string {
  const date = asDate(at);
  if (Number.isNaN(date.getTime())) return NOT_KNOWN;
  return formatter(timeZone, options).format(date);
}

/** Making a formatter is slow, using one is fast: lists of dates share them. */
function formatter(timeZone: string, options: Intl.DateTimeFormatOptions): Intl.DateTimeFormat {
  const key = `${timeZone} ${JSON.stringify(options)}`;
  const known = formatters.get(key);
  if (known) return known;
  const made = new Intl.DateTimeFormat('en-GB', { ...options, timeZone });
  formatters.set(key, made);
  return made;
}

function asDate(at: Instant): Date {
  return at instanceof Date ? at : new Date(at);
}

function pair(first: number, firstUnit: string, second: number, secondUnit: string): string {
  const rest = String(second).padStart(2, '0');
  return `${first}${NO_BREAK}${firstUnit}${NO_BREAK}${rest}${NO_BREAK}${secondUnit}`;
}

const SUPERSCRIPT = '⁰¹²³⁴⁵⁶⁷⁸⁹';

function significantText(size: number, significant: number): string {
  if (size === 0) return '0';
  if (size >= 1e9 || size < 1e-4) return powerText(size, significant);
  const rounded = Number(size.toPrecision(significant));
  const exponent = Math.floor(Math.log10(rounded));
  const decimals = Math.max(0, significant - 1 - exponent);
  return size.toFixed(decimals);
}

function powerText(size: number, significant: number): string {
  const [digits = '', power = ''] = size.toExponential(significant - 1).split('e');
  const raised = power
    .replace('+', '')
    .replace(/[-\d]/g, (sign) => (sign === '-' ? '⁻' : (SUPERSCRIPT[Number(sign)] ?? '')));
  return `${digits}${NO_BREAK}×${NO_BREAK}10${raised}`;
}
