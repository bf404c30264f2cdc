'use client';

import type { ActionState } from '@/lib/schemas/action-state';
import type { NewJobDto } from '@/lib/schemas/balance-job';
import { errorOf } from '@/components/ui/field-state';
import { CheckField } from '@/components/ui/check-field';
import { formatQuantity } from '@/lib/format';

/** Which planes take weights and which points are read in every run. */
export function PlaceChoices({ dto, state }: { dto: NewJobDto; state: ActionState }) {
  return (
    <div className="grid gap-4 sm:grid-cols-2">
      <Group legend="Planes, in the order of their trials" error={errorOf(state, 'planeIds')}>
        {dto.planes.map((plane) => (
          <CheckField
            key={plane.id}
            name="planeIds"
            value={plane.id}
            label={`Plane ${plane.name}`}
            hint={`radius ${formatQuantity(plane.radiusMm, 'mm')}, ${plane.kind === 'free' ? 'free rim' : `${plane.positions.length} positions`}`}
          />
        ))}
      </Group>
      <Group legend="Points read in every run" error={errorOf(state, 'pointIds')}>
        {dto.points.map((point) => (
          <CheckField
            key={point.id}
            name="pointIds"
            value={point.id}
            label={point.label}
            hint={`bearing ${point.bearing}, ${point.direction}`}
          />
        ))}
      </Group>
    </div>
  );
}

function Group({
  legend,
  error,
  children,
}: {
  legend: string;
  error: string | undefined;
  children: React.ReactNode;
}) {
  return (
    <fieldset className={error ? 'border-l-4 border-fault pl-3' : ''}>
      <legend className="text-sm font-semibold">{legend}</legend>
      {error && <p className="text-sm text-fault">{error}</p>}
      {children}
    </fieldset>
  );
}
