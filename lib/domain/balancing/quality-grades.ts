/** A balance quality grade with kinds of machine it is typical of. */
export type QualityGrade = { readonly gradeMmS: number; readonly typical: string };

/**
 * Balance quality grades of ISO 21940-11:2016 table 1 (was ISO 1940-1:2003) with typical rotors in
 * words of our own. From memory: compare with the standard before a machine is certified by it.
 */
export const QUALITY_GRADES: readonly QualityGrade[] = [
  { gradeMmS: 4000, typical: 'crankshafts of large slow ship diesels, unbalanced by design' },
  { gradeMmS: 1600, typical: 'crankshafts of large slow ship diesels, balanced by design' },
  { gradeMmS: 630, typical: 'crankshafts unbalanced by design, on elastic mounts' },
  { gradeMmS: 250, typical: 'crankshafts unbalanced by design, rigidly mounted' },
  { gradeMmS: 100, typical: 'complete piston engines of cars, trucks and locomotives' },
  { gradeMmS: 40, typical: 'car wheels and drive shafts; balanced crankshafts on elastic mounts' },
  { gradeMmS: 16, typical: 'crushers, farm machinery, cardan shafts; balanced crankshafts' },
  {
    gradeMmS: 6.3,
    typical: 'fans, pumps, gears, machine tools, machinery in general; motors up to 950 r/min',
  },
  {
    gradeMmS: 2.5,
    typical: 'compressors, gas and steam turbines, machine-tool drives; motors above 950 r/min',
  },
  { gradeMmS: 1, typical: 'drives of grinding machines, audio and video drives' },
  { gradeMmS: 0.4, typical: 'gyroscopes, spindles of high-precision systems' },
];
