import { describe, expect, it } from 'vitest';
import { choosePositions, type OpenPosition } from '@/lib/domain/balancing/choose-positions';
import { angleOfPosition } from '@/lib/domain/balancing/convert-angle';
import { splitOntoPositions } from '@/lib/domain/balancing/split-onto-positions';
import { permissibleUnbalance } from '@/lib/domain/balancing/permissible-unbalance';
import { solveJob } from '@/lib/domain/balancing/solve-job';
import { job, run, valueOf, weight } from '../domain/balancing/job-builder';
import { near, nearDeg } from '../domain/balancing/near';
import data from './data/balancing-scenarios.json';

/** Invented scenario, computed independently of this code: seven blades, 5 g pieces, two used already. */
const { S04 } = data.scenarios;
const { machine, inputs, expected, tol } = S04;
const [plane] = machine.planes;
const radiusMm = plane!.radius_mm;

const blades: OpenPosition[] = Array.from({ length: plane!.positions }, (_, k) => {
  const label = `blade ${k + 1}`;
  const on = new Map(Object.entries(machine.ledger_before)).get(label) ?? 0;
  const numbering = { count: plane!.positions, firstDeg: plane!.blade_1_deg };
  const angleDeg = valueOf(angleOfPosition(k + 1, { ...numbering, numbered: 'against' }));
  return { id: k + 1, label, angleDeg, radiusMm, roomG: plane!.max_g_per_pad - on };
});

const trial = weight(1, inputs.trial.g, inputs.trial.radius_mm, 0);
const runs = [run(1, 'base', [inputs.base]), run(2, 'trial', [inputs.trial.run], [trial])];
const solution = valueOf(solveJob(job([radiusMm], 1, runs, { weightsNow: [] })));
const [free] = solution.answer!.add;
const perGmm = Math.hypot(
  solution.model.coefficients[0]!.rePerGmm,
  solution.model.coefficients[0]!.imPerGmm,
);

describe('S04: pieces on blades', () => {
  const allowed = valueOf(
    permissibleUnbalance(machine.balance_grade, machine.rotor_mass_kg, machine.speed_r_min),
  ).totalGmm;
  const plan = valueOf(
    choosePositions({
      wanted: free!,
      positions: blades,
      piecesG: [plane!.piece_g],
      targetGmm: allowed / 4,
    }),
  );

  it('starts from the answer at a free angle, whose two nearest blades have no room', () => {
    near(free!.massG, expected.free_angle_answer.g, tol.g);
    nearDeg(free!.angleDeg, expected.free_angle_answer.deg, tol.deg);
    near(allowed, expected.U_permissible_g_mm, 0.5);
    const unlimited = blades.map((blade) => ({ ...blade, maxG: null }));
    const shares = valueOf(splitOntoPositions(free!, unlimited));
    expect(shares.map(({ label }) => label)).toEqual(expected.two_nearest_pads.pads);
    shares.forEach(({ massG }, i) => near(massG, expected.two_nearest_pads.shares_g[i]!, tol.g));
    const limited = blades.map((blade) => ({ ...blade, maxG: blade.roomG }));
    expect(splitOntoPositions(free!, limited)).toMatchObject({ failure: { code: 'too-heavy' } });
  });

  it.each([
    [2, expected.best.up_to_2_pads],
    [3, expected.best.up_to_3_pads],
    [4, expected.best.up_to_4_pads],
  ])('finds the best with %i blades', (count, best) => {
    const choice = plan.choices[count - 1]!;
    const weights = Object.fromEntries(choice.weights.map(({ label, massG }) => [label, massG]));
    expect(weights).toEqual(best.weights_g);
    expect(choice.totalG).toBe(best.total_g);
    near(choice.residualGmm * perGmm, best.predicted_mm_s, tol.mm_s);
    expect(choice.proven).toBe(true);
  });

  it('proposes the fewest blades that leave a quarter of the allowance or less', () => {
    near(expected.target_mm_s, (allowed / 4) * perGmm, tol.mm_s);
    const weights = plan.proposal.weights.map(({ label, massG }) => [label, massG]);
    expect(Object.fromEntries(weights)).toEqual(expected.proposal.weights_g);
    expect(plan.proposal.meetsTarget).toBe(true);
  });
});
