import { readFileSync } from 'node:fs';
import { z } from 'zod';
import { describe, expect, it } from 'vitest';
import { dueCard, type DueCard } from '@/lib/domain/due/due-card';
import type { DueMachine } from '@/lib/domain/due/due-machine';
import { rankDue } from '@/lib/domain/due/rank-due';

const numbers = z.array(z.number());
const unit = z.object({
  id: z.string(),
  criticality: z.enum(['A', 'B', 'C', 'D']),
  zone_limits: z.tuple([z.number(), z.number(), z.number()]),
  H_over_V: z.number(),
  phase_H_minus_V_deg: z.number().nullable().default(null),
  days_since_balance: z.number().nullable(),
  median_days_between_balances: z.number().nullable(),
  data_age_days: z.number(),
  open_findings: z.array(z.string()).default([]),
  readings: z.object({
    day: numbers,
    overall: numbers,
    one_x: numbers,
    phase: numbers,
    speed: numbers,
  }),
});
const expectedOfUnit = z.object({
  step_found_at_day: z.number().nullable(),
  now_fit: z.number(),
  latest: z.number(),
  zone: z.string(),
  slope_mm_s_per_30d: z.number(),
  next_boundary: z.number().nullable(),
  days_mid: z.number(),
  days_early: z.number(),
  one_x_energy_share: z.number(),
  phase_sd_deg: z.number(),
  L_share: z.number(),
  L_phase: z.number(),
  L_direction: z.number(),
  L_hv_phase: z.number(),
  likelihood: z.number(),
  Z: z.number(),
  T: z.number(),
  G: z.number(),
  C: z.number(),
  A: z.number(),
  urgency: z.number(),
  score: z.number(),
  lane: z.string(),
  overall_if_1x_cut_to_quarter: z.number(),
  zone_if_1x_cut_to_quarter: z.string(),
  mark: z.string(),
});
// Scenario S14: seven invented machines, expected values by an independent implementation.
const scenario = z
  .object({
    units: z.array(unit),
    expected: z.object({
      results: z.record(z.string(), expectedOfUnit),
      order: z.array(z.string()),
    }),
    tol: z.object({ score: z.number(), days: z.number() }),
  })
  .parse(JSON.parse(readFileSync(new URL('./data/due-s14.json', import.meta.url), 'utf8')));

function machineOf(given: z.infer<typeof unit>): DueMachine {
  const [ab, bc, cd] = given.zone_limits;
  const { day, overall, one_x: oneX, phase, speed } = given.readings;
  return {
    tag: given.id,
    criticality: given.criticality,
    boundaries: { ab, bc, cd },
    readings: day.map((at, i) => ({
      day: at,
      value: overall[i] ?? Number.NaN,
      oneX: oneX[i] ?? null,
      lagDeg: phase[i] ?? null,
      speedRpm: speed[i] ?? null,
    })),
    breakDays: [],
    readingAgeDays: given.data_age_days,
    horizontalOverVertical: given.H_over_V,
    horizontalLessVerticalLagDeg: given.phase_H_minus_V_deg,
    daysSinceBalance: given.days_since_balance,
    balanceLifeDays: given.median_days_between_balances,
    balancesInYear: 0,
    blockingFindings: given.open_findings,
  };
}

const cards = scenario.units.map((given) => {
  const card = dueCard(machineOf(given));
  if (!card.ok) throw new Error(card.failure.message);
  return card.value;
});
function near(value: number | null | undefined, expected: number, tolerance: number): void {
  const miss = Math.abs((value ?? Number.NaN) - expected);
  expect(miss, `${String(value)} for ${expected}`).toBeLessThanOrEqual(tolerance);
}
const firstFigures = (card: DueCard) => card.parts.map(({ inputs }) => inputs[0]?.value);
const slopeOf = ({ standing }: DueCard) => (standing.trend?.perDay ?? 0) * 30;

describe('S14 the Due board', () => {
  it('ranks the seven machines in the expected order', () => {
    expect(rankDue(cards).map(({ tag }) => tag)).toEqual(scenario.expected.order);
    expect(rankDue([...cards].reverse()).map(({ tag }) => tag)).toEqual(scenario.expected.order);
  });

  // Shown values are compared to half of their last printed digit.
  it.each(cards.map((card) => [card.tag, card] as const))('%s', (tag, card) => {
    const expected = scenario.expected.results[tag];
    if (expected === undefined) throw new Error(`${tag} has no expected values.`);
    const { standing } = card;
    expect(card.lane).toBe(expected.lane);
    near(card.score, expected.score, scenario.tol.score);
    near(card.likelihood, expected.likelihood, 0.0006);
    near(card.urgency, expected.urgency, 0.0006);
    expect(standing.step?.day ?? null).toBe(expected.step_found_at_day);
    near(standing.fitNow, expected.now_fit, 0.0051);
    expect(standing.latest.value).toBe(expected.latest);
    expect(standing.zone).toBe(expected.zone);
    near(slopeOf(card), expected.slope_mm_s_per_30d, 0.0006);
    expect(standing.boundary?.value ?? null).toBe(expected.next_boundary);
    const parts = card.parts.map(({ value }) => value);
    const { L_share, L_phase, L_direction, L_hv_phase, Z, T, G, C, A } = expected;
    [L_share, L_phase, L_direction, L_hv_phase, Z, T, G, C, A].forEach((part, i) => {
      near(parts[i], part, 0.0006);
    });
    const [share, spread] = firstFigures(card);
    near(share, expected.one_x_energy_share, 0.0006);
    near(spread, expected.phase_sd_deg, 0.051);
    near(card.gain?.overall, expected.overall_if_1x_cut_to_quarter, 0.0051);
    expect(card.gain?.zone).toBe(expected.zone_if_1x_cut_to_quarter);
    expect(card.mark).toBe(expected.mark);
  });

  it.each(cards.map((card) => [card.tag, card] as const))('%s: days', (tag, { standing }) => {
    const expected = scenario.expected.results[tag];
    const { crossing } = standing;
    if (standing.zone === 'D') {
      expect(crossing).toBeNull();
      return;
    }
    if (crossing === null || crossing.kind === 'no crossing expected')
      throw new Error(`${tag} should cross its boundary.`);
    near(crossing.earlyDays, expected?.days_early ?? Number.NaN, scenario.tol.days);
    near(crossing.middleDays, expected?.days_mid ?? Number.NaN, scenario.tol.days);
  });
});
