import { describe, expect, it } from 'vitest';
import { convertOneX } from '@/lib/domain/balance-job/convert-one-x';
import { centrifugalForceN } from '@/lib/domain/balancing/centrifugal-force';
import {
  angleOfArc,
  angleOfPosition,
  lagAfterChange,
  lagFromPhase,
  rotorDegAfterChange,
  rotorDegFromWithRotation,
} from '@/lib/domain/balancing/convert-angle';
import { combineMasses, massAtRadiusG, splitMass } from '@/lib/domain/balancing/move-weight';
import { permissibleUnbalance, shareByLever } from '@/lib/domain/balancing/permissible-unbalance';
import { staticAndCouple } from '@/lib/domain/balancing/residual-unbalance';
import { ledgerSum } from '@/lib/domain/balancing/weights-ledger';
import { angleDeg, fromPolar, size } from '@/lib/domain/complex';
import { lagAs, sizeFactor } from '@/lib/domain/signal/quantity';
import { hzFromRpm, rpm, STANDARD_GRAVITY_M_S2 } from '@/lib/domain/units';
import { codeOf, valueOf } from '../domain/balancing/job-builder';
import { near, nearDeg } from '../domain/balancing/near';
import data from './data/balancing-scenarios.json';

type Check = (typeof data.unit_checks)[number];

/** Single facts computed independently of this code, found by the start of their names. */
function check(name: string): {
  input: Record<string, unknown>;
  expected: Record<string, unknown>;
  tol: number;
} {
  const found = data.unit_checks.filter((c: Check) => c.name.startsWith(name));
  const [only] = found;
  if (!only || found.length > 1) throw new Error(`${found.length} checks start with “${name}”.`);
  return { input: only.input, expected: only.expected, tol: only.tol ?? 1e-9 };
}

/** A number of a check; 0 would pass too much, so a missing one fails. */
function numberOf(record: Record<string, unknown>, key: string): number {
  const value = record[key];
  if (typeof value !== 'number') throw new Error(`The check has no number ${key}.`);
  return value;
}

describe('angles and lags', () => {
  it('lead as lag', () => {
    const { input, expected } = check('lag from lead');
    const lag = lagFromPhase({
      deg: numberOf(input, 'lead_deg'),
      sense: 'lead',
      to: 'positive peak',
    });
    expect(lag).toBe(numberOf(expected, 'lag_deg'));
  });

  it('angle counted with rotation', () => {
    const { input, expected } = check('angle with rotation');
    expect(rotorDegFromWithRotation(numberOf(input, 'with_rotation_deg'))).toBe(
      numberOf(expected, 'against_rotation_deg'),
    );
  });

  it.each([
    ['blade number to angle, 7 blades numbered WITH', 'with'],
    ['blade number to angle, 7 blades numbered AGAINST', 'against'],
  ] as const)('%s rotation', (name, numbered) => {
    const { input, expected, tol } = check(name);
    const firstDeg = numberOf(input, 'blade1_deg');
    const ring = { count: numberOf(input, 'N'), firstDeg, numbered };
    near(valueOf(angleOfPosition(numberOf(input, 'blade'), ring)), numberOf(expected, 'deg'), tol);
  });

  it('arc along a rim', () => {
    const { input, expected, tol } = check('arc length');
    const deg = valueOf(angleOfArc(numberOf(input, 'arc_mm'), numberOf(input, 'radius_mm')));
    near(deg, numberOf(expected, 'deg'), tol);
  });

  it('tacho moved with rotation', () => {
    const { input, expected } = check('tacho moved');
    const deg = numberOf(input, 'tacho_shift_with_rotation');
    const change = { kind: 'tacho moved with rotation', deg } as const;
    expect(lagAfterChange(numberOf(input, 'lag_before'), change)).toBe(
      numberOf(expected, 'lag_after'),
    );
    expect(rotorDegAfterChange(90, change)).toBe(90);
  });

  it('mark moved against rotation: lag and angle fall alike, the coefficient stays', () => {
    const { input, expected } = check('mark moved');
    const deg = numberOf(input, 'mark_shift_against');
    const change = { kind: 'mark moved against rotation', deg } as const;
    expect(lagAfterChange(numberOf(input, 'lag'), change)).toBe(numberOf(expected, 'lag'));
    expect(rotorDegAfterChange(numberOf(input, 'angle'), change)).toBe(numberOf(expected, 'angle'));
  });

  it('sensor turned over', () => {
    const { input, expected } = check('sensor turned over');
    const change = { kind: 'sensor turned over' } as const;
    expect(lagAfterChange(numberOf(input, 'lag'), change)).toBe(numberOf(expected, 'lag'));
    expect(rotorDegAfterChange(90, change)).toBe(90);
  });

  it('lag as another quantity', () => {
    const { input, expected } = check('signal quantity');
    const lag = numberOf(input, 'disp_lag');
    expect(lagAs(lag, 'displacement', 'velocity')).toBe(numberOf(expected, 'vel_lag'));
    expect(lagAs(lag, 'displacement', 'acceleration')).toBe(numberOf(expected, 'acc_lag'));
  });
});

