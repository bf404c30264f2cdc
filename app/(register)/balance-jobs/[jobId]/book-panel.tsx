'use client';

import { CoefficientLines } from '@/components/balancing/coefficient-lines';
import { CheckField } from '@/components/ui/check-field';
import { Notice } from '@/components/ui/notice';
import { Panel } from '@/components/ui/panel';
import { TextAreaField } from '@/components/ui/text-area-field';
import { formatQuantity } from '@/lib/format';
import type { BalanceJobDto } from '@/lib/schemas/balance-job';
import { REUSE_CONDITIONS } from '@/lib/schemas/balance-job-input';
import { reuseCoefficientsAction, withdrawReuseAction } from './actions';
import { StepForm } from './step-form';

/** The way without trial runs: what the coefficient book knows, and what must be the same. */
export function BookPanel({ job }: { job: BalanceJobDto }) {
  const { book } = job;
  if (!book || (book.failure !== null && book.empty)) return null;
  if (book.failure !== null)
    return (
      <Notice kind="info" title="The coefficient book cannot spare the trial runs">
        {book.failure}
      </Notice>
    );
  return (
    <Panel title="Without trial runs: use the coefficient book" note={`graded ${book.grade}`}>
      <div className="flex flex-col gap-4">
        <p>
          Earlier jobs taught how this rotor answers at{' '}
          <span className="figures">{formatQuantity(book.speedRpm, 'r/min')}</span>. With these
          coefficients the answer comes at once and the first weight fitted is the correction.
        </p>
        <CoefficientLines lines={book.lines} unit={job.unit} />
        <StepForm jobId={job.id} action={reuseCoefficientsAction} button="Use the coefficient book">
          {(state) => (
            <>
              <fieldset>
                <legend className="text-sm font-semibold">
                  They hold only where these are as they were. Look, then tick each.
                </legend>
                {REUSE_CONDITIONS.map(({ name, label }) => (
                  <CheckField key={name} name={name} label={label} state={state} />
                ))}
              </fieldset>
              {book.grade === 'with care' && (
                <TextAreaField
                  name="reason"
                  label="They are graded with care. Why do you rely on them?"
                  state={state}
                  rows={2}
                />
              )}
            </>
          )}
        </StepForm>
      </div>
    </Panel>
  );
}

/** That this job rests on the book, and the way back to trial runs. */
export function ReuseNote({ job }: { job: BalanceJobDto }) {
  const { reuse } = job;
  if (!reuse) return null;
  const wayBack = job.step.step === 'answer' ? BEFORE_ANSWER : AFTER_CHECK;
  return (
    <div className="flex flex-col gap-3">
      <Notice kind="info" title={`From the coefficient book, graded ${reuse.grade}`}>
        No trial run was made. {reuse.person} confirmed that sensors, mark, supports and state are
        as they were. The check run decides: expect the reading stated below.
      </Notice>
      <details>
        <summary className="target cursor-pointer text-sm">{wayBack.summary}</summary>
        <StepForm jobId={job.id} action={withdrawReuseAction} button={wayBack.button}>
          {(state) => <TextAreaField name="reason" label="Why?" state={state} rows={2} />}
        </StepForm>
      </details>
    </div>
  );
}

const BEFORE_ANSWER = { summary: 'Make trial runs after all…', button: 'Back to trial runs' };
const AFTER_CHECK = {
  summary: 'They no longer hold: compute the trim from this job’s own runs…',
  button: 'Use this job’s own runs',
};
