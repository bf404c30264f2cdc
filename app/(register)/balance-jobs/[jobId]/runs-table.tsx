'use client';

import { Badge } from '@/components/ui/badge';
import { Dialog } from '@/components/ui/dialog';
import { Button } from '@/components/ui/button';
import { RowHead, Table, Td, Th } from '@/components/ui/table';
import { TextAreaField } from '@/components/ui/text-area-field';
import { formatLag, formatMass, formatNumber, formatRotorAngle, formatTime } from '@/lib/format';
import type { BalanceJobDto, RunDto } from '@/lib/schemas/balance-job';
import { keepRunAction, lineThroughRunAction } from './actions';
import { StepForm } from './step-form';

type RunsTableProps = { job: BalanceJobDto; may: { record: boolean; override: boolean } };

/** Every run with what was on the rotor in it; lined-through ones stay visible. */
export function RunsTable({ job, may }: RunsTableProps) {
  const open = job.closedAt === null;
  return (
    <Table caption={`Runs, 1x in ${job.unit}`} captionShown>
      <thead>
        <tr>
          <Th>run</Th>
          <Th>time</Th>
          <Th numeric>r/min</Th>
          {job.points.map((point) => (
            <Th key={point.id} numeric>
              {point.label}
            </Th>
          ))}
          <Th>on the rotor since the job began</Th>
          <Th>by</Th>
          {open && <Th />}
        </tr>
      </thead>
      <tbody>
        {job.runs.map((run) => (
          <tr
            key={run.id}
            className={run.state === 'lined through' ? 'text-ink-soft line-through' : ''}
          >
            <RowHead>
              {run.number} {run.purpose} {run.state === 'held' && <Badge>held</Badge>}
            </RowHead>
            <Td>{formatTime(run.takenAt, job.site.timeZone)}</Td>
            <Td numeric>{formatNumber(run.speedRpm)}</Td>
            {job.points.map((point) => (
              <Td key={point.id} numeric>
                {reading(run, point.id)}
              </Td>
            ))}
            <Td>
              {weightsOf(job, run)}
              {run.corrects !== null && (
                <span className="inline-block text-xs">corrects run {run.corrects}</span>
              )}
              {run.stateReason && (
                <span className="inline-block text-xs">
                  {run.state}: {run.stateReason}
                </span>
              )}
            </Td>
            <Td>{run.person}</Td>
            {open && (
              <Td>
                <SettleRun job={job} run={run} may={may} />
              </Td>
            )}
          </tr>
        ))}
      </tbody>
    </Table>
  );
}

function SettleRun({ job, run, may }: RunsTableProps & { run: RunDto }) {
  if (run.state === 'lined through' || !may.record) return null;
  return (
    <div className="flex gap-1">
      <Dialog
        title={`Line run ${run.number} through`}
        description="The run stays visible with your reason and feeds nothing."
        trigger={<Button variant="quiet">Line through</Button>}
      >
        <StepForm jobId={job.id} action={lineThroughRunAction} button="Line through">
          {(state) => (
            <>
              <input type="hidden" name="runId" value={run.id} />
              <TextAreaField name="reason" label="What went wrong in this run?" state={state} />
            </>
          )}
        </StepForm>
      </Dialog>
      {run.state === 'held' && may.override && (
        <Dialog
          title={`Keep run ${run.number}`}
          description={run.stateReason ?? ''}
          trigger={<Button variant="quiet">Keep</Button>}
        >
          <StepForm jobId={job.id} action={keepRunAction} button="Keep the run">
            {(state) => (
              <>
                <input type="hidden" name="runId" value={run.id} />
                <TextAreaField name="reason" label="Why may it be used?" state={state} />
              </>
            )}
          </StepForm>
        </Dialog>
      )}
    </div>
  );
}

function reading(run: RunDto, pointId: number): string {
  const vector = run.vectors.find((candidate) => candidate.pointId === pointId);
  return vector ? `${formatNumber(vector.amplitude)} at ${formatLag(vector.lagDeg)}` : '';
}

function weightsOf(job: BalanceJobDto, run: RunDto): string {
  const on = job.weights.filter(({ id }) => run.weightIds.includes(id));
  const gone = job.olderWeights.filter(({ id }) => run.weightIds.includes(id));
  if (on.length + gone.length === 0) return 'nothing';
  return [
    ...on.map((weight) => inWords(weight)),
    ...gone.map((weight) => `${inWords(weight)} taken off`),
  ].join('; ');
}

function inWords({ planeName, massG, angleDeg }: BalanceJobDto['weights'][number]): string {
  return `${planeName}: ${formatMass(massG)} at ${formatRotorAngle(angleDeg)}`;
}
