'use client';

import { Caution } from '@/components/ui/caution';
import { CheckField } from '@/components/ui/check-field';
import { Field } from '@/components/ui/field';
import { Notice } from '@/components/ui/notice';
import { SelectField } from '@/components/ui/select-field';
import { CAUTIONS } from '@/lib/domain/cautions';
import {
  formatDateTime,
  formatForInput,
  formatLag,
  formatPlural,
  formatQuantity,
} from '@/lib/format';
import type { ActionState } from '@/lib/schemas/action-state';
import type { BalanceJobDto, PointDto } from '@/lib/schemas/balance-job';
import { AMPLITUDE_UNITS } from '@/lib/schemas/balance-job-input';
import { recordRunAction } from './actions';
import { StepForm } from './step-form';

type RunFormProps = { job: BalanceJobDto; purpose: 'base' | 'trial' | 'check'; button: string };

/** One run: speed, and the 1x reading of every point, typed or taken from an upload. */
export function RunForm({ job, purpose, button }: RunFormProps) {
  const units = AMPLITUDE_UNITS.filter((unit) => isVelocity(unit) === isVelocity(job.unit));
  return (
    <StepForm
      jobId={job.id}
      action={recordRunAction}
      button={button}
      said={(run) =>
        run.held ? (
          <Notice kind="caution">
            Run {run.number} is held: {run.held}
          </Notice>
        ) : (
          `Run ${run.number} saved`
        )
      }
    >
      {(state) => (
        <>
          <input type="hidden" name="purpose" value={purpose} />
          <Starts job={job} />
          <StartCaution state={state} purpose={purpose} />
          <div className="grid gap-4 sm:grid-cols-2">
            <Field
              name="speedRpm"
              label="Speed"
              unit="r/min"
              kind="decimal"
              state={state}
              defaultValue={formatForInput(job.machine.nominalSpeedRpm, job.site.decimalMark)}
            />
            <SelectField
              name="unit"
              label="Sizes are typed in"
              state={state}
              defaultValue={job.unit}
              options={units.map((unit) => ({ value: unit, label: unit }))}
            />
          </div>
          {job.points.map((point, index) => (
            <PointReading key={point.id} {...{ job, point, index, state }} />
          ))}
        </>
      )}
    </StepForm>
  );
}

type PointReadingProps = {
  job: BalanceJobDto;
  point: PointDto;
  index: number;
  state: ActionState;
};

function PointReading({ job, point, index, state }: PointReadingProps) {
  const at = (name: string) => `vectors.${index}.${name}`;
  const choices = job.choices.find(({ pointId }) => pointId === point.id)?.vectors ?? [];
  return (
    <fieldset className="grid gap-3 border-t border-rule pt-3 sm:grid-cols-3">
      <legend className="pr-3 text-sm font-semibold">
        {point.label}{' '}
        <span className="font-normal text-ink-soft">
          bearing {point.bearing}, {point.direction}
        </span>
      </legend>
      <input type="hidden" name={at('pointId')} value={point.id} />
      <Field name={at('amplitude')} label="1x size" kind="decimal" state={state} />
      <Field
        name={at('phaseDeg')}
        label={`Phase as ${job.phaseSense}`}
        unit={`° ${job.phaseSense}`}
        kind="decimal"
        state={state}
      />
      <Field
        name={at('overall')}
        label="Overall velocity, if read"
        unit="mm/s rms"
        kind="decimal"
        state={state}
      />
      {choices.length > 0 && (
        <div className="sm:col-span-3">
          <SelectField
            name={at('recordId')}
            label="or take it from an upload with tacho"
            state={state}
            placeholder="typed above"
            options={choices.map((choice) => ({
              value: String(choice.recordId),
              label: `${formatDateTime(choice.takenAt, job.site.timeZone)}: ${formatQuantity(choice.amplitude, job.unit)}, ${formatLag(choice.lagDeg)}`,
            }))}
          />
        </div>
      )}
    </fieldset>
  );
}

/** How many starts the machine is allowed, and which this one is. */
function Starts({ job }: { job: BalanceJobDto }) {
  const { startsAllowed, runs } = job;
  if (startsAllowed === null) return null;
  // A run that corrects another was no start of the machine.
  const next = runs.filter(({ corrects }) => corrects === null).length + 1;
  const words = `This is start ${next}; ${formatPlural(startsAllowed, 'start')} were agreed.`;
  if (next <= startsAllowed) return <p>{words}</p>;
  return (
    <Notice kind="caution" title={words}>
      Ask whoever is responsible for the machine before it is started again.
    </Notice>
  );
}

function StartCaution({ state, purpose }: { state: ActionState; purpose: string }) {
  return (
    <Caution
      code={purpose === 'base' ? 'SAF-04' : 'SAF-02, SAF-04'}
      tick={<CheckField name="clearOfRotor" state={state} label="It is so." />}
      name={<Field name="namedPerson" label="Seen to by (name)" state={state} />}
    >
      {purpose === 'base'
        ? CAUTIONS['SAF-04'].text
        : `${CAUTIONS['SAF-02'].text} ${CAUTIONS['SAF-04'].text}`}
    </Caution>
  );
}

function isVelocity(unit: string): boolean {
  return unit.includes('/s');
}
