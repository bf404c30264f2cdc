import { describe, expect, it } from 'vitest';
import type { SolvedRuns } from '@/lib/schemas/workbench';
import { near, nearDeg } from '@/tests/domain/balancing/near';
import published from '@/tests/reference/data/balancing-published.json';
import scenarios from '@/tests/reference/data/balancing-scenarios.json';
import { polars, readings, runs, s02, solved, trial, type Polar } from './runs-as-typed';

const { S01, S02 } = scenarios.scenarios;

function expectWeights(
  { answer }: SolvedRuns,
  want: readonly (readonly number[])[],
  within: { g: number; deg: number },
) {
  expect(answer?.planes).toHaveLength(want.length);
  for (const [index, [mass = NaN, deg = NaN]] of want.entries()) {
    near(answer?.planes[index]?.massG ?? NaN, mass, within.g);
    nearDeg(answer?.planes[index]?.angleDeg ?? NaN, deg, within.deg);
  }
}

describe('scenarios', () => {
  it('S02: two planes, with condition number, predicted residual, parts and coefficients', async () => {
    const got = await solved(s02());
    const { expected, tol } = S02;
    expectWeights(
      got,
      expected.correction.map(({ g, deg }) => [g, deg]),
      tol,
    );
    expect(got.answer?.condition.number).toBeCloseTo(expected.condition_number_scaled, 2);
    expect(got.answer?.condition.verdict).toBe('good');
    for (const point of got.answer?.predicted ?? []) near(point.amplitude, 0, 1e-9);
    near(
      got.answer?.parts?.static.massG ?? NaN,
      expected.correction_static_part_g.each_plane_g,
      0.1,
    );
    near(got.answer?.parts?.couple.massG ?? NaN, expected.correction_couple_part_g.plane_L_g, 0.1);
    const wanted = Object.values(expected.coefficients);
    // A_L, A_R, B_L, B_R there; point by point here.
    const found = [...(got.answer?.coefficients ?? [])].sort(
      (a, b) => a.pointId - b.pointId || a.planeId - b.planeId,
    );
    for (const [index, h] of wanted.entries()) {
      near(found[index]?.sizePerKgMm ?? NaN, h.mm_s_rms_per_kg_mm, 0.0005);
      nearDeg(found[index]?.deg ?? NaN, h.deg, tol.deg);
    }
  });

  it('S01: one plane, from one base run of its mean, with the response of the trial', async () => {
    const { base_mean: mean, correction, trial_change_pct_of_base: changePct } = S01.expected;
    const { trial: weight, trial_run: run } = S01.inputs;
    const got = await solved(
      runs({
        speedRpm: '1480',
        rotorMassKg: '210',
        planes: [{ radiusMm: weight.radius_mm }],
        base: readings([mean]),
        trials: [trial([weight.g, weight.deg], [run], { radiusMm: weight.radius_mm })],
      }),
    );
    expectWeights(got, [[correction.g, correction.deg]], S01.tol);
    expect(got.trialChecks).toHaveLength(1);
    near(got.trialChecks[0]?.changePct ?? NaN, changePct, S01.tol.pct);
    expect(got.trialChecks[0]).toMatchObject({ verdict: 'unknown', thirtyRule: true });
    expect(got.answer?.planes[0]?.uncertaintyG).toBeNull();
    // 26.27 g at 400 mm and 1480 r/min pull with 252.4 N at a rotor that weighs 2059.4 N.
    near(got.forcePctOfRotorWeight[0] ?? NaN, 12.26, 0.05);
  });
});

it('the scatter typed gives the answer its uncertainty', async () => {
  const { answer } = await solved(s02({ scatter: '0,03' }));
  for (const plane of answer?.planes ?? []) {
    expect(plane.uncertaintyG).toBeGreaterThan(0.1);
    expect(plane.uncertaintyG).toBeLessThan(plane.massG / 4);
  }
  expect(answer?.planes).toHaveLength(2);
});

