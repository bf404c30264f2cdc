import { describe, expect, it } from 'vitest';
import { chooseLimitSets, type LimitSetWish } from '@/lib/domain/severity/choose-limit-sets';
import { fitWarnings, type MachineFacts } from '@/lib/domain/severity/fit-warnings';
import { SHIPPED_LIMIT_SETS } from '@/lib/domain/severity/shipped-limit-sets';

const pump: MachineFacts = { powerKw: 90, support: 'rigid', speedRpm: 1482 };
const keysFor = (machine: MachineFacts, wish: LimitSetWish = { family: 'machine' }) => {
  const chosen = chooseLimitSets(machine, wish, SHIPPED_LIMIT_SETS);
  return chosen.ok ? chosen.value.map(({ key }) => key) : chosen.failure;
};

describe('chooseLimitSets', () => {
  it('chooses the group by power and the set by support', () => {
    expect(keysFor(pump)).toEqual(['iso-20816-3-group-2-rigid']);
    expect(keysFor({ ...pump, powerKw: 300 })).toEqual(['iso-20816-3-group-2-rigid']);
    expect(keysFor({ ...pump, powerKw: 315, support: 'flexible' })).toEqual([
      'iso-20816-3-group-1-flexible',
    ]);
  });

  it('hands back both sets where the support is unknown', () => {
    expect(keysFor({ ...pump, support: 'unknown' })).toEqual([
      'iso-20816-3-group-2-rigid',
      'iso-20816-3-group-2-flexible',
    ]);
  });

  it('takes the band from 2 Hz up to and including 600 r/min', () => {
    expect(keysFor({ ...pump, speedRpm: 600 })).toEqual(['iso-20816-3-group-2-rigid-slow']);
    expect(keysFor({ ...pump, speedRpm: 601 })).toEqual(['iso-20816-3-group-2-rigid']);
  });

  it('keeps to the family and category asked for', () => {
    expect(keysFor(pump, { family: 'rotodynamic pump', group: 'category II' })).toEqual([
      'iso-10816-7-category-ii-small',
    ]);
    expect(keysFor({ ...pump, powerKw: null }, { family: 'fan', group: 'BV-3' })).toEqual([
      'iso-14694-bv-3-rigid',
    ]);
    expect(keysFor({ ...pump, powerKw: 7.5 }, { family: 'small machine' })).toEqual([
      'iso-10816-1-class-i',
    ]);
  });

  it('asks for the power where it decides', () => {
    expect(keysFor({ ...pump, powerKw: null })).toMatchObject({
      code: 'POWER_MISSING',
      field: 'powerKw',
    });
  });

  it.each([
    { ...pump, powerKw: 11 },
    { ...pump, speedRpm: 100 },
    { ...pump, powerKw: 60_000 },
  ])('says when nothing fits: %o', (machine) => {
    expect(keysFor(machine)).toMatchObject({ code: 'NO_SET_FITS' });
  });
});

describe('fitWarnings', () => {
  const group2 = {
    powerMinKw: 15,
    powerMaxKw: 300,
    speedMinRpm: 600,
    speedMaxRpm: 30_000,
    support: 'rigid',
  } as const;

  it('warns about 315 kW under group 2', () => {
    expect(fitWarnings(group2, { ...pump, powerKw: 315 })).toEqual([
      {
        field: 'powerKw',
        message:
          'The machine has 315 kW, the limits hold above 15 kW and up to 300 kW: choose the set for this power.',
      },
    ]);
  });

  it('warns about support and speed', () => {
    const wrong = fitWarnings(group2, { powerKw: 90, support: 'flexible', speedRpm: 300 });
    expect(wrong.map(({ field }) => field)).toEqual(['support', 'speedRpm']);
  });

  it('has nothing to say where the set fits or the facts are unknown', () => {
    expect(fitWarnings(group2, pump)).toEqual([]);
    expect(fitWarnings(group2, { powerKw: null, support: 'unknown', speedRpm: 1500 })).toEqual([]);
    expect(fitWarnings({ ...group2, support: 'any' }, { ...pump, support: 'flexible' })).toEqual(
      [],
    );
  });
});

describe('shipped limit sets', () => {
  it('have keys of their own, rising boundaries, a citation and its caution', () => {
    const keys = SHIPPED_LIMIT_SETS.map(({ key }) => key);
    expect(new Set(keys).size).toBe(keys.length);
    for (const { boundaries, citation, edition, bandLowHz, bandHighHz } of SHIPPED_LIMIT_SETS) {
      const { ab, bc, cd } = boundaries;
      expect(0 < ab && ab < bc && bc < cd).toBe(true);
      expect(bandLowHz).toBeLessThan(bandHighHz);
      expect(citation).toContain(edition);
      expect(citation).toContain('from memory of the standard, check against your copy');
    }
  });
});
