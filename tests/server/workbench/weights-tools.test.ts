import { describe, expect, it } from 'vitest';
import { angleDeg, size } from '@/lib/domain/complex';
import { combine } from '@/lib/server/workbench/combine';
import { COMPUTATIONS, isComputation } from '@/lib/server/workbench/computations';
import { pieces } from '@/lib/server/workbench/pieces';
import { sixPlaces } from '@/lib/server/workbench/six-places';
import { solveRows } from '@/lib/server/workbench/solve-rows';
import { trialWeight } from '@/lib/server/workbench/trial-weight';
import { withoutPhase } from '@/lib/server/workbench/without-phase';
import { near, nearDeg } from '@/tests/domain/balancing/near';
import data from '@/tests/reference/data/balancing-scenarios.json';
import { reader } from './runs-as-typed';

/** Invented scenarios; expected values computed independently of this code. */
const { S04, S13, S16 } = data.scenarios;

const withoutPhaseBody = {
  unit: 'mm/s rms',
  angleSense: 'against',
  rotationFromDriveEnd: 'clockwise',
  radiusMm: String(S13.inputs.radius_mm),
  trialMassG: String(S13.inputs.trial_g),
  baseAmplitude: String(S13.inputs.base_mm_s),
  runs: S13.inputs.runs.map(({ deg, mm_s: amplitude }) => ({
    angleDeg: String(deg),
    amplitude: String(amplitude),
  })),
} as const;

const [wheel] = S04.machine.planes;
const piecesBody = {
  massG: '90.82',
  angleDeg: '129',
  radiusMm: '310',
  angleSense: 'against',
  rotationFromDriveEnd: 'clockwise',
  positions: String(wheel?.positions),
  firstDeg: '0',
  numbered: 'against',
  pieceG: '5',
  maxG: '60',
  mayRemainGmm: '1583',
} as const;

const combineBody = {
  angleSense: 'against' as const,
  toRadiusMm: '400',
  weights: [
    { massG: '12', radiusMm: '400', angleDeg: '40' },
    { massG: '9', radiusMm: '400', angleDeg: '155' },
  ],
};

const sixBody = {
  angleSense: 'against' as const,
  firstDeg: '0',
  massG: '22.5',
  radiusMm: '400',
  amplitudes: ['7.1', '8.9', '9.6', '8.4', '6.3', '5.5'],
};

const rowsBody = {
  unit: 'mm/s rms' as const,
  phaseSense: 'lag' as const,
  planes: S16.machine.planes.map((name, i) => ({
    name,
    limitGmm: String(S16.machine.limits_g_mm[i]),
  })),
  rows: S16.inputs.rows.map(({ sensor, speed, weight, base }, p) => ({
    label: `${sensor} ${speed}`,
    weight: Math.sqrt(weight),
    now: { size: base.amp, phaseDeg: base.deg },
    coefficients: (S16.inputs.coefficients_mm_s_per_g_mm[p] ?? []).map((h) => ({
      perKgMm: 1000 * size(h),
      turnDeg: angleDeg(h),
    })),
  })),
};

describe('without phase', () => {
  it('answers S13, and the same with degrees counted the other way', async () => {
    const answer = await withoutPhase(reader, withoutPhaseBody);
    if (!answer.ok) throw new Error(answer.failure.message);
    near(answer.value.massG, S13.expected.correction.g, S13.tol.g);
    nearDeg(answer.value.angleDeg, S13.expected.correction.deg, S13.tol.deg);
    near(answer.value.consistency, S13.expected.consistency, 0.002);
    const mirrored = await withoutPhase(reader, {
      ...withoutPhaseBody,
      angleSense: 'with',
      runs: withoutPhaseBody.runs.map((run) => ({
        ...run,
        angleDeg: String((360 - Number(run.angleDeg)) % 360),
      })),
    });
    if (!mirrored.ok) throw new Error(mirrored.failure.message);
    nearDeg(mirrored.value.angleDeg, answer.value.angleDeg, 1e-9);
  });

  it('refuses sizes that one weight moved round cannot make', async () => {
    const runs = withoutPhaseBody.runs.map((run) => ({ ...run, amplitude: '1' }));
    expect(await withoutPhase(reader, { ...withoutPhaseBody, runs })).toMatchObject({
      failure: { code: 'impossible-sizes' },
    });
  });
});

describe('pieces', () => {
  it('proposes for S04’s weight what fits on empty blades', async () => {
    const answer = await pieces(reader, piecesBody);
    if (!answer.ok) throw new Error(answer.failure.message);
    const [proposed] = answer.value.choices.filter((choice) => choice.proposed);
    // Two blades have the room here: 49.6 and 51.2 g are wanted on blades 3 and 4.
    expect(proposed?.weights.map(({ label, massG }) => [label, massG])).toEqual([
      ['3', 50],
      ['4', 50],
    ]);
    expect(proposed?.meetsTarget).toBe(true);
  });

  it('says which field is wrong', async () => {
    expect(await pieces(reader, { ...piecesBody, firstDeg: '720' })).toMatchObject({
      failure: { field: 'firstDeg' },
    });
  });
});

