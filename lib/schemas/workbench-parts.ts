import { z } from 'zod';
import { typedNumber } from './number';

/** One of several, with nothing chosen beforehand. */
export const choice = <const Options extends readonly [string, ...string[]]>(
  options: Options,
  message: string,
) => z.enum(options, { error: message });

/** Degrees are checked by the arithmetic, which says what to do about −10 or 720. */
export const degrees = (what: string) => typedNumber({ what, unit: '°' });

export const grams = (what: string) => typedNumber({ what, unit: 'g', above: 0, max: 1e6 });

export const radius = (what: string) => typedNumber({ what, unit: 'mm', above: 0, max: 20_000 });

/** Never assumed: the way degrees and positions are counted. */
export const numbering = choice(
  ['against', 'with'],
  'Say which way degrees and positions are counted: against or with rotation.',
);

export const rotation = choice(
  ['clockwise', 'counter-clockwise'],
  'Say which way the rotor turns, seen from the drive end.',
);
