import { describe, expect, it } from 'vitest';
import { tolerance } from '@/lib/server/workbench/tolerance';
import { near } from '@/tests/domain/balancing/near';
import scenarios from '@/tests/reference/data/balancing-scenarios.json';
import { reader, readings, refused, runs, s02, solved, trial, type Runs } from './runs-as-typed';

const { S02, S08 } = scenarios.scenarios;

/** S02 with its first trial changed. */
function firstTrial(over: Partial<Runs['trials'][number]>): Runs {
  const input = s02();
  const [first, second] = input.trials;
  if (!first || !second) throw new Error('S02 has two trials');
  return { ...input, trials: [{ ...first, ...over }, second] };
}

describe('what is missing or wrong is named', () => {
  it.each(['phaseSense', 'angleSense', 'unit', 'rotationFromDriveEnd'] as const)(
    'no %s is assumed',
    async (field) => {
      const { [field]: _left, ...rest } = s02();
      // The form sends nothing where nothing is chosen.
      const failure = await refused(rest as Runs);
      expect(failure).toMatchObject({ field });
      expect(failure.message).toMatch(/^(Say|Choose) [^.]+\.$/);
    },
  );

  it('nor whether the trial weight stayed on', async () => {
    const failure = await refused(firstTrial({ stays: '' as 'stays on' }));
    expect(failure).toMatchObject({ field: 'trials.0.stays' });
    expect(failure.message).toContain('taken off after its run or stays on the rotor');
  });

  it.each(['0', '-5'])('a trial weight of %s g', async (massG) => {
    const { field, message } = await refused(firstTrial({ massG }));
    expect(field).toBe('trials.0.massG');
    expect(message).toContain('must be more than 0');
  });

  it.each(['-10', '720'])('an angle of %s°, on the rotor and in each run', async (typed) => {
    const onRotor = await refused(firstTrial({ angleDeg: typed }));
    expect(onRotor.field).toBe('trials.0.angleDeg');
    expect(onRotor.message).toContain('An angle runs from 0 to 360 degrees');
    const inTrial = await refused(
      firstTrial({ readings: readings(S02.inputs.base).map((r) => ({ ...r, phaseDeg: typed })) }),
    );
    expect(inTrial.field).toBe('trials.0.readings.0.phaseDeg');
    // The name that the field of the form has: the base run is typed once.
    const inBase = await refused(
      s02({ base: readings(S02.inputs.base).map((r) => ({ ...r, phaseDeg: typed })) }),
    );
    expect(inBase.field).toBe('base.0.phaseDeg');
  });

  it('a point without a reading', async () => {
    const { message } = await refused(s02({ base: readings(S02.inputs.base.slice(0, 1)) }));
    expect(message).toContain('a reading of every point in every run');
  });
});

describe('runs that cannot be answered for', () => {
  it('a trial that changed nothing, naming its plane', async () => {
    const { code, message } = await refused(firstTrial({ readings: readings(S02.inputs.base) }));
    expect(code).toBe('no-response');
    expect(message).toContain('The trial weight in plane 1 changed nothing at any point');
  });

  it('planes that act alike: no weight is shown, in words why', async () => {
    const input = s02();
    const [first] = input.trials;
    if (!first) throw new Error('a trial is typed');
    const { answer, refusal, trialChecks } = await solved({ ...input, trials: [first, first] });
    expect(answer).toBeNull();
    expect(refusal).toContain('planes 1 and 2 changed every point alike');
    expect(refusal).not.toContain('offered');
    expect(trialChecks).toHaveLength(2);
  });

  it('a base run of zero, at its own field', async () => {
    const still = S02.inputs.base.map(() => ({ amp: 0, deg: 0 }));
    const { field, message } = await refused(s02({ base: readings(still) }));
    expect(field).toBe('base.0.amplitude');
    expect(message).toContain('nothing to correct');
  });

  // Scenario S08, with the scatter of its four base runs typed: change 1.9 % of the reading.
  it('a trial that is not heard over the scatter typed', async () => {
    const {
      base_mean: mean,
      scatter_complex_sd_mm_s: scatter,
      trial_change_pct: pct,
    } = S08.expected;
    const { answer, refusal, trialChecks } = await solved(
      runs({
        scatter,
        base: readings([mean]),
        trials: [trial([S08.inputs.trial.g, S08.inputs.trial.deg], [S08.inputs.trial_run])],
      }),
    );
    expect(answer).toBeNull();
    expect(refusal).toMatch(/plane 1 changed the reading by 0\.4\d times the noise/);
    near(trialChecks[0]?.changePct ?? NaN, pct, 0.1);
    expect(trialChecks[0]).toMatchObject({ verdict: 'refuse', thirtyRule: false });
  });

  it('a trial that may be noise is answered with that said, and by the name of its run', async () => {
    const barely = S02.inputs.base.map(({ amp, deg }) => ({ amp: amp * 1.05, deg }));
    const { answer } = await solved(firstTrial({ readings: readings(barely) }));
    expect(answer?.warnings.join(' ')).toContain(
      'The weight of the trial run in plane 1 moved no reading by 30 %',
    );
  });
});

it('asks for no permission that a role lacks, and knows an unknown role', async () => {
  const stranger = { ...reader, role: 'stranger' as 'reader' };
  expect(await tolerance(stranger, { gradeMmS: 1, massKg: 1, speedRpm: 1 })).toMatchObject({
    failure: { code: 'forbidden' },
  });
});
