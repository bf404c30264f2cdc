import { describe, expect, it } from 'vitest';
import { centrifugalForceN, unbalanceOfForceGmm } from '@/lib/domain/balancing/centrifugal-force';
import { combineMasses, massAtRadiusG, splitMass } from '@/lib/domain/balancing/move-weight';
import { permissibleUnbalance, shareByLever } from '@/lib/domain/balancing/permissible-unbalance';
import { proposeTrial } from '@/lib/domain/balancing/trial-proposal';
import { trialResponse } from '@/lib/domain/balancing/trial-response';
import { solveWithoutPhase } from '@/lib/domain/balancing/without-phase';
import { fromPolar } from '@/lib/domain/complex';
import { codeOf, valueOf } from '../domain/balancing/job-builder';
import { near, nearDeg } from '../domain/balancing/near';
import data from './data/balancing-published.json';

const within = (got: number, want: number, relative: number) =>
  near(got, want, relative * Math.abs(want));
const pair = ([a = NaN, b = NaN]: readonly number[]): [number, number] => [a, b];
const vector = ([amp = NaN, deg = NaN]: readonly number[]) => fromPolar(amp, deg);

describe('weights moved, joined and split', () => {
  // "Balancing Weights: Radius Changes & Splitting", reliabilityweb.com; the split is computed.
  it('WA-01: another radius, then two bolts of nine', () => {
    const { inputs, published, computed } = data['WA-01'];
    const { oz, deg, r_in: from } = inputs.found;
    const moved = massAtRadiusG(oz, from, inputs.new_r_in);
    within(moved, published.weight_at_16_in_oz, 1e-12);
    const onto = pair(inputs.bolts_deg);
    const [first, second] = valueOf(splitMass({ massG: moved, angleDeg: deg }, onto));
    within(first.massG, computed.W240_oz, 1e-9);
    within(second.massG, computed.W280_oz, 1e-9);
  });

  // Government field-balancing guide for large hydro rotors, Example 4, drawn to scale: ± 1.5 lb.
  it('WA-02: onto rotor arms at 0° and 60°', () => {
    const { inputs, published, computed } = data['WA-02'];
    const mass = { massG: inputs.W_lb, angleDeg: inputs.deg };
    const [first, second] = valueOf(splitMass(mass, pair(inputs.arms_deg)));
    near(first.massG, published['at 0 deg lb'], 1.5);
    near(second.massG, published['at 60 deg lb'], 1.5);
    within(first.massG, computed['at 0 deg lb'], 1e-9);
    within(second.massG, computed['at 60 deg lb'], 1e-9);
  });

  // WA-03 to WA-07: vector sum and law of sines, computed apart from this code.
  it('WA-03: two on one radius', () => {
    const { inputs, computed } = data['WA-03'];
    const masses = inputs.g_deg.map(([massG = NaN, angleDeg = NaN]) => ({ massG, angleDeg }));
    const joined = combineMasses(masses);
    within(joined.massG, computed.resultant_g_deg[0]!, 1e-9);
    nearDeg(joined.angleDeg, computed.resultant_g_deg[1]!, 1e-9);
  });

  it('WA-05: onto blades, and back to the same weight', () => {
    const { inputs, computed } = data['WA-05'];
    const target = { massG: inputs.W, angleDeg: inputs.deg };
    const shares = valueOf(splitMass(target, pair(inputs.blades_deg)));
    within(shares[0].massG, computed.blade4_at_120, 1e-9);
    within(shares[1].massG, computed.blade5_at_160, 1e-9);
    within((shares[0].massG + shares[1].massG) / inputs.W, computed['sum/target'], 1e-9);
    within(combineMasses(shares).massG, inputs.W, 1e-12);
  });

  it('WA-06: outside the two positions is refused and says how much less than nothing', () => {
    const { inputs, computed } = data['WA-06'];
    const mass = { massG: inputs.W, angleDeg: inputs.deg };
    const refused = splitMass(mass, pair(inputs.positions_deg));
    expect(codeOf(refused)).toBe('outside');
    expect(refused.ok ? '' : refused.failure.message).toContain(computed['W at 90'].toFixed(1));
    expect(codeOf(splitMass(mass, [20, 200]))).toBe('in-line');
  });

  it('WA-07: at mid-pitch, equal halves larger than half', () => {
    const { inputs, computed } = data['WA-07'];
    const mass = { massG: inputs.W, angleDeg: inputs.deg };
    for (const { massG } of valueOf(splitMass(mass, pair(inputs.positions_deg))))
      within(massG, computed.each, 1e-12);
  });
});