describe('sizes of the 1x component', () => {
  const perTurnHz = (input: Record<string, unknown>) => hzFromRpm(rpm(numberOf(input, 'n')));

  it('velocity rms as displacement p-p', () => {
    const { input, expected, tol } = check('velocity rms to displacement');
    const factor = sizeFactor('velocity', 'displacement', perTurnHz(input));
    const peakToPeak = 2 * Math.SQRT2 * numberOf(input, 'v_rms_mm_s') * factor;
    near(peakToPeak, numberOf(expected, 'disp_pp_um'), tol);
  });

  it('displacement p-p as velocity rms', () => {
    const { input, expected, tol } = check('displacement p-p to velocity');
    const factor = sizeFactor('displacement', 'velocity', perTurnHz(input));
    const rms = (numberOf(input, 'disp_pp_um') / (2 * Math.SQRT2)) * factor;
    near(rms, numberOf(expected, 'v_rms_mm_s'), tol);
  });

  it('acceleration as velocity', () => {
    const { input, expected, tol } = check('acceleration g rms');
    const factor = sizeFactor('acceleration', 'velocity', numberOf(input, 'f_hz'));
    const rms = numberOf(input, 'a_g_rms') * STANDARD_GRAVITY_M_S2 * factor;
    near(rms, numberOf(expected, 'v_rms_mm_s'), tol);
  });

  it('peak as rms', () => {
    const { input, expected, tol } = check('peak to rms');
    const rms = valueOf(convertOneX(numberOf(input, 'v_peak_in_s'), 'in/s pk', 'mm/s rms'));
    near(rms, numberOf(expected, 'v_rms_mm_s'), tol);
  });
});

describe('weights', () => {
  it('two on one radius', () => {
    const { expected, tol } = check('combine two weights');
    const joined = combineMasses([
      { massG: 12, angleDeg: 40 },
      { massG: 9, angleDeg: 155 },
    ]);
    near(joined.massG, numberOf(expected, 'g'), tol);
    nearDeg(joined.angleDeg, numberOf(expected, 'deg'), tol);
  });

  it('two on two radii', () => {
    const { expected, tol } = check('combine weights at different radii');
    const weights = [
      { massG: 20, radiusMm: 400, angleDeg: 30 },
      { massG: 15, radiusMm: 250, angleDeg: 300 },
    ];
    const all = ledgerSum(weights, 400);
    near(all.unbalanceGmm, numberOf(expected, 'amp'), tol);
    nearDeg(all.angleDeg, numberOf(expected, 'deg'), 0.05);
  });

  it.each([
    ['split 30 g@100 onto 80', [80, 140]],
    ['split 30 g@100 onto 20', [20, 140]],
  ] as const)('%s', (name, onto) => {
    const { expected, tol } = check(name);
    const shares = valueOf(splitMass({ massG: 30, angleDeg: 100 }, [onto[0], onto[1]]));
    shares.forEach(({ massG }, i) => {
      const want: unknown = expected['g'];
      near(massG, Array.isArray(want) ? Number(want[i]) : NaN, tol);
    });
  });

  it('a split with a negative share is refused', () => {
    const { expected } = check('split where the target');
    const refused = splitMass({ massG: 30, angleDeg: 200 }, [80, 140]);
    expect(refused.ok).toBe(expected['accepted']);
    expect(codeOf(refused)).toBe('outside');
  });

  it('another radius', () => {
    const { input, expected, tol } = check('radius change');
    const moved = massAtRadiusG(numberOf(input, 'g'), numberOf(input, 'r1'), numberOf(input, 'r2'));
    near(moved, numberOf(expected, 'g'), tol);
  });

  it('centrifugal force', () => {
    const { input, expected, tol } = check('centrifugal force');
    const unbalanceGmm = numberOf(input, 'g') * numberOf(input, 'r_mm');
    near(centrifugalForceN(unbalanceGmm, numberOf(input, 'n')), numberOf(expected, 'N'), tol);
  });
});

describe('tolerance', () => {
  it.each(['permissible residual unbalance G6.3', 'permissible residual unbalance G2.5'])(
    '%s',
    (name) => {
      const { input, expected, tol } = check(name);
      const allowed = permissibleUnbalance(
        numberOf(input, 'G'),
        numberOf(input, 'kg'),
        numberOf(input, 'n'),
      );
      near(valueOf(allowed).totalGmm, numberOf(expected, 'g_mm'), tol);
    },
  );

  it.each(['lever split, rotor inboard', 'lever split clamp'])('%s', (name) => {
    const { input, expected, tol } = check(name);
    const shares = shareByLever(numberOf(input, 'U'), {
      apartM: numberOf(input, 'LA') + numberOf(input, 'LB'),
      massCentreFromAM: numberOf(input, 'LA'),
      arrangement: 'inboard',
    });
    near(valueOf(shares).aGmm, numberOf(expected, 'A'), tol);
    near(valueOf(shares).bGmm, numberOf(expected, 'B'), tol);
  });

  it('static and couple part of two bearing vectors', () => {
    const { tol } = check('static/couple split');
    const { staticPart, couplePart } = staticAndCouple(fromPolar(5.2, 40), fromPolar(3.1, 95));
    near(size(staticPart), 3.713, tol);
    nearDeg(angleDeg(staticPart), 60, 0.06);
    near(size(couplePart), 2.131, tol);
    nearDeg(angleDeg(couplePart), 3.4, 0.06);
  });
});
