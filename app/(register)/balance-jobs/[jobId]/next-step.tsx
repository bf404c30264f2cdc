'use client';

import { AnswerCard } from '@/components/balancing/answer-card';
import { TrialsAgainstBook } from '@/components/balancing/trials-against-book';
import { Notice } from '@/components/ui/notice';
import { Panel } from '@/components/ui/panel';
import {
  formatDegrees,
  formatMass,
  formatNumber,
  formatQuantity,
  formatRotorAngle,
} from '@/lib/format';
import type { BalanceJobDto, PlaneDto } from '@/lib/schemas/balance-job';
import { AnswerStep } from './answer-step';
import { AsFittedPanel } from './as-fitted-panel';
import { BaseStep } from './base-step';
import { BookPanel } from './book-panel';
import { CheckTable } from './check-table';
import { Placements } from './placements';
import { RunForm } from './run-form';
import { SettleForm } from './settle-form';
import { SignForm } from './sign-form';
import { SlipsPanel } from './slips-panel';
import { stillToHang } from './still-to-hang';
import { WeightForm } from './weight-form';

/** The one thing to do now. Everything else on the sheet is what was done. */
export function NextStep({ job }: { job: BalanceJobDto }) {
  const { step } = job;
  switch (step.step) {
    case 'base':
      return <BaseStep job={job} />;
    case 'fit trial':
      return (
        <>
          <BookPanel job={job} />
          <FitTrial job={job} planeId={step.planeId} />
        </>
      );
    case 'trial run':
      return (
        <Panel title={`Next: trial run, plane ${nameOf(job, step.planeId)}`}>
          <RunForm job={job} purpose="trial" button="Record trial run" />
        </Panel>
      );
    case 'settle trial':
      return (
        <Panel title="Next: is the trial weight still on the rotor?">
          <TrialsAgainstBook trials={job.trialsAgainstBook} />
          <SettleForm job={job} weightId={step.weightId} />
        </Panel>
      );
    case 'answer':
      return (
        <Panel title="Next: the answer">
          <AnswerStep job={job} />
        </Panel>
      );
    case 'fit correction':
      return <FitCorrection job={job} planeIds={step.planeIds} />;
    case 'decide':
      return <Decide job={job} />;
    case 'closed':
      return null;
  }
}

function FitTrial({ job, planeId }: { job: BalanceJobDto; planeId: number }) {
  const plane = job.planes.find(({ id }) => id === planeId);
  if (!plane) return null;
  const proposal = job.trialProposal;
  return (
    <Panel title={`Next: trial weight in plane ${plane.name}`}>
      {proposal && (
        <p className="mb-4">
          Proposed: at most <strong className="figures">{formatMass(proposal.massG)}</strong> at the
          mark (<span className="figures">{formatDegrees(proposal.angleDeg)}</span>), radius{' '}
          <span className="figures">{formatQuantity(plane.radiusMm, 'mm')}</span>: force{' '}
          <span className="figures">{formatQuantity(proposal.forceN, 'N')}</span>,{' '}
          <span className="figures">{formatNumber(proposal.forcePctOfLoad)}</span> % of the load it
          rests on ({proposal.basis}). At the mark the answer comes out right whichever way degrees
          are counted.
          {proposal.loweringDeg !== null && (
            <>
              {' '}
              By the coefficient book it lowers the reading most at{' '}
              <span className="figures">{formatRotorAngle(proposal.loweringDeg)}</span>.
            </>
          )}
        </p>
      )}
      <WeightForm job={job} plane={plane} purpose="trial" proposedG={proposal?.massG ?? null} />
    </Panel>
  );
}

function FitCorrection({ job, planeIds }: { job: BalanceJobDto; planeIds: readonly number[] }) {
  const answer = job.accepted.at(-1);
  const fitted = planeIds.length < job.planes.length;
  return (
    <>
      <Panel title="Answer card" note={answer && `answer ${answer.number}`}>
        {answer && (
          <div className="flex flex-col gap-4">
            <AnswerCard job={job} answer={answer} />
            <Placements job={job} />
          </div>
        )}
      </Panel>
      {planeIds.map((planeId) => {
        const plane = job.planes.find(({ id }) => id === planeId);
        const proposed = answer?.planes.find((candidate) => candidate.planeId === planeId);
        return (
          plane && (
            <Panel key={planeId} title={`Next: fit card, plane ${plane.name}`}>
              <WeightForm
                job={job}
                plane={plane}
                purpose="correction"
                // On positions the plan above says what to hang; one mass would mislead.
                proposedG={plane.kind === 'free' ? (proposed?.massG ?? null) : null}
              />
            </Panel>
          )
        );
      })}
      <AsFittedPanel job={job} />
      {job.planes
        .filter(({ id }) => !planeIds.includes(id))
        .map((plane) => (
          <AnotherWeight key={plane.id} job={job} plane={plane} />
        ))}
      {fitted && (
        <Panel
          title={planeIds.length === 0 ? 'Next: check run' : 'or, if nothing goes there: check run'}
        >
          <RunForm job={job} purpose="check" button="Record check run" />
        </Panel>
      )}
    </>
  );
}

/** A further weight for the same answer: in sight while the plan of the positions has more to hang. */
function AnotherWeight({ job, plane }: { job: BalanceJobDto; plane: PlaneDto }) {
  const toHang = stillToHang(job, plane.id);
  return (
    <Panel>
      <details open={toHang.length > 0}>
        <summary className="target cursor-pointer font-semibold">
          {toHang.length > 0
            ? `Next: fit card, plane ${plane.name}: ${hangWords(toHang)}`
            : `Another weight in plane ${plane.name}…`}
        </summary>
        <div className="mt-4">
          <WeightForm job={job} plane={plane} purpose="correction" proposedG={null} />
        </div>
      </details>
    </Panel>
  );
}

function hangWords(planned: ReturnType<typeof stillToHang>): string {
  return planned.map(({ label, massG }) => `${formatMass(massG)} on ${label}`).join(', ');
}

function Decide({ job }: { job: BalanceJobDto }) {
  if (job.kind === 'check only')
    return (
      <Panel title="Next: sign what was read">
        <SignForm job={job} />
      </Panel>
    );
  return (
    <>
      <Panel title="Check run">
        <CheckTable job={job} />
      </Panel>
      {job.check?.points.some(({ reductionPct }) => reductionPct < 0) && (
        <Notice kind="failure" title="It runs rougher than before">
          Stop and look at what hangs where before anything else: a weight on the wrong side does
          this. Do not leave it so.
        </Notice>
      )}
      <SlipsPanel job={job} />
      <Panel title="Good enough? Sign the job record">
        <SignForm job={job} />
      </Panel>
      <Panel title="or trim with the same coefficients">
        <AnswerStep job={job} />
      </Panel>
      <Panel title="or check again">
        <RunForm job={job} purpose="check" button="Record another check run" />
      </Panel>
    </>
  );
}

function nameOf(job: BalanceJobDto, planeId: number): string {
  return job.planes.find(({ id }) => id === planeId)?.name ?? '';
}
