import 'server-only';
import { permissibleUnbalance, shareByLever } from '@/lib/domain/balancing/permissible-unbalance';
import { ok } from '@/lib/domain/result';
import type { SolvedTolerance } from '@/lib/schemas/workbench';
import { toleranceInput } from '@/lib/schemas/workbench-input';
import { computation } from '../computation';

/** What a grade allows a rotor, as a whole and, where the geometry is given, at each bearing. */
export const tolerance = computation(
  { permission: 'workbench:use', input: toleranceInput },
  (given) => {
    const allowed = permissibleUnbalance(given.gradeMmS, given.massKg, given.speedRpm);
    if (!allowed.ok) return allowed;
    const whole = { gradeMmS: given.gradeMmS, ...allowed.value };
    const { apartM, massCentreFromAM } = given;
    if (apartM === null || massCentreFromAM === null)
      return ok<SolvedTolerance>({ ...whole, bearings: null, isOverhung: false });
    const isOverhung = massCentreFromAM < 0 || massCentreFromAM > apartM;
    const shares = shareByLever(whole.totalGmm, {
      apartM,
      massCentreFromAM,
      arrangement: isOverhung ? 'overhung' : 'inboard',
    });
    if (!shares.ok) return shares;
    return ok<SolvedTolerance>({
      ...whole,
      bearings: [
        judged('A', shares.value.aGmm, given.residualAGmm),
        judged('B', shares.value.bGmm, given.residualBGmm),
      ],
      isOverhung,
    });
  },
);

function judged(name: 'A' | 'B', permissibleGmm: number, residualGmm: number | null) {
  const met = residualGmm === null ? null : residualGmm <= permissibleGmm;
  return { name, permissibleGmm, residualGmm, met };
}
