import { describe, expect, it } from 'vitest';
import type { Actor } from '@/lib/schemas/actor';
import type { SolvedRuns } from '@/lib/schemas/workbench';
import { solveRuns } from '@/lib/server/workbench/solve-runs';
import { split } from '@/lib/server/workbench/split';
import { tolerance } from '@/lib/server/workbench/tolerance';
import { near, nearDeg } from '@/tests/domain/balancing/near';
import published from '@/tests/reference/data/balancing-published.json';
import scenarios from '@/tests/reference/data/balancing-scenarios.json';

const reader: Actor = {
  personId: 1,
  name: 'R',
  email: 'r@example.test',
  role: 'reader',
  sites: [],
};

type Runs = Parameters<typeof solveRuns>[1];
type Polar = { amp: number; deg: number };

const readings = (list: readonly Polar[]) =>
  list.map(({ amp, deg }) => ({ amplitude: String(amp), phaseDeg: String(deg) }));
const pairs = (list: readonly (readonly number[])[]) =>
  list.map(([amp = NaN, deg = NaN]) => ({ amp, deg }));

function runs(over: Partial<Runs> & Pick<Runs, 'base' | 'trials' | 'planes'>): Runs {
  return {
    unit: 'mm/s rms',
    phaseSense: 'lag',
    angleSense: 'against',
    rotationFromDriveEnd: 'clockwise',
    speedRpm: '990',
    rotorMassKg: '',
    ...over,
  };
}

// Scenario S02: invented plant; expected values computed by an independent implementation.
const { S01, S02 } = scenarios.scenarios;
const s02 = (over: Partial<Runs> = {}) =>
  runs({
    planes: [{ radiusMm: '700' }, { radiusMm: '700' }],
    base: readings(S02.inputs.base),
    trials: S02.inputs.trial.map((trial) => ({
      massG: trial.g,
      radiusMm: trial.radius_mm,
      angleDeg: trial.deg,
      stays: 'taken off' as const,
      readings: readings(trial.run),
    })),
    ...over,
  });

async function solved(input: Runs): Promise<SolvedRuns> {
  const result = await solveRuns(reader, input);
  if (!result.ok) throw new Error(result.failure.message);
  return result.value;
}

async function refused(input: Runs) {
  const result = await solveRuns(reader, input);
  if (result.ok) throw new Error('solved, where it had to be refused');
  return result.failure;
}

describe('typed runs', () => {
  it('give the answer of S02 with condition number and predicted residual', async () => {
    const { answer } = await solved(s02());
    for (const [index, want] of S02.expected.correction.entries()) {
      near(answer?.planes[index]?.massG ?? NaN, want.g, S02.tol.g);
      nearDeg(answer?.planes[index]?.angleDeg ?? NaN, want.deg, S02.tol.deg);
    }
    expect(answer?.condition.number).toBeCloseTo(S02.expected.condition_number_scaled, 2);
    for (const point of answer?.predicted ?? []) near(point.amplitude, 0, 1e-9);
  });

  it('give the answer of S01 from one base run of its mean', async () => {
    const { base_mean: mean, correction } = S01.expected;
    const { trial, trial_run: run } = S01.inputs;
    const { answer } = await solved(
      runs({
        speedRpm: '1480',
        rotorMassKg: '210',
        planes: [{ radiusMm: trial.radius_mm }],
        base: readings([mean]),
        trials: [
          {
            massG: trial.g,
            radiusMm: trial.radius_mm,
            angleDeg: trial.deg,
            stays: 'taken off',
            readings: readings([run]),
          },
        ],
      }),
    );
    near(answer?.planes[0]?.massG ?? NaN, correction.g, 0.1);
    nearDeg(answer?.planes[0]?.angleDeg ?? NaN, correction.deg, 0.5);
  });

  // Constructed: a forward model V = V0 + A·W with known unbalance.
  it('give TP-07 back, whose unbalance is known by construction', async () => {
    const { inputs, computed } = published['TP-07'];
    const trials = [
      { weight: inputs.trial1_g_deg, run: inputs.V_trial1 },
      { weight: inputs.trial2_g_deg, run: inputs.V_trial2 },
    ].map(({ weight: [massG = NaN, angleDeg = NaN], run }) => ({
      massG,
      angleDeg,
      radiusMm: 100,
      stays: 'taken off' as const,
      readings: readings(pairs(run)),
    }));
    const { answer } = await solved(
      s02({
        planes: [{ radiusMm: 100 }, { radiusMm: 100 }],
        base: readings(pairs(inputs.V0)),
        trials,
      }),
    );
    for (const [index, [mass = NaN, deg = NaN]] of computed.correction_g_deg.entries()) {
      near(answer?.planes[index]?.massG ?? NaN, mass, 1e-6);
      nearDeg(answer?.planes[index]?.angleDeg ?? NaN, deg, 1e-6);
    }
  });

  it('give the same place whichever way phase and degrees are counted', async () => {
    const straight = await solved(s02());
    const turned = (deg: number) => (360 - deg) % 360;
    const mirror = (list: readonly Polar[]) =>
      readings(list.map(({ amp, deg }) => ({ amp, deg: turned(deg) })));
    const mirrored = await solved(
      s02({
        phaseSense: 'lead',
        angleSense: 'with',
        base: mirror(S02.inputs.base),
        trials: S02.inputs.trial.map((trial) => ({
          massG: trial.g,
          radiusMm: trial.radius_mm,
          angleDeg: turned(trial.deg),
          stays: 'taken off' as const,
          readings: mirror(trial.run),
        })),
      }),
    );
    for (const [index, plane] of (straight.answer?.planes ?? []).entries()) {
      near(mirrored.answer?.planes[index]?.massG ?? NaN, plane.massG, 1e-9);
      nearDeg(mirrored.answer?.planes[index]?.angleDeg ?? NaN, plane.angleDeg, 1e-9);
    }
  });
});

