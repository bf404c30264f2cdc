import { fail, ok, type Failure, type Result } from '../result';
import { fitWarnings, type MachineFacts } from './fit-warnings';
import type { LimitSetData, MachineFamily } from './limit-set-data';

/** What is asked for: a family of sets, and within it a group or category where it has several. */
export type LimitSetWish = { readonly family: MachineFamily; readonly group?: string };

/**
 * The sets that fit a machine, in the order of `sets`: one where the support class is known, those
 * of rigid and of flexible support where it is unknown, so that both limits can be shown. Fails when
 * none fits or the power is missing for a family chosen by power. A maker's limits are outside this
 * choice and win when stated.
 *
 * Example: 90 kW, rigid, 1482 r/min and `{ family: 'machine' }` give ISO 20816-3 group 2, rigid.
 */
export function chooseLimitSets(
  machine: MachineFacts,
  wish: LimitSetWish,
  sets: readonly LimitSetData[],
): Result<readonly LimitSetData[], Failure<'POWER_MISSING' | 'NO_SET_FITS'>> {
  const asked = sets.filter(
    (set) => set.family === wish.family && (wish.group === undefined || set.group === wish.group),
  );
  if (machine.powerKw === null && asked.some(isChosenByPower))
    return fail(
      'POWER_MISSING',
      'The power of the machine is not entered and decides which limits hold: enter it on the machine.',
      'powerKw',
    );
  const fitting = firstOfEachKind(asked.filter((set) => fitWarnings(set, machine).length === 0));
  if (fitting.length === 0)
    return fail(
      'NO_SET_FITS',
      'No limit set here holds for this power, support and speed: add one of your own.',
      'limitSet',
    );
  return ok(fitting);
}

function isChosenByPower({ powerMinKw, powerMaxKw }: LimitSetData): boolean {
  return powerMinKw !== null || powerMaxKw !== null;
}

// Where speed ranges touch, the set listed first holds.
function firstOfEachKind(sets: readonly LimitSetData[]): LimitSetData[] {
  return sets.filter(
    (set, i) =>
      sets.findIndex((one) => one.group === set.group && one.support === set.support) === i,
  );
}
