import 'server-only';
import { repeatTest, type RepeatTest } from '@/lib/domain/balancing/repeat-test';
import { fromPolar } from '@/lib/domain/complex';
import type { LoadedJob } from './load-job';

/** Smallest scatter that is worth a warning, per unit of the job (common practice; no published source). */
const FLOOR = { 'mm/s rms': 0.1, 'µm p-p': 2 } as const;

export type PointRepeats = { pointId: number; test: RepeatTest | null };

/** How well the kept base runs repeat, point by point. */
export function baseRepeats({ job, points, runs }: LoadedJob): PointRepeats[] {
  const base = runs.filter(({ run }) => run.purpose === 'base' && run.state === 'kept');
  return points.map((point) => {
    const readings = base.flatMap(({ vectors }) =>
      vectors
        .filter((vector) => vector.point.id === point.id)
        .map((vector) => fromPolar(vector.amplitude, vector.lagDeg)),
    );
    return { pointId: point.id, test: repeatTest(readings, FLOOR[job.unit]) };
  });
}
