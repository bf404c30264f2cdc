import { describe, expect, it } from 'vitest';
import { split } from '@/lib/server/workbench/split';
import { near } from '@/tests/domain/balancing/near';
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
    [{ numbered: '' as 'with' }, 'numbered'],
  ])('refuses in words: %o', async (over, field) => {
    expect(await split(reader, { ...given, ...over })).toMatchObject({ failure: { field } });
  });
});
