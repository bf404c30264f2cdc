'use client';

import { Button } from '@/components/ui/button';
import { Caution } from '@/components/ui/caution';
import { CheckField } from '@/components/ui/check-field';
import { Dialog } from '@/components/ui/dialog';
import { Field } from '@/components/ui/field';
import { RowHead, Table, Td, Th } from '@/components/ui/table';
import { CAUTIONS } from '@/lib/domain/cautions';
import { formatDateTime, formatMass, formatQuantity, formatRotorAngle } from '@/lib/format';
import type { BalanceJobDto, LedgerWeightDto } from '@/lib/schemas/balance-job';
import { takeOffWeightAction } from './actions';
import { FoundWeight, NotAsListed } from './ledger-check';
import { StepForm } from './step-form';
import { WeightPhotos } from './weight-photos';

type WeightsTableProps = { job: BalanceJobDto; mayRecord: boolean };

/** The job's part of the weights ledger: what was hung on, what became of it, and who did it. */
export function WeightsTable({ job, mayRecord }: WeightsTableProps) {
  const all = [...job.olderWeights, ...job.weights];
  const open = mayRecord && job.closedAt === null;
  return (
    <div className="flex flex-col gap-3">
      {all.length === 0 ? (
        <p className="text-ink-soft">No weight is on this rotor’s ledger.</p>
      ) : (
        <Ledger job={job} open={open} weights={all} />
      )}
      {open && (
        <div>
          <FoundWeight job={job} />
        </div>
      )}
    </div>
  );
}

type LedgerProps = { job: BalanceJobDto; open: boolean; weights: readonly LedgerWeightDto[] };

function Ledger({ job, open, weights }: LedgerProps) {
  return (
    <Table caption="Weights ledger" captionShown>
      <thead>
        <tr>
          <Th>plane</Th>
          <Th numeric>mass</Th>
          <Th numeric>place</Th>
          <Th numeric>radius</Th>
          <Th>what</Th>
          <Th>fitted</Th>
          <Th>now</Th>
        </tr>
      </thead>
      <tbody>
        {weights.map((weight) => (
          <tr key={weight.id} className={weight.endedAt ? 'text-ink-soft' : ''}>
            <RowHead>{weight.planeName}</RowHead>
            <Td numeric>{formatMass(weight.massG, job.site.decimalMark)}</Td>
            <Td numeric>
              {formatRotorAngle(weight.angleDeg)}
              {weight.positionLabel && `, ${weight.positionLabel}`}
            </Td>
            <Td numeric>{formatQuantity(weight.radiusMm, 'mm')}</Td>
            <Td>
              {weight.purpose}, {fixingOf(weight)}
              {weight.enteredSense === 'with' && ', typed with rotation'}
              <WeightPhotos jobId={job.id} weight={weight} mayAdd={open && isOwn(job, weight)} />
            </Td>
            <Td>
              {formatDateTime(weight.fittedAt, job.site.timeZone)}, {weight.fittedBy}
            </Td>
            <Td>
              {stateOf(weight)}
              {open && weight.endedAt === null && <WeightActions job={job} weight={weight} />}
            </Td>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}

function TakeOff({ job, weight }: { job: BalanceJobDto; weight: LedgerWeightDto }) {
  return (
    <Dialog
      title={`Take off ${formatMass(weight.massG)} in plane ${weight.planeName}`}
      trigger={<Button variant="quiet">Taken off…</Button>}
    >
      <StepForm jobId={job.id} action={takeOffWeightAction} button="Record it as taken off">
        {(state) => (
          <>
            <input type="hidden" name="weightId" value={weight.id} />
            <Field name="reason" label="Why is it taken off?" state={state} />
            <Caution
              code="SAF-01"
              tick={
                <CheckField
                  name="standingStill"
                  state={state}
                  label="It stands still and is locked out."
                />
              }
              name={<Field name="namedPerson" label="Locked out by (name)" state={state} />}
            >
              {CAUTIONS['SAF-01'].text}
            </Caution>
          </>
        )}
      </StepForm>
    </Dialog>
  );
}

function WeightActions({ job, weight }: { job: BalanceJobDto; weight: LedgerWeightDto }) {
  const older = !isOwn(job, weight);
  return (
    <div className="flex flex-wrap gap-1">
      <TakeOff job={job} weight={weight} />
      {older && <NotAsListed job={job} weight={weight} />}
    </div>
  );
}

/** Fitted in this job. */
function isOwn(job: BalanceJobDto, weight: LedgerWeightDto): boolean {
  return job.weights.some(({ id }) => id === weight.id);
}

function fixingOf({ fixing, fixedBy }: LedgerWeightDto): string {
  return fixedBy && fixedBy.kind !== 'temporary' ? `${fixedBy.kind}, ${fixing}` : fixing;
}

function stateOf(weight: LedgerWeightDto): string {
  if (weight.endedAt) return `${weight.ending ?? 'ended'}: ${weight.endReason ?? ''}`;
  return weight.permanent ? 'on the rotor, permanent' : 'on the rotor, temporary';
}
