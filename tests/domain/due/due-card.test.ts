import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { DUE_WEIGHTS, dueCard, type DueCard } from '@/lib/domain/due/due-card';
import type { DueMachine, DuePart, DueReading } from '@/lib/domain/due/due-machine';
import { expectedGain } from '@/lib/domain/due/expected-gain';
import { laneOf, type LaneFacts } from '@/lib/domain/due/lane';
import { rankDue } from '@/lib/domain/due/rank-due';

const growing: DueReading[] = [1.6, 1.8, 2, 2.2, 2.4, 2.6].map((value, i) => ({
  day: 20 * i,
  value,
  oneX: 0.97 * value,
  lagDeg: 120 + (i % 2),
  speedRpm: 1485,
}));
const fan: DueMachine = {
  tag: 'VF-12',
  criticality: 'B',
  boundaries: { ab: 1.4, bc: 2.8, cd: 4.5 },
  readings: growing,
  breakDays: [],
  readingAgeDays: 3,
  horizontalOverVertical: 1.5,
  horizontalLessVerticalLagDeg: 85,
  daysSinceBalance: 100,
  balanceLifeDays: 200,
  balancesInYear: 1,
  blockingFindings: [],
};
const cardOf = (change: Partial<DueMachine> = {}): DueCard => {
  const card = dueCard({ ...fan, ...change });
  if (!card.ok) throw new Error(card.failure.message);
  return card.value;
};
const part = (card: DueCard, key: DuePart['key']) =>
  card.parts.find((one) => one.key === key) ?? { value: Number.NaN, because: '' };
const withReadings = (change: Partial<DueReading>) =>
  growing.map((reading) => ({ ...reading, ...change }));

describe('dueCard', () => {
  it('puts growing unbalance into the rebalance lane, with its working', () => {
    const card = cardOf();
    expect(card).toMatchObject({ lane: 'rebalance', likelihood: 1, mark: 'fresh', asksWhy: false });
    expect(card.parts.map(({ symbol }) => symbol)).toEqual([
      'L_share',
      'L_phase',
      'L_direction',
      'L_hv',
      'Z',
      'T',
      'G',
      'C',
      'A',
    ]);
    expect(card.reasons).toEqual([
      '1x carries 94 % of the vibration energy.',
      'The lag holds still (spread 0°).',
      'Both directions shake alike, as unbalance does.',
      'Horizontal and vertical are a quarter turn apart, as unbalance makes them.',
      'The latest reading lies in zone B.',
      'B/C is reached in 17 days at the earliest.',
      'One month brings 43 % of a significant change.',
      'Criticality B.',
      'Balanced 100 days ago; a balance lasts about 200 days here.',
    ]);
  });

  it('has nothing for unbalance where no 1x is measured', () => {
    const card = cardOf({ readings: withReadings({ oneX: null, lagDeg: null }) });
    expect(card).toMatchObject({ lane: 'find the cause', score: 0, gain: null });
    expect(part(card, 'share').because).toMatch(/No 1x is measured/);
    expect(part(card, 'phase')).toMatchObject({ value: 0.5 });
  });

  it('counts a lag known fewer than three times as half', () => {
    const readings = growing.map((reading, i) => (i < 4 ? { ...reading, lagDeg: null } : reading));
    expect(part(cardOf({ readings }), 'phase').value).toBe(0.5);
  });

  it('says so when directions are not compared', () => {
    const card = cardOf({ horizontalOverVertical: null, horizontalLessVerticalLagDeg: null });
    expect(part(card, 'direction').value).toBe(1);
    expect(part(card, 'horizontal to vertical').value).toBe(1);
  });

  it.each([
    [3, 1],
    [1 / 3, 1],
    [4.5, 0.5],
    [1 / 4.5, 0.5],
    [6, 0],
    [9, 0],
  ])('H/V %d gives L_direction %d', (horizontalOverVertical, value) => {
    expect(part(cardOf({ horizontalOverVertical }), 'direction').value).toBeCloseTo(value, 12);
  });

  it.each([
    [90, 1],
    [-90, 1],
    [270, 1],
    [60, 1],
    [45, 0.65],
    [30, 0.3],
    [-8, 0.3],
    [180, 0.3],
    [150, 0.3],
    [135, 0.65],
  ])('H less V of %d° gives L_hv %d', (horizontalLessVerticalLagDeg, value) => {
    const card = cardOf({ horizontalLessVerticalLagDeg });
    expect(part(card, 'horizontal to vertical').value).toBeCloseTo(value, 12);
  });

  it('finds the cause where a finding blocks, and names it', () => {
    const card = cardOf({ blockingFindings: ['support resonance within 10 % of speed'] });
    expect(card.lane).toBe('find the cause');
    expect(card.reasons[0]).toBe('Open finding: support resonance within 10 % of speed.');
  });

  it('marks an old reading, and asks why after three balances', () => {
    expect(cardOf({ readingAgeDays: 45 }).mark).toBe('fresh');
    const card = cardOf({ readingAgeDays: 46, balancesInYear: 3 });
    expect(card).toMatchObject({ mark: 'old reading', asksWhy: true });
    expect(card.reasons.slice(0, 2)).toEqual([
      'The last reading is 46 days old: take a reading first.',
      'Balanced 3 times in 12 months: ask why.',
    ]);
  });

  it('leaves out readings at other speeds', () => {
    const slow = { day: 95, value: 9, oneX: 0.1, lagDeg: 300, speedRpm: 900 };
    const card = cardOf({ readings: [...growing, slow].reverse() });
    expect(card.score).toBe(cardOf().score);
  });

  it('starts anew after a break, and asks for a reading when there is none since', () => {
    const late = cardOf({ breakDays: [80] });
    expect(late.standing.trend).toBeNull();
    expect(late.standing.fitNow).toBeCloseTo(2.5, 12);
    expect(part(late, 'growth').because).toMatch(/Too few readings/);
    const after = cardOf({ breakDays: [101] });
    expect(after.mark).toBe('old reading');
    expect(after.reasons[0]).toMatch(/^No reading since the last event/);
    expect(after.standing.fitNow).toBe(2.6);
  });

  it('names a step and the machine that falls or rests', () => {
    const step = growing.map((reading, i) => (i < 3 ? reading : { ...reading, value: 6 }));
    expect(cardOf({ readings: step }).reasons).toContain(
      'The trend has a step: enter the event behind it.',
    );
    const falling = growing.map((reading, i) => ({ ...reading, value: 2 - 0.1 * i }));
    const card = cardOf({ readings: falling, daysSinceBalance: null, balanceLifeDays: null });
    expect(card.lane).toBe('watch');
    expect(card.reasons).toContain('It does not grow.');
    expect(card.reasons).toContain('No crossing of B/C is expected from these readings.');
    expect(card.reasons).toContain('No balance is on record.');
  });

  it('does not promise a crossing beyond a year', () => {
    const slow = growing.map((reading, i) => ({ ...reading, value: 1 + 0.01 * i }));
    const card = cardOf({ readings: slow, balanceLifeDays: null });
    expect(part(card, 'time left').value).toBe(0);
    expect(card.reasons).toContain('B/C is not expected within a year.');
    expect(card.reasons).toContain(
      'Balanced 100 days ago; how long a balance lasts here is not known yet.',
    );
  });

  it('fails without readings and on a reading that is no number', () => {
    expect(dueCard({ ...fan, readings: [] })).toMatchObject({ failure: { code: 'NO_READINGS' } });
    for (const bad of [{ value: Number.NaN }, { value: Infinity }, { oneX: Number.NaN }])
      expect(dueCard({ ...fan, readings: withReadings(bad) })).toMatchObject({
        failure: { code: 'NOT_FINITE' },
      });
  });

  it('scores between 0 and 100 whatever the readings', () => {
    const size = fc.double({ min: 0, max: 30, noNaN: true });
    const reading = fc.record({
      day: fc.integer({ min: 0, max: 400 }),
      value: size,
      oneX: fc.option(size),
      lagDeg: fc.option(fc.integer({ min: 0, max: 359 })),
      speedRpm: fc.option(fc.constantFrom(1485, 1490, 900)),
    });
    fc.assert(
      fc.property(fc.array(reading, { minLength: 1, maxLength: 20 }), (readings) => {
        const card = cardOf({ readings });
        expect(card.score).toBeGreaterThanOrEqual(0);
        expect(card.score).toBeLessThanOrEqual(100);
        expect(card.score).toBeLessThanOrEqual(100 * card.urgency + 1e-9);
      }),
    );
  });

  it('weighs with the weights of the site', () => {
    expect(Object.values(DUE_WEIGHTS).reduce((a, b) => a + b)).toBeCloseTo(1, 12);
    const onlyC = { severity: 0, 'time left': 0, growth: 0, consequence: 1, 'balance age': 0 };
    const card = dueCard(fan, onlyC);
    expect(card.ok && card.value.score).toBeCloseTo(70, 9);
  });
});

