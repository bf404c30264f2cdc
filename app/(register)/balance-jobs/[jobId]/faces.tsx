'use client';

import { RotorFace } from '@/components/rotor-face/rotor-face';
import type { FaceWeight } from '@/components/rotor-face/face-types';
import { Panel } from '@/components/ui/panel';
import type { BalanceJobDto, PlaneDto } from '@/lib/schemas/balance-job';
import { stillToHang } from './still-to-hang';

/** The rotor faces of the job's planes: what hangs there, what is proposed, how the reading walked. */
export function Faces({ job }: { job: BalanceJobDto }) {
  return job.planes.map((plane, index) => (
    <Panel key={plane.id} title={`Plane ${plane.name}`}>
      <RotorFace
        plane={{
          name: `Plane ${plane.name}`,
          radiusMm: plane.radiusMm,
          rotationFromDriveEnd: job.setup.rotationFromDriveEnd === 'clockwise' ? 'cw' : 'ccw',
          positions: plane.positions.length > 0 ? plane.positions : undefined,
          markLabel: job.setup.mark,
          decimalMark: job.site.decimalMark,
        }}
        weights={weightsOf(job, plane)}
        readings={readingsOf(job, index)}
      />
    </Panel>
  ));
}

function weightsOf(job: BalanceJobDto, plane: PlaneDto): FaceWeight[] {
  const hung = [...job.olderWeights, ...job.weights]
    .filter((weight) => weight.planeId === plane.id && weight.endedAt === null)
    .map((weight): FaceWeight => ({
      id: weight.id,
      massG: weight.massG,
      angleDeg: weight.angleDeg,
      label: weight.positionLabel ?? weight.purpose,
      state: weight.purpose === 'trial' && weight.stays !== true ? 'trial' : 'on',
    }));
  const planned = stillToHang(job, plane.id).map((weight): FaceWeight => ({
    id: `plan-${weight.positionId}`,
    massG: weight.massG,
    angleDeg: plane.positions.find(({ id }) => id === weight.positionId)?.angleDeg ?? 0,
    label: weight.label,
    state: 'proposed',
  }));
  const isPlanned = job.placements.some(({ planeId }) => planeId === plane.id);
  const proposed = proposal(job)
    .filter((answer) => answer.planeId === plane.id && !isPlanned)
    .map((answer): FaceWeight => ({
      id: `answer-${answer.planeId}`,
      massG: answer.massG,
      angleDeg: answer.angleDeg,
      label: 'answer',
      state: 'proposed',
    }));
  return [...hung, ...planned, ...proposed];
}

function proposal(job: BalanceJobDto) {
  if (job.step.step === 'answer') return job.answer?.planes ?? [];
  if (job.step.step !== 'fit correction') return [];
  const { planeIds } = job.step;
  return (job.accepted.at(-1)?.planes ?? []).filter(({ planeId }) => planeIds.includes(planeId));
}

function readingsOf(job: BalanceJobDto, index: number) {
  const point = job.points[Math.min(index, job.points.length - 1)];
  const vectors = job.runs
    .filter(({ state }) => state === 'kept')
    .flatMap((run) =>
      run.vectors
        .filter(({ pointId }) => pointId === point?.id)
        .map(({ amplitude, lagDeg }) => ({
          label: `${run.purpose} ${run.number}`,
          amplitude,
          lagDeg,
        })),
    );
  if (!point || vectors.length === 0) return undefined;
  return { unit: job.unit, point: `bearing ${point.bearing} ${point.direction}`, vectors };
}
