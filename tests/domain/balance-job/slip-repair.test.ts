import { describe, expect, it } from 'vitest';
import { isSlip, otherOf, slipRepair, SLIPS } from '@/lib/domain/balance-job/slip-repair';

const facts = { planeId: 1, massG: 40, radiusMm: 400, angleDeg: 75 };
const known = { planeIds: [1, 2], pitchDeg: 40 };

describe('slipRepair', () => {
  it.each([
    ['angles counted with rotation', 'all', { angleDeg: 285 }],
    ['fitted 180° off', 'fitted', { angleDeg: 255 }],
    ['planes swapped', 'fitted', { planeId: 2 }],
    ['mass ten times too small', 'fitted', { massG: 4 }],
    ['mass ten times too large', 'fitted', { massG: 400 }],
    ['one position further', 'fitted', { angleDeg: 115 }],
    ['one position back', 'fitted', { angleDeg: 35 }],
  ] as const)('%s', (slip, weights, changed) => {
    const repair = slipRepair(slip, known);
    expect(repair.weights).toBe(weights);
    expect(repair.weight(facts)).toEqual({ ...facts, ...changed });
  });

  it('says what else may change than a weight', () => {
    expect(slipRepair('not fitted', known).weight(facts)).toBeNull();
    expect(slipRepair('lead read as lag', known).vectors).toBe('mirrored');
    expect(slipRepair('channels swapped', known).vectors).toBe('points swapped');
    expect(slipRepair('trial left on', known).trialsOn).toBe(true);
    expect(slipRepair('trial left on', known).stayedTrial).toBeNull();
    expect(slipRepair('first trial stayed on', known).stayedTrial).toBe(0);
    expect(slipRepair('second trial stayed on', known).stayedTrial).toBe(1);
    expect(slipRepair('third trial stayed on', known).stayedTrial).toBe(2);
    expect(slipRepair('earlier weight gone', known).earlierGone).toBe(true);
  });

  it('knows what can be confirmed', () => {
    expect(isSlip('as entered')).toBe(false);
    expect(SLIPS.every((slip) => isSlip(slip))).toBe(true);
    expect(otherOf([1, 2], 1)).toBe(2);
  });
});