describe('laneOf', () => {
  const facts: LaneFacts = {
    zone: 'C',
    likelihood: 0.4,
    severity: 0.6,
    timeLeft: 0,
    isBlocked: false,
  };

  it.each<[Partial<LaneFacts>, string]>([
    [{}, 'rebalance'],
    [{ likelihood: 0.39 }, 'find the cause'],
    [{ isBlocked: true }, 'find the cause'],
    [{ severity: 0.5, timeLeft: 0.01 }, 'rebalance'],
    [{ severity: 0.5 }, 'watch'],
    [{ severity: 0.5, isBlocked: true }, 'watch'],
    [{ zone: 'D' }, 'act now'],
    [{ zone: 'D', likelihood: 0.1 }, 'act now, find the cause'],
    [{ zone: 'D', isBlocked: true }, 'act now, find the cause'],
  ])('%o is %s', (change, lane) => {
    expect(laneOf({ ...facts, ...change })).toBe(lane);
  });
});

describe('expectedGain', () => {
  it('never promises less than what is not 1x', () => {
    const size = fc.double({ min: 0, max: 20, noNaN: true });
    fc.assert(
      fc.property(size, size, (rest, oneX) => {
        const { overall } = expectedGain(Math.hypot(rest, oneX), oneX, fan.boundaries);
        expect(overall).toBeGreaterThanOrEqual(rest - 1e-6);
        expect(overall).toBeLessThanOrEqual(Math.hypot(rest, oneX) + 1e-6);
      }),
    );
  });
});

describe('rankDue', () => {
  it('breaks ties by criticality, older balance and tag, and keeps other fields', () => {
    const base = cardOf();
    const cards = [
      { ...base, tag: 'c', machineId: 1 },
      { ...base, tag: 'b', machineId: 2, daysSinceBalance: null },
      { ...base, tag: 'a', machineId: 3 },
      { ...base, tag: 'd', machineId: 4, daysSinceBalance: 400 },
      { ...base, tag: 'e', machineId: 5, criticality: 'A' as const, score: base.score + 0.001 },
    ];
    expect(rankDue(cards).map(({ machineId }) => machineId)).toEqual([5, 4, 3, 1, 2]);
  });
});