describe('typed runs that cannot be answered for', () => {
  it.each(['phaseSense', 'angleSense', 'unit', 'rotationFromDriveEnd'] as const)(
    'name the missing %s, and assume none',
    async (field) => {
      const { [field]: _left, ...rest } = s02();
      // The form sends nothing where nothing is chosen.
      expect(await refused(rest as Runs)).toMatchObject({ field });
    },
  );

  it('name a trial weight of nothing', async () => {
    const input = s02();
    const [first, second] = input.trials;
    if (!first || !second) throw new Error('two trials are typed');
    const { field, message } = await refused({
      ...input,
      trials: [{ ...first, massG: '0' }, second],
    });
    expect(field).toBe('trials.0.massG');
    expect(message).toContain('must be more than 0');
    const silent = await refused({
      ...input,
      trials: [{ ...first, stays: '' as 'stays on' }, second],
    });
    expect(silent).toMatchObject({ field: 'trials.0.stays' });
  });

  it.each(['-10', '720'])('name an angle of %s°', async (angleDeg) => {
    const input = s02();
    const [first, second] = input.trials;
    if (!first || !second) throw new Error('two trials are typed');
    const { field, message } = await refused({
      ...input,
      trials: [{ ...first, angleDeg }, second],
    });
    expect(field).toBe('trials.0.angleDeg');
    expect(message).toContain('An angle runs from 0 to 360 degrees');
  });

  it('show no exact answer where the planes cannot be told apart', async () => {
    const input = s02();
    const [first] = input.trials;
    if (!first) throw new Error('a trial is typed');
    const { answer, refusal } = await solved({ ...input, trials: [first, first] });
    expect(answer?.staticPair ?? true).toBe(true);
    expect([refusal ?? '', ...(answer?.warnings ?? [])].join(' ')).toMatch(
      /cannot be told apart|act alike|the same/,
    );
  });

  it('ask for what is missing in a run', async () => {
    const { message } = await refused(s02({ base: readings(S02.inputs.base.slice(0, 1)) }));
    expect(message).toContain('a reading of every point in every run');
  });
});

describe('tolerance', () => {
  // ISO 1940-1:2003 annex example, carried into ISO 21940-11:2016; from memory.
  it('gives the standard’s turbine rotor, as a whole and at its bearings', async () => {
    const { inputs, published: given } = published['BQ-01'];
    const result = await tolerance(reader, {
      gradeMmS: inputs.G,
      massKg: inputs.m_kg,
      speedRpm: inputs.n_rpm,
      apartM: inputs.L_mm / 1000,
      massCentreFromAM: inputs.L_A_mm / 1000,
      residualAGmm: '10000',
      residualBGmm: '18000',
    });
    const value = result.ok ? result.value : null;
    near(value?.totalGmm ?? NaN, given['U_per g.mm'], 100);
    near(value?.specificUm ?? NaN, given['e_per g.mm/kg'], 0.01);
    const [a, b] = value?.bearings ?? [];
    near(a?.permissibleGmm ?? NaN, given.U_per_A, 100);
    near(b?.permissibleGmm ?? NaN, given.U_per_B, 100);
    expect([a?.met, b?.met]).toEqual([true, false]);
  });

  it.each([
    [{ massKg: '0' }, 'massKg'],
    [{ speedRpm: '' }, 'speedRpm'],
    [{ apartM: '2' }, 'massCentreFromAM'],
    [{ massCentreFromAM: '2' }, 'apartM'],
    [{ residualAGmm: '2' }, 'apartM'],
  ])('asks for what is missing: %o', async (over, field) => {
    const given = { gradeMmS: '6,3', massKg: '210', speedRpm: '1480', ...over };
    expect(await tolerance(reader, given)).toMatchObject({ failure: { field } });
  });
});

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

it('asks for no permission that a role lacks, and knows an unknown role', async () => {
  const stranger = { ...reader, role: 'stranger' as 'reader' };
  expect(await tolerance(stranger, { gradeMmS: 1, massKg: 1, speedRpm: 1 })).toMatchObject({
    failure: { code: 'forbidden' },
  });
});
