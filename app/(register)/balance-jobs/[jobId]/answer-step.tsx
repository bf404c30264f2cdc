'use client';

import { AnswerCard } from '@/components/balancing/answer-card';
import { TrialResponses } from '@/components/balancing/trial-responses';
import { TrialsAgainstBook } from '@/components/balancing/trials-against-book';
import { Notice } from '@/components/ui/notice';
import type { BalanceJobDto } from '@/lib/schemas/balance-job';
import { acceptAnswerAction } from './actions';
import { Placements } from './placements';
import { ReuseNote } from './book-panel';
import { StepForm } from './step-form';

/** The answer to look at and accept, or in words why there is none. */
export function AnswerStep({ job }: { job: BalanceJobDto }) {
  const { answer } = job;
  // After a check run that leaves nothing to correct, no answer is good news.
  const afterCheck = job.step.step === 'decide';
  return (
    <div className="flex flex-col gap-4">
      <ReuseNote job={job} />
      <TrialsAgainstBook trials={job.trialsAgainstBook} />
      <TrialResponses checks={job.trialChecks} decimalMark={job.site.decimalMark} />
      {job.answerFailure !== null && (
        <Notice kind={afterCheck ? 'info' : 'failure'} title={afterCheck ? 'No trim' : undefined}>
          {job.answerFailure}
        </Notice>
      )}
      {answer && (
        <>
          <AnswerCard job={job} answer={answer} />
          <Placements job={job} />
          <StepForm
            jobId={job.id}
            action={acceptAnswerAction}
            button={answer.kind === 'trim' ? 'Use this trim' : 'Use this answer'}
          >
            {() => <input type="hidden" name="fingerprint" value={answer.fingerprint} />}
          </StepForm>
        </>
      )}
    </div>
  );
}
