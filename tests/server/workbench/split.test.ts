import { describe, expect, it } from 'vitest';
import { split } from '@/lib/server/workbench/split';
import { near, nearDeg } from '@/tests/domain/balancing/near';
import published from '@/tests/reference/data/balancing-published.json';
import { reader } from './runs-as-typed';

describe('split', () => {
  const given = {
    massG: '23,5',
    angleDeg: '137',
    radiusMm: '500',
    angleSense: 'against',
    rotationFromDriveEnd: 'clockwise',
    positions: '9',
    firstDeg: '0',
    numbered: 'against',
    maxG: '',
    speedRpm: '',
  } as const;

  it('carries WA-05 on blades 4 and 5', async () => {
    const { computed } = published['WA-05'];
    const result = await split(reader, given);
    const [first, second] = result.ok ? result.value.shares : [];
    expect([first?.label, second?.label]).toEqual(['4', '5']);
    near(first?.massG ?? NaN, computed.blade4_at_120, 1e-3);
    near(second?.massG ?? NaN, computed.blade5_at_160, 1e-3);
    expect(result.ok && result.value.sumOverWhole).toBeCloseTo(computed['sum/target'], 4);
  });

  // WA-01: balancing weights article (read): 1.925 oz on a circle of nine bolts. WA-02: government guide for
  // large rotors (read), drawn, so ± 1.5 lb. WA-07 and 30 g at 100°: computed independently.
  it.each([
    {
      name: 'WA-01',
      mass: [1.925, 250],
      ring: [9, 0],
      on: ['7', '8'],
      want: [1.4974, 0.52],
      within: 1e-4,
    },
    { name: 'WA-02', mass: [50, 15], ring: [6, 0], on: ['1', '2'], want: [42, 15], within: 1.5 },
    {
      name: 'WA-07',
      mass: [10, 140],
      ring: [9, 0],
      on: ['4', '5'],
      want: [5.3209, 5.3209],
      within: 1e-4,
    },
    {
      name: '30 g',
      mass: [30, 100],
      ring: [6, 20],
      on: ['2', '3'],
      want: [22.27, 11.85],
      within: 0.01,
    },
  ])('carries $name on two positions', async ({ mass, ring, on, want, within }) => {
    const result = await split(reader, {
      ...given,
      massG: mass[0] ?? NaN,
      angleDeg: mass[1] ?? NaN,
      positions: ring[0] ?? NaN,
      firstDeg: ring[1] ?? NaN,
    });
    const shares = result.ok ? result.value.shares : [];
    expect(shares.map(({ label }) => label)).toEqual(on);
    for (const [index, share] of want.entries()) near(shares[index]?.massG ?? NaN, share, within);
  });

  it('numbers positions in the sense that was chosen: 4 of 7 from 10°', async () => {
    const placeOf4 = async (numbered: 'with' | 'against') => {
      const result = await split(reader, { ...given, positions: '7', firstDeg: '10', numbered });
      return result.ok ? (result.value.positions[3]?.angleDeg ?? NaN) : NaN;
    };
    nearDeg(await placeOf4('with'), 215.71, 0.01);
    nearDeg(await placeOf4('against'), 164.29, 0.01);
  });

  it('puts a weight that stands at a position on it alone, with its force at the speed typed', async () => {
    const at = { ...given, massG: '30', radiusMm: '400', positions: '4', angleDeg: '90' };
    const still = await split(reader, at);
    expect(still.ok && still.value.shares).toMatchObject([{ label: '2', massG: 30, forceN: null }]);
    const turning = await split(reader, { ...at, speedRpm: '1480' });
    // 30 g at 400 mm and 1480 r/min: 288.2 N, computed independently.
    near((turning.ok ? turning.value.shares[0]?.forceN : null) ?? NaN, 288.2, 0.2);
  });

  it('finds the same blades counted the other way round', async () => {
    const result = await split(reader, {
      ...given,
      angleSense: 'with',
      angleDeg: '223',
      numbered: 'with',
    });
    // 223° with rotation is 137° against it; blade k then stands at 360 − 40(k − 1) against rotation.
    const labels = result.ok ? result.value.shares.map(({ label }) => label) : [];
    expect(labels).toEqual(['7', '6']);
  });

  it.each([
    [{ angleDeg: '720' }, 'angleDeg'],
    [{ firstDeg: '-10' }, 'firstDeg'],
    [{ positions: '2' }, 'positions'],
    [{ positions: '4,5' }, 'positions'],
    [{ maxG: '12' }, 'maxG'],
    [{ massG: '0' }, 'massG'],
    [{ angleSense: '' as 'with' }, 'angleSense'],
    [{ numbered: '' as 'with' }, 'numbered'],
  ])('refuses in words: %o', async (over, field) => {
    expect(await split(reader, { ...given, ...over })).toMatchObject({ failure: { field } });
  });
});
