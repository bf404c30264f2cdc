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
import { StepForm } from './step-form';

type WeightsTableProps = { job: BalanceJobDto; mayRecord: boolean };

/** The job's part of the weights ledger: what was hung on, what became of it, and who did it. */
export function WeightsTable({ job, mayRecord }: WeightsTableProps) {
  const all = [...job.olderWeights, ...job.weights];
  if (all.length === 0)
    return <p className="text-ink-soft">No weight is on this rotor’s ledger.</p>;
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
        {all.map((weight) => (
          <tr key={weight.id} className={weight.endedAt ? 'text-ink-soft' : ''}>
            <RowHead>{weight.planeName}</RowHead>
            <Td numeric>{formatMass(weight.massG, job.site.decimalMark)}</Td>
            <Td numeric>
              {formatRotorAngle(weight.angleDeg)}
              {weight.positionLabel && `, ${weight.positionLabel}`}
            </Td>
            <Td numeric>{formatQuantity(weight.radiusMm, 'mm')}</Td>
            <Td>
              {weight.purpose}, {weight.fixing}
              {weight.enteredSense === 'with' && ', typed with rotation'}
            </Td>
            <Td>
              {formatDateTime(weight.fittedAt, job.site.timeZone)}, {weight.fittedBy}
            </Td>
            <Td>
              {stateOf(weight)}
              {mayRecord && canEnd(job, weight) && <TakeOff job={job} weight={weight} />}
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

function canEnd(job: BalanceJobDto, weight: LedgerWeightDto): boolean {
  const own = job.weights.some(({ id }) => id === weight.id);
  return own && job.closedAt === null && weight.endedAt === null;
}

function stateOf(weight: LedgerWeightDto): string {
  if (weight.endedAt) return `${weight.ending ?? 'ended'}: ${weight.endReason ?? ''}`;
  return weight.permanent ? 'on the rotor, permanent' : 'on the rotor, temporary';
}