describe('balance quality', () => {
  // ISO 1940-1:2003 annex example, carried into ISO 21940-11:2016; from memory. A lies farther from
  // the mass centre and gets the smaller share.
  it('BQ-01: turbine rotor', () => {
    const { inputs, published } = data['BQ-01'];
    const allowed = valueOf(permissibleUnbalance(inputs.G, inputs.m_kg, inputs.n_rpm));
    near(allowed.specificUm, published['e_per g.mm/kg'], 0.005);
    near(allowed.totalGmm, published['U_per g.mm'], 100);
    const geometry = {
      apartM: inputs.L_mm / 1000,
      massCentreFromAM: inputs.L_A_mm / 1000,
      arrangement: 'inboard' as const,
    };
    const shares = valueOf(shareByLever(allowed.totalGmm, geometry));
    near(shares.aGmm, published.U_per_A, 100);
    near(shares.bGmm, published.U_per_B, 100);
  });

  // ISO 21940-11: definition of the grade; numbers computed apart from this code.
  it.each(data['BQ-02'].computed)('BQ-02: $rotor', (row) => {
    const allowed = valueOf(permissibleUnbalance(row.G, row.m_kg, row.n_rpm));
    within(allowed.specificUm, row.e_per_um, 1e-9);
    within(allowed.totalGmm, row.U_per_gmm, 1e-9);
    within(centrifugalForceN(allowed.totalGmm, row.n_rpm), row['force at speed N'], 1e-9);
  });

  // Practice of API 610/612/617; from memory.
  it('BQ-03: four W over N as a grade', () => {
    const { published, computed } = data['BQ-03'];
    const grade = computed['equivalent G mm/s'];
    const each = valueOf(permissibleUnbalance(grade, 1, 1));
    near(each.totalGmm, published['U [g.mm] = 6350 W[kg]/N'], 1);
    near(grade, published['equivalent G'], 0.0051);
  });

  // ISO 21940-11, from memory; the arithmetic is checked.
  it('BQ-05: half each where the mass centre lies half-way', () => {
    const { inputs, computed } = data['BQ-05'];
    const span = inputs.L_A + inputs.L_B;
    const shares = shareByLever(inputs.U_per, {
      apartM: span,
      massCentreFromAM: inputs.L_A,
      arrangement: 'inboard',
    });
    expect(shares).toEqual({ ok: true, value: { aGmm: computed.A, bGmm: computed.B } });
  });
});

describe('trial weights', () => {
  // Handbook rule of thumb: 10 % of the static load; numbers computed apart from this code.
  it.each(data['TW-01'].computed)('TW-01: $rotor_kg kg at $n_rpm r/min', (row) => {
    const rotor = { radiusMm: row.r_mm, speedRpm: row.n_rpm, rotorMassKg: row.rotor_kg };
    const whole = proposeTrial(rotor);
    within(whole.massG, row['g at 10% of total weight'], 1e-6);
    near(whole.forcePctOfLoad, 10, 1e-9);
    const half = proposeTrial({ ...rotor, bearingLoadN: (row.rotor_kg * 9.80665) / 2 });
    within(half.massG, row['g at 10% of half weight (per plane)'], 1e-6);
  });

  // Handbook constant 1.77 lbf per oz·in at 1000 r/min; from memory. 1 oz·in = 720.08 g·mm.
  it('TW-02: centrifugal force', () => {
    const { computed } = data['TW-02'];
    const newtonsPerLbf = 4.4482216152605;
    near(centrifugalForceN(720.08, 1000) / newtonsPerLbf, 1.77, 0.006);
    within(centrifugalForceN(10 * 200, 3000), computed['10 g at 200 mm, 3000 r/min N'], 1e-9);
    within(centrifugalForceN(100 * 500, 1500), computed['100 g at 500 mm, 1500 r/min N'], 1e-9);
    within(centrifugalForceN(1, 1000), computed['1 g.mm at 1000 r/min N'], 1e-9);
    within(unbalanceOfForceGmm(computed['1 g.mm at 1000 r/min N'], 1000), 1, 1e-9);
  });

  // Training literature, from memory; the last case goes through 360°.
  it.each(data['TW-03'].computed)('TW-03: from $V0 to $V1', (row) => {
    const response = trialResponse(vector(row.V0), vector(row.V1), null);
    near(response.amplitudeChangePct, row.amp_change_pct, 1e-9);
    near(response.lagChangeDeg, row.phase_change, 1e-9);
    expect(response.thirtyRule).toBe(row.accept);
    expect(response.verdict).toBe('unknown');
  });
});

describe('without phase', () => {
  const sizesOf = ({
    O,
    trial_g: trialMassG,
    T,
    positions_deg: places,
  }: (typeof data)['NP-01']['inputs']) => ({
    baseAmplitude: O,
    trialMassG,
    runs: T.map((amplitude, i) => ({ angleDeg: places[i]!, amplitude })),
  });

  // D. Shreve, Balancing Without Phase, reliabilityweb.com: inputs and method; the answer is computed,
  // because the article draws it. Its circles do not meet in one point.
  it('NP-01: hypothetical sizes that agree within 5.5 %', () => {
    const { inputs, computed } = data['NP-01'];
    const answer = valueOf(solveWithoutPhase(sizesOf(inputs)));
    near(answer.massG, computed['correction_g from sum of squares'], 1e-9);
    nearDeg(answer.angleDeg, computed['correction position_deg = that angle - 180'], 1e-9);
    near(1 / answer.consistency - 1, computed['inconsistency (T_sumsq/|z| - 1)'], 1e-9);
    near(answer.massG, computed['least squares correction_g'], 3);
    nearDeg(answer.angleDeg, computed['least squares position_deg'], 3);
    expect(answer.trusted).toBe(true);
  });

  // Forward model written for the check: exact by construction.
  it('NP-03: exact sizes', () => {
    const { inputs, published } = data['NP-03'];
    const want = published['by construction'];
    const answer = valueOf(solveWithoutPhase(sizesOf(inputs)));
    near(answer.effect, want.T, 1e-9);
    near(answer.massG, want.correction_g, 1e-9);
    nearDeg(answer.angleDeg, want.position_deg, 1e-9);
    near(answer.consistency, 1, 1e-9);
    near(answer.misfitRms, 0, 1e-9);
  });
});
