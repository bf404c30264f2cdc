import { describe, expect, it } from 'vitest';
import { dueCard, type DueCard } from '@/lib/domain/due/due-card';
import type { DueMachine } from '@/lib/domain/due/due-machine';
import { tellingReasons } from '@/lib/domain/due/telling-reasons';

const days = [0, 15, 30, 45, 60, 75];
const machine: DueMachine = {
  tag: 'T-1',
  criticality: 'B',
  boundaries: { ab: 1.4, bc: 2.8, cd: 4.5 },
  readings: days.map((day, index) => ({
    day,
    value: 3 + 0.1 * index,
    oneX: 2.95 + 0.1 * index,
    lagDeg: 40,
    speedRpm: 990,
  })),
  breakDays: [],
  readingAgeDays: 1,
  horizontalOverVertical: null,
  horizontalLessVerticalLagDeg: null,
  daysSinceBalance: null,
  balanceLifeDays: null,
  balancesInYear: 0,
  blockingFindings: [],
};

function cardOf(over: Partial<DueMachine>): DueCard {
  const card = dueCard({ ...machine, ...over });
  if (!card.ok) throw new Error(card.failure.message);
  return card.value;
}

describe('tellingReasons', () => {
  it('tells of time, share and growth where weights are the answer', () => {
    const reasons = tellingReasons(cardOf({}));
    expect(reasons[0]).toMatch(/^C\/D is reached in \d+ days at the earliest\.$/);
    expect(reasons[1]).toMatch(/^1x carries 9\d % of the vibration energy\.$/);
    expect(reasons[2]).toMatch(/^One month brings \d+ % of a significant change\.$/);
  });

  it('puts what asks for attention before everything else', () => {
    expect(tellingReasons(cardOf({ readingAgeDays: 75 }))[0]).toContain('75 days old');
  });

  it('tells what speaks most against unbalance where it does', () => {
    const oneSided = cardOf({ horizontalOverVertical: 9 });
    expect(oneSided.lane).toBe('find the cause');
    expect(tellingReasons(oneSided)[0]).toContain('One direction shakes far more');
    const readings = machine.readings.map((one) => ({ ...one, oneX: 0.4 }));
    const other = cardOf({ readings, horizontalOverVertical: 5 });
    expect(tellingReasons(other)[0]).toMatch(/^1x carries [12] % of the vibration energy/);
    expect(tellingReasons(other, 2)[1]).toContain('One direction shakes far more');
  });
});
