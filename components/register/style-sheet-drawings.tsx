'use client';

import { Panel } from '@/components/ui/panel';
import { MachineTrain } from '@/components/rotor-face/machine-train';
import { RotorFace } from '@/components/rotor-face/rotor-face';
import { VectorWalk } from '@/components/rotor-face/vector-walk';
import type { FacePlane, FaceWeight } from '@/components/rotor-face/face-types';
import type { ZoneLetter } from '@/lib/format';
import { routes } from '@/lib/routes';

const FREE: FacePlane = {
  name: 'Plane L',
  radiusMm: 700,
  rotationFromDriveEnd: 'cw',
  markLabel: 'white paint',
};
const FIXED: FacePlane = {
  name: 'Fan wheel, inlet side',
  radiusMm: 400,
  rotationFromDriveEnd: 'ccw',
  positions: Array.from({ length: 12 }, (_, i) => ({ label: String(i + 1), angleDeg: i * 30 })),
};
const WEIGHTS: readonly FaceWeight[] = [
  { id: 1, massG: 90, angleDeg: 124, state: 'on', label: '14 Feb' },
  { id: 2, massG: 40, angleDeg: 0, state: 'trial' },
  { id: 3, massG: 72.5, angleDeg: 256, state: 'proposed' },
  { id: 4, massG: 20, angleDeg: 60, state: 'removed', label: '2 Mar' },
];
const VECTORS = [
  { label: 'base', amplitude: 2.64, lagDeg: 314 },
  { label: 'trial L', amplitude: 2.1, lagDeg: 285 },
  { label: 'check', amplitude: 0.22, lagDeg: 190 },
];
const point = (id: number, label: string, zone: ZoneLetter | null) => ({
  id,
  label,
  zone,
  href: routes.point(id),
});
const BEARINGS = [
  {
    id: 1,
    label: 'A',
    part: 'driver' as const,
    points: [point(1, 'AH', 'A'), point(2, 'AV', 'B')],
  },
  {
    id: 2,
    label: 'B',
    part: 'driver' as const,
    points: [point(3, 'BH', 'B'), point(4, 'BV', null)],
  },
  {
    id: 3,
    label: 'C',
    part: 'driven' as const,
    points: [point(5, 'CH', 'C'), point(6, 'CV', 'B')],
  },
  {
    id: 4,
    label: 'D',
    part: 'driven' as const,
    points: [point(7, 'DH', 'D'), point(8, 'DV', 'C')],
  },
];

/** Rotor faces, trains and the walk of the 1x vector. */
export function StyleSheetDrawings() {
  return (
    <>
      <div className="grid gap-6 lg:grid-cols-2">
        <Panel title="Rotor face, free rim, turns clockwise">
          <RotorFace
            plane={FREE}
            weights={WEIGHTS}
            readings={{ unit: 'mm/s rms', point: 'bearing A horizontal', vectors: VECTORS }}
          />
        </Panel>
        <Panel title="Rotor face, fixed positions, turns counter-clockwise">
          <RotorFace plane={FIXED} weights={WEIGHTS.slice(0, 3)} />
        </Panel>
        <Panel title="Vector walk">
          <VectorWalk
            title="1x, bearing A horizontal"
            unit="mm/s rms"
            steps={VECTORS.map((vector, id) => ({ ...vector, id }))}
          />
        </Panel>
        <Panel title="Rotor face with nothing on it">
          <RotorFace plane={{ ...FREE, name: 'Plane R', markLabel: undefined }} weights={[]} />
        </Panel>
      </div>
      <Panel title="Machine train between bearings, direct">
        <MachineTrain
          name="KX-2 Kiln exhaust fan"
          bearings={BEARINGS}
          overhung={false}
          drive="direct"
        />
      </Panel>
      <Panel title="Machine train overhung, belt, driver without points">
        <MachineTrain name="EF-101 Dust fan" bearings={BEARINGS.slice(2)} overhung drive="belt" />
      </Panel>
    </>
  );
}
