'use client';

import { PointPicker } from '@/components/register/point-picker';
import { Field } from '@/components/ui/field';
import { Panel } from '@/components/ui/panel';
import { formatForInput } from '@/lib/format';
import type { ActionState } from '@/lib/schemas/action-state';
import type { UploadPageDto } from '@/lib/schemas/in-tray';

/** Where and when the record was taken, at what speed, with which instrument. */
export function PlaceFields({ page, state }: { page: UploadPageDto; state: ActionState }) {
  const { upload, points, suggestedPointId, preview } = page;
  const { site, pointId } = upload;
  const suggested = pointId === null && suggestedPointId !== null;
  return (
    <Panel title="Where and when it was taken">
      <div className="flex flex-col gap-4">
        <PointPicker
          points={points}
          pointId={pointId ?? suggestedPointId}
          placeholder="Choose the point"
          hint={suggested ? 'Proposed from the name of the file: check it.' : undefined}
          state={state}
        />
        <div className="grid gap-4 sm:grid-cols-3">
          <Field
            name="takenAt"
            kind="datetime-local"
            label="Taken at"
            hint={`On the clock of ${site.timeZone}`}
            step={1}
            state={state}
          />
          <Field
            name="speedRpm"
            kind="decimal"
            unit="r/min"
            label="Speed (optional)"
            hint="A tacho counts before it; without either there is no 1x."
            defaultValue={formatForInput(preview.layout.speedRpm, site.decimalMark)}
            state={state}
          />
          <Field
            name="note"
            label="Instrument and note (optional)"
            hint="Which instrument, how it was mounted"
            maxLength={1000}
            state={state}
          />
        </div>
      </div>
    </Panel>
  );
}
