'use client';

import { Panel } from '@/components/ui/panel';
import { TextAreaField } from '@/components/ui/text-area-field';
import { formatLag, formatPlural, formatQuantity } from '@/lib/format';
import type { BalanceJobDto } from '@/lib/schemas/balance-job';
import { acceptBaseAction } from './actions';
import { BeforeFirstRun } from './before-first-run';
import { RunForm } from './run-form';
import { StepForm } from './step-form';

/** Base runs, repeated until they agree, and then accepted. */
export function BaseStep({ job }: { job: BalanceJobDto }) {
  const taken = job.runs.filter(({ purpose, state }) => purpose === 'base' && state === 'kept');
  return (
    <>
      <BeforeFirstRun job={job} />
      <Panel title={`Next: base run ${taken.length + 1}`} note="three that agree are wanted">
        <RunForm job={job} purpose="base" button="Record base run" />
      </Panel>
      {taken.length > 0 && (
        <Panel title={`Go on with ${formatPlural(taken.length, 'base run')}?`}>
          <Repeats job={job} />
          <StepForm jobId={job.id} action={acceptBaseAction} button="Accept the base">
            {(state) => (
              <TextAreaField
                name="reason"
                label="Why you go on, where the runs are few or do not agree"
                state={state}
                rows={2}
              />
            )}
          </StepForm>
        </Panel>
      )}
    </>
  );
}

function Repeats({ job }: { job: BalanceJobDto }) {
  return (
    <ul className="mb-4">
      {job.repeats.map(({ pointId, test }) => {
        const label = job.points.find(({ id }) => id === pointId)?.label;
        return (
          <li key={pointId}>
            {label}:{' '}
            {test ? (
              <span className="figures">
                mean {formatQuantity(test.meanAmplitude, job.unit)} at {formatLag(test.meanLagDeg)},
                scatter {formatQuantity(test.scatter < SAME ? 0 : test.scatter, job.unit)}
              </span>
            ) : (
              'one run, scatter not known'
            )}
            {test && `: ${repeatWords(test)}`}
          </li>
        );
      })}
    </ul>
  );
}

/** Readings closer than this are one reading typed again, or a display that holds its value. */
const SAME = 1e-9;

function repeatWords({ scatter, good }: { scatter: number; good: boolean }): string {
  if (scatter < SAME) return 'the very same each time: was each one read anew?';
  return good ? 'repeats well' : 'does not repeat';
}
