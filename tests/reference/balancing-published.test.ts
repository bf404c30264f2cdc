import { describe, expect, it } from 'vitest';
import type { JobInput, StoredCoefficient } from '@/lib/domain/balancing/job-input';
import { combineMasses } from '@/lib/domain/balancing/move-weight';
import { moveToTolerancePlanes } from '@/lib/domain/balancing/residual-unbalance';
import { solveJob } from '@/lib/domain/balancing/solve-job';
import { residualAfter } from '@/lib/domain/balancing/solve-correction';
import { jobFromTypedRuns, type TypedRuns } from '@/lib/domain/balancing/typed-runs';
import { coefficientMatrix } from '@/lib/domain/balancing/response-model';
import { angleDeg, fromPolar, scale, size, sum, type Complex } from '@/lib/domain/complex';
import { normaliseDeg } from '@/lib/domain/units';
import { job, run, valueOf, weight, type Polar } from '../domain/balancing/job-builder';
import { near, nearDeg } from '../domain/balancing/near';
import data from './data/balancing-published.json';

// Masses hang at radius 1, so that unbalance and mass are one number; oz and kg stand where g does.
const RADIUS = 1;

const polar = ([amp = NaN, deg = NaN]: readonly number[]): Polar => ({ amp, deg });
const vectors = (list: readonly (readonly number[])[]) => list.map(polar);
const trial = (planeId: number, [mass = NaN, deg = NaN]: readonly number[]) =>
  weight(planeId, mass, RADIUS, deg);

/** Base run and one trial run per plane, each trial taken off again. */
function learnt(
  base: readonly Polar[],
  trials: readonly { on: ReturnType<typeof weight>; readings: readonly Polar[] }[],
): JobInput {
  const runs = trials.map(({ on, readings }, i) => run(i + 2, 'trial', readings, [on]));
  return job(
    trials.map(() => RADIUS),
    base.length,
    [run(1, 'base', base), ...runs],
    { weightsNow: [] },
  );
}

function expectWeights(
  got: readonly { massG: number; angleDeg: number }[],
  want: readonly (readonly number[])[],
  within = 1e-9,
) {
  expect(got).toHaveLength(want.length);
  want.forEach(([mass = NaN, deg = NaN], i) => {
    near(got[i]!.massG, mass, within * mass);
    nearDeg(got[i]!.angleDeg, deg, within * 360);
  });
}

// S. S. Rao, Mechanical Vibrations, two-plane balancing example (ch. 9) and its program; from memory.
describe('TP-01: turbine rotor, two planes', () => {
  const { inputs, published } = data['TP-01'];
  const { V0, V_L: left, V_R: right } = inputs;
  const input = learnt(vectors([V0.A, V0.B]), [
    { on: trial(1, inputs.trial_L_oz_deg), readings: vectors([left.A, left.B]) },
    { on: trial(2, inputs.trial_R_oz_deg), readings: vectors([right.A, right.B]) },
  ]);
  const { model, answer, now } = valueOf(solveJob(input));

  it('has the published coefficients', () => {
    const names = ['A_AL', 'A_BL', 'A_AR', 'A_BR'] as const;
    names.forEach((name, i) => {
      const { rePerGmm, imPerGmm } = model.coefficients[i]!;
      near(rePerGmm, published[name][0]!, 1e-4);
      near(imPerGmm, published[name][1]!, 1e-4);
    });
  });

  // The printed angles are those of the unbalance; what cancels it hangs opposite.
  it('asks for the published masses opposite to the published angles', () => {
    [published.U_L_oz_deg, published.U_R_oz_deg].forEach(([oz = NaN, deg = NaN], i) => {
      near(answer!.add[i]!.massG, oz, 1e-4);
      nearDeg(answer!.add[i]!.angleDeg, deg + 180, 1e-4);
    });
  });

  it('would double the vibration with weights at the published angles', () => {
    const atPublished = [published.U_L_oz_deg, published.U_R_oz_deg].map(([oz = 0, deg = 0]) =>
      fromPolar(oz, deg),
    );
    const vNow = now.map(({ amplitude, lagDeg }) => fromPolar(amplitude, lagDeg));
    const task = { now: vNow, coefficients: coefficientMatrix(model, input) };
    const sizes = residualAfter(task, atPublished).map(size);
    near(sizes[0]!, 17, 0.001);
    near(sizes[1]!, 13, 0.001);
  });
});

