import type { RandomSource } from '@/lib/domain/plant-model/random-source';

/** What goes wrong in a simulated job; at most one thing. */
export type Slip =
  | 'none'
  | 'all counted with rotation'
  | 'trial counted with rotation'
  | 'planes swapped'
  | 'trial too small'
  | 'speed off 2–3 %'
  | 'trial mass typed × 10'
  | 'tenth of the correction fitted'
  | 'correction on the opposite side'
  | 'trial left on';

/** Share of jobs with each slip: far more often than in practice, so that each is seen enough. */
export const SLIP_RATES: readonly (readonly [Slip, number])[] = [
  ['all counted with rotation', 0.06],
  ['trial counted with rotation', 0.06],
  ['planes swapped', 0.05],
  ['trial too small', 0.07],
  ['speed off 2–3 %', 0.07],
  ['trial mass typed × 10', 0.05],
  ['tenth of the correction fitted', 0.04],
  ['correction on the opposite side', 0.05],
  ['trial left on', 0.05],
];

/** The slip of a job; planes cannot be swapped where there is one. */
export function slipFor(
  random: RandomSource,
  planes: number,
  slips: 'as stated' | 'none' | 'always',
): Slip {
  const total = SLIP_RATES.reduce((sum, [, rate]) => sum + rate, 0);
  let drawn = random() * (slips === 'always' ? total : 1);
  if (slips === 'none') return 'none';
  for (const [slip, rate] of SLIP_RATES) {
    if (drawn < rate) return slip === 'planes swapped' && planes === 1 ? 'none' : slip;
    drawn -= rate;
  }
  return 'none';
}
