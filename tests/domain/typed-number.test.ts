import { describe, expect, it } from 'vitest';
import { z } from 'zod';
import { optionalNumber, tick, typedNumber } from '@/lib/schemas/number';

const mass = { what: 'the mass', unit: 'g', above: 0, max: 100 };

function saidOf(schema: z.ZodType, given: unknown): string | undefined {
  return schema.safeParse(given).error?.issues[0]?.message;
}

describe('what a form leaves out', () => {
  const form = z.object({ ticked: tick, mass: optionalNumber(mass) });

  it('is an empty tick and a number not known', () => {
    expect(form.parse({})).toEqual({ ticked: false, mass: null });
    expect(form.parse({ ticked: undefined, mass: undefined })).toEqual({
      ticked: false,
      mass: null,
    });
  });

  it('is not what it says', () => {
    expect(form.parse({ ticked: 'on', mass: '12,5' })).toEqual({ ticked: true, mass: 12.5 });
    expect(form.parse({ ticked: 'false', mass: '' })).toEqual({ ticked: false, mass: null });
  });
});

describe('a typed number', () => {
  it.each([
    ['12.5', 12.5],
    ['12,5', 12.5],
    [' 7 ', 7],
    ['.5', 0.5],
    [3, 3],
  ])('%s is %d', (typed, value) => {
    expect(typedNumber(mass).parse(typed)).toBe(value);
  });

  it.each([
    ['twelve', '“twelve” is not a number. Write the mass in g as digits, for example 12.5.'],
    ['1.234,5', '“1.234,5” is not a number. Write the mass in g as digits, for example 12.5.'],
    ['', 'Write the mass in g.'],
    ['\u22125', 'The mass is -5\u00a0g: it must be more than 0\u00a0g.'],
    ['101', 'The mass is 101\u00a0g: it must be at most 100\u00a0g.'],
    [Infinity, 'Write the mass in g.'],
    [undefined, 'Write the mass in g.'],
  ])('%s is refused in words', (typed, words) => {
    expect(saidOf(typedNumber(mass), typed)).toBe(words);
  });
});