// Forward models written for the check: exact by construction.
describe('TP-07, TP-09: one rotor, angles counted either way', () => {
  const { inputs, computed } = data['TP-07'];
  const readings = [inputs.V0, inputs.V_trial1, inputs.V_trial2].map(vectors);
  const typed = (senses: Pick<TypedRuns, 'angleSense'>, angles: readonly number[]): TypedRuns => ({
    unit: 'mm/s rms',
    phaseSense: 'lag',
    ...senses,
    speedRpm: 1500,
    planes: [
      { name: '1', radiusMm: RADIUS },
      { name: '2', radiusMm: RADIUS },
    ],
    points: ['A', 'B'],
    base: [readings[0]!.map(({ amp, deg }) => ({ amplitude: amp, phaseDeg: deg }))],
    trials: angles.map((deg, i) => ({
      massG: [25, 20][i]!,
      radiusMm: RADIUS,
      angleDeg: deg,
      stays: false,
      readings: readings[i + 1]!.map(({ amp, deg: lag }) => ({ amplitude: amp, phaseDeg: lag })),
    })),
  });
  const answerTo = (runs: TypedRuns) => valueOf(solveJob(valueOf(jobFromTypedRuns(runs)))).answer!;

  it('TP-07: each trial taken off', () => {
    const input = learnt(readings[0]!, [
      { on: trial(1, inputs.trial1_g_deg), readings: readings[1]! },
      { on: trial(2, inputs.trial2_g_deg), readings: readings[2]! },
    ]);
    const { answer, condition } = valueOf(solveJob(input));
    expectWeights(answer!.add, computed.correction_g_deg);
    expect(condition.verdict).toBe('good');
  });

  it('TP-09: typed with rotation, read with rotation', () => {
    const { computed: withRotation } = data['TP-09'];
    const answer = answerTo(typed({ angleSense: 'with' }, [0, 270]));
    const read = answer.add.map(({ massG, angleDeg: deg }) => ({
      massG,
      angleDeg: normaliseDeg(-deg),
    }));
    expectWeights(read, withRotation.correction_g_deg_with_rotation);
  });

  it('TP-09: mixed senses give right masses at wrong places', () => {
    const { computed: mixed } = data['TP-09'];
    const answer = answerTo(typed({ angleSense: 'against' }, [0, 270]));
    expectWeights(answer.add, mixed['WRONG answer if senses are mixed']);
  });

  it('TP-10: readings rounded to 0.01 mm/s and 1° cost less than a gram', () => {
    const { inputs: rounded, computed: want } = data['TP-10'];
    const input = learnt(vectors(rounded.V0), [
      { on: trial(1, rounded.trial1_g_deg), readings: vectors(rounded.V_trial1) },
      { on: trial(2, rounded.trial2_g_deg), readings: vectors(rounded.V_trial2) },
    ]);
    expectWeights(valueOf(solveJob(input)).answer!.add, want.correction_g_deg);
  });
});

describe('TP-11: planes nearly indistinguishable', () => {
  const { inputs, computed } = data['TP-11'];
  const coefficients: StoredCoefficient[] = inputs.influence.flatMap((row, p) =>
    row.map(([perG = NaN, deg = NaN], i) => {
      const { re, im } = fromPolar(perG, deg);
      return { planeId: i + 1, pointId: p + 1, rePerGmm: re, imPerGmm: im };
    }),
  );
  const solveFor = (base: readonly Polar[]) =>
    valueOf(
      solveJob(
        job([RADIUS, RADIUS], 2, [run(1, 'base', base)], {
          coefficientsFrom: { kind: 'stored', speedRpm: 1480, coefficients },
        }),
      ),
    );

  it('withholds the exact answer, which 2 % on one reading moves by tens of grams', () => {
    const base = vectors(inputs.V0);
    const { answer, withheld, condition } = solveFor(base);
    expect(condition.verdict).toBe('withhold');
    expect(withheld!.failure.code).toBe('ill-conditioned');
    expect(answer!.kind).toBe('static pair');
    expectWeights(withheld!.answer!.add, computed['correction exact data'], 1e-7);
    const more = [{ ...base[0]!, amp: 1.02 * base[0]!.amp }, base[1]!];
    expectWeights(
      solveFor(more).withheld!.answer!.add,
      computed['correction with V0 amplitude of sensor 1 +2 %'],
      1e-7,
    );
  });
});