describe('published cases', () => {
  // S. S. Rao, Mechanical Vibrations, two-plane balancing example (ch. 9); from memory. The printed
  // angles are those of the unbalance; what cancels it hangs opposite. Mils and oz stand for mm/s and g.
  it('TP-01: turbine rotor, two planes', async () => {
    const { inputs, published: printed } = published['TP-01'];
    const { V0, V_L: left, V_R: right } = inputs;
    const got = await solved(
      runs({
        base: readings(polars([V0.A, V0.B])),
        trials: [
          trial(inputs.trial_L_oz_deg, polars([left.A, left.B])),
          trial(inputs.trial_R_oz_deg, polars([right.A, right.B])),
        ],
      }),
    );
    const opposite = ([oz = NaN, deg = NaN]: readonly number[]) => [oz, deg + 180];
    expectWeights(got, [printed.U_L_oz_deg, printed.U_R_oz_deg].map(opposite), {
      g: 1e-4,
      deg: 1e-4,
    });
  });

  // W. T. Thomson, Theory of Vibration, strobe example; from memory, drawn. Its weights are counted the
  // other way from its phase: phase with rotation is lead, so degrees on the wheel run against rotation.
  it.each([
    { phaseSense: 'lead', angleSense: 'against', as: (deg: number) => deg },
    { phaseSense: 'lag', angleSense: 'with', as: (deg: number) => 360 - deg },
  ] as const)('SP-01: strobe, $phaseSense and $angleSense rotation', async ({ as, ...senses }) => {
    const { inputs, published: printed, computed } = published['SP-01'];
    const got = await solved(
      runs({
        ...senses,
        base: readings(polars([inputs.V0_mm_deg_cw])),
        trials: [trial(inputs.trial_oz_deg, polars([inputs.V1_mm_deg_cw]))],
      }),
    );
    const [oz = NaN, deg = NaN] = printed.correction_oz_deg;
    expectWeights(got, [[oz, as(deg)]], { g: 0.01, deg: 1 });
    const [exactOz = NaN, exactDeg = NaN] =
      computed['correction_oz_deg (weight sense OPPOSITE to phase sense)'];
    expectWeights(got, [[exactOz, as(exactDeg)]], { g: 1e-9, deg: 1e-9 });
  });

  it('SP-01: a wrong sense gives another place, so no sense is assumed', async () => {
    const { inputs, computed } = published['SP-01'];
    const got = await solved(
      runs({
        base: readings(polars([inputs.V0_mm_deg_cw])),
        trials: [trial(inputs.trial_oz_deg, polars([inputs.V1_mm_deg_cw]))],
      }),
    );
    expectWeights(got, [computed['correction if one common sense were assumed']], {
      g: 1e-9,
      deg: 1e-9,
    });
  });
});

// Constructed: a forward model V = V0 + A·W with known unbalance.
describe('TP-07, whose unbalance is known by construction', () => {
  const { inputs, computed } = published['TP-07'];
  const first = trial(inputs.trial1_g_deg, polars(inputs.V_trial1));
  const base = readings(polars(inputs.V0));

  it('comes back where each trial is taken off', async () => {
    const second = trial(inputs.trial2_g_deg, polars(inputs.V_trial2));
    const got = await solved(runs({ base, trials: [first, second] }));
    expectWeights(got, computed.correction_g_deg, { g: 1e-6, deg: 1e-6 });
    expect(got.staying).toEqual([]);
  });

  it('comes back as the total where the first trial stays on', async () => {
    // V = V0 + A·(W1 + W2) = V_trial1 + V_trial2 − V0.
    const both = polars(inputs.V_trial1).map((one, i) =>
      plusMinus(one, polars(inputs.V_trial2)[i], polars(inputs.V0)[i]),
    );
    const { staying, answer } = await solved(
      runs({
        base,
        trials: [{ ...first, stays: 'stays on' }, trial(inputs.trial2_g_deg, both)],
      }),
    );
    expect(staying).toEqual([{ planeId: 1, massG: 25, angleDeg: 0 }]);
    const [one, two] = answer?.planes ?? [];
    // 60 g at 305° in all; 25 g at 0° of it hang there: 60·cos 305° − 25 = 9.4146, 60·sin 305° = −49.1491.
    near(one?.totalMassG ?? NaN, 60, 1e-6);
    nearDeg(one?.totalAngleDeg ?? NaN, 305, 1e-6);
    near(one?.massG ?? NaN, 50.0427, 1e-4);
    nearDeg(one?.angleDeg ?? NaN, 280.8437, 1e-4);
    near(two?.massG ?? NaN, 35, 1e-6);
    nearDeg(two?.angleDeg ?? NaN, 120, 1e-6);
  });
});

describe('senses', () => {
  const turned = (deg: number) => (360 - deg) % 360;
  const mirror = (list: readonly Polar[]) =>
    list.map(({ amp, deg }) => ({ amp, deg: turned(deg) }));

  it('give the same place whichever way phase and degrees are counted', async () => {
    const straight = await solved(s02());
    const mirrored = await solved(
      s02({
        phaseSense: 'lead',
        angleSense: 'with',
        base: readings(mirror(S02.inputs.base)),
        trials: S02.inputs.trial.map(({ g, deg, radius_mm: radiusMm, run }) =>
          trial([g, turned(deg)], mirror(run), { radiusMm }),
        ),
      }),
    );
    expect([straight.angleSense, mirrored.angleSense]).toEqual(['against', 'with']);
    expectWeights(
      mirrored,
      (straight.answer?.planes ?? []).map(({ massG, angleDeg }) => [massG, angleDeg]),
      { g: 1e-9, deg: 1e-9 },
    );
  });
});

function plusMinus(a: Polar, b: Polar | undefined, c: Polar | undefined): Polar {
  const parts = [a, b, c].map((v, i) => {
    const radians = ((v?.deg ?? NaN) * Math.PI) / 180;
    const sign = i === 2 ? -1 : 1;
    return [sign * (v?.amp ?? NaN) * Math.cos(radians), sign * (v?.amp ?? NaN) * Math.sin(radians)];
  });
  const [x = NaN, y = NaN] = [0, 1].map((k) =>
    parts.reduce((sum, part) => sum + (part[k] ?? 0), 0),
  );
  return { amp: Math.hypot(x, y), deg: ((Math.atan2(y, x) * 180) / Math.PI + 360) % 360 };
}