it('combine: two on one radius, and one moved to another', async () => {
  // Unit checks of the scenarios: 12 g at 40° and 9 g at 155°; 30 g from 400 to 352 mm.
  const sum = await combine(reader, combineBody);
  if (!sum.ok) throw new Error(sum.failure.message);
  near(sum.value.massG, 11.56, 0.005);
  nearDeg(sum.value.angleDeg, 84.9, 0.05);
  const moved = await combine(reader, {
    angleSense: 'with',
    toRadiusMm: '352',
    weights: [{ massG: '30', radiusMm: '400', angleDeg: '75' }],
  });
  if (!moved.ok) throw new Error(moved.failure.message);
  near(moved.value.massG, 34.09, 0.005);
  nearDeg(moved.value.angleDeg, 285, 1e-9);
});

it('six places: the published form of the residual, whichever way the places run', async () => {
  const answer = await sixPlaces(reader, sixBody);
  if (!answer.ok) throw new Error(answer.failure.message);
  near(answer.value.residualGmm, 2443.7, 1);
  const other = await sixPlaces(reader, { ...sixBody, angleSense: 'with' });
  if (!other.ok) throw new Error(other.failure.message);
  nearDeg(other.value.angleDeg, 360 - answer.value.angleDeg, 1e-9);
});

it('rows: S16 within its limits, with the bound that proves it', async () => {
  const answer = await solveRows(reader, rowsBody);
  if (!answer.ok) throw new Error(answer.failure.message);
  const { planes, rmsBefore, rmsAfter, rmsAtLeast, unlimited } = answer.value;
  S16.expected.limited.forEach(({ g_mm: gmm, deg }, i) => {
    near(planes[i]?.unbalanceGmm ?? NaN, gmm, S16.tol.g_mm);
    nearDeg(planes[i]?.angleDeg ?? NaN, deg, S16.tol.deg);
  });
  near(rmsBefore, S16.expected.rms_before, S16.tol.mm_s);
  near(rmsAfter, S16.expected.limited_rms_after, S16.tol.mm_s);
  expect(rmsAfter - rmsAtLeast).toBeLessThan(1e-6);
  near(unlimited?.[0]?.unbalanceGmm ?? NaN, S16.expected.unlimited[0]?.g_mm ?? 0, S16.tol.g_mm);
  const short = {
    ...rowsBody,
    rows: rowsBody.rows.slice(0, 1).map((row) => ({ ...row, coefficients: [] })),
  };
  expect(await solveRows(reader, short)).toMatchObject({
    failure: { field: 'rows.0.coefficients' },
  });
});

it('trial weight: by the force cap, and by a known coefficient', async () => {
  const body = {
    ...{ radiusMm: '400', speedRpm: '1480', rotorMassKg: '210', planes: 'one' as const },
    ...{ planeLimitG: '', amplitudeNow: '', perKgMm: '' },
  };
  const capped = await trialWeight(reader, body);
  if (!capped.ok) throw new Error(capped.failure.message);
  // 10 % of 210 kg·g is 205.9 N; at 1480 r/min and 400 mm that is 21.4 g (rule of thumb of handbooks).
  near(capped.value.massG, 21.43, 0.01);
  near(capped.value.forceN, 205.94, 0.05);
  const known = await trialWeight(reader, { ...body, amplitudeNow: '3.873', perKgMm: '0.3688' });
  if (!known.ok) throw new Error(known.failure.message);
  near(known.value.massG, (0.4 * 3.873) / 0.3688e-3 / 400, 1e-6);
  expect(await trialWeight(reader, { ...body, amplitudeNow: '3.873' })).toMatchObject({
    failure: { field: 'perKgMm' },
  });
});

describe('the public API', () => {
  const bodies: Record<string, { body: object; senses: readonly string[] }> = {
    'without-phase': {
      body: withoutPhaseBody,
      senses: ['angleSense', 'rotationFromDriveEnd', 'unit'],
    },
    pieces: { body: piecesBody, senses: ['angleSense', 'numbered', 'rotationFromDriveEnd'] },
    combine: { body: combineBody, senses: ['angleSense'] },
    'six-places': { body: sixBody, senses: ['angleSense'] },
    'solve-rows': { body: rowsBody, senses: ['phaseSense', 'unit'] },
  };
  const cases = Object.entries(bodies).flatMap(([name, { body, senses }]) =>
    senses.map((sense) => ({ name, body, sense })),
  );
  const sent = (body: object) =>
    new Request('http://127.0.0.1/', { method: 'POST', body: JSON.stringify(body) });

  it.each(cases)('$name without $sense is refused with 422', async ({ name, body, sense }) => {
    if (!isComputation(name)) throw new Error(`no computation ${name}`);
    const { answer } = COMPUTATIONS[name];
    expect((await answer(reader, sent(body))).status).toBe(200);
    const { [sense]: _left, ...rest } = body as Record<string, unknown>;
    expect((await answer(reader, sent(rest))).status).toBe(422);
    expect((await answer(reader, sent({ ...body, typo: 1 }))).status).toBe(422);
  });
});