describe('one plane', () => {
  const onePlane = (base: Polar, on: ReturnType<typeof weight>, after: Polar) =>
    valueOf(solveJob(learnt([base], [{ on, readings: [after] }])));

  // W. T. Thomson, Theory of Vibration with Applications, ch. 3, strobe example; from memory. Phase
  // grows clockwise and weights are counted the other way, which is what "with rotation" is to lag.
  it('SP-01: wheel on a balancing stand', () => {
    const { inputs, published, computed } = data['SP-01'];
    const [oz = NaN, deg = NaN] = inputs.trial_oz_deg;
    const base = polar(inputs.V0_mm_deg_cw);
    const after = polar(inputs.V1_mm_deg_cw);
    const { answer, trials } = onePlane(base, weight(1, oz, RADIUS, 360 - deg), after);
    const [plane] = answer!.add;
    near(plane!.massG, published.correction_oz_deg[0]!, 0.01);
    nearDeg(-plane!.angleDeg, published.correction_oz_deg[1]!, 1);
    const exact = computed['correction_oz_deg (weight sense OPPOSITE to phase sense)'];
    nearDeg(-plane!.angleDeg, exact[1]!, 1e-9);
    near(trials[0]!.points[0]!.changeAmplitude, computed.effect_of_trial_mm_deg[0]!, 1e-9);
    const oneSense = onePlane(base, weight(1, oz, RADIUS, deg), after).answer!;
    expectWeights(oneSense.add, [computed['correction if one common sense were assumed']]);
  });

  // Vector-diagram classic of training literature (e.g. Girdhar & Scheffer, 2004); from memory. A weight
  // moves against the way the strobe reading moved: −58° in one sense.
  it('SP-03: O = 5 at 120°, O + T = 8 at 30°', () => {
    const { inputs, published } = data['SP-03'];
    const [on, base, after] = [trial(1, inputs.trial_weight), inputs.O, inputs['O+T']];
    const { answer, trials } = onePlane(polar(base), on, polar(after));
    near(trials[0]!.points[0]!.changeAmplitude, published.T, 0.05);
    near(answer!.add[0]!.massG, published.correction, 0.05);
    nearDeg(answer!.add[0]!.angleDeg, -published.shift_from_trial_position_deg, 0.5);
  });

  // Forward model written for the check: exact by construction.
  it('SP-08: trial taken off, and trial left on', () => {
    const { inputs, published } = data['SP-08'];
    const on = trial(1, inputs.trial_g_deg);
    const input = learnt([polar(inputs.V0)], [{ on, readings: [polar(inputs.V1)] }]);
    const { correction_g_deg: bare, 'further weight if trial stays': further } =
      published['by construction'];
    expectWeights(valueOf(solveJob(input)).answer!.add, [bare]);
    const staying = valueOf(solveJob({ ...input, weightsNow: [on] })).answer!;
    expectWeights(staying.add, [further]);
    expectWeights(staying.total, [bare]);
  });
});

describe('known masses', () => {
  type Mass = { m_kg: number; R_m: number; deg: number };
  const unbalance = ({ m_kg: kg, R_m: m, deg }: Mass): Complex => fromPolar(kg * m, deg);

  // R. L. Norton, Design of Machinery, ch. 12, Example 12-1; from memory.
  it('SP-06: static balance in one plane', () => {
    const { inputs, published } = data['SP-06'];
    const masses = inputs.masses.map((m) => ({ massG: m.m_kg * m.R_m, angleDeg: m.deg }));
    const all = combineMasses(masses);
    near(all.massG, published['m_b R_b kg.m, deg'][0]!, 0.001);
    nearDeg(all.angleDeg + 180, published['m_b R_b kg.m, deg'][1]!, 0.05);
  });

  // R. L. Norton, Design of Machinery, ch. 12, Example 12-2; from memory.
  it('TP-04: dynamic balance in two planes', () => {
    const { inputs, published } = data['TP-04'];
    const { a, b } = moveToTolerancePlanes(
      inputs.masses.map(unbalance),
      inputs.masses.map(({ z_m: z }) => z),
      inputs.plane_B_z_m,
    );
    near(size(a), published['m_A R_A kg.m, deg'][0]!, 0.0005);
    nearDeg(angleDeg(a) + 180, published['m_A R_A kg.m, deg'][1]!, 0.005);
    near(size(b), published['m_B R_B kg.m, deg'][0]!, 0.0005);
    nearDeg(angleDeg(b) + 180, published['m_B R_B kg.m, deg'][1]!, 0.005);
  });

  // T. Bevan, The Theory of Machines, ch. 14 Example 1, as reproduced in FOSSEE's textbook companions.
  it('TP-06: one mass carried to two planes, outside and between them', () => {
    const { inputs, published } = data['TP-06'];
    const found = fromPolar(inputs.W_lb * inputs.r_in, 0);
    const span = inputs['d_in (between planes)'];
    const carried = (fromFirst: number) => {
      const { a, b } = moveToTolerancePlanes([found], [fromFirst], span);
      const cancel = [a, b].map((u) => scale(u, -1 / inputs.balance_radius_in));
      expect(size(sum(cancel))).toBeCloseTo(size(found) / inputs.balance_radius_in, 9);
      return cancel.map(({ re }) => re);
    };
    const outside = carried(-inputs['l_in (mass to plane 1)']);
    near(outside[0]!, -published.a.B1, 1e-9);
    near(outside[1]!, published.a.Bm, 1e-9);
    const between = carried(inputs['l_in (mass to plane 1)']);
    near(between[0]!, -published.b.B1, 1e-9);
    near(between[1]!, -published.b.Bm, 1e-9);
  });
});
