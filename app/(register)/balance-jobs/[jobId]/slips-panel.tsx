'use client';

import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { Notice } from '@/components/ui/notice';
import { Panel } from '@/components/ui/panel';
import { TextAreaField } from '@/components/ui/text-area-field';
import { RowHead, Table, Td, Th } from '@/components/ui/table';
import { formatNumber } from '@/lib/format';
import type { BalanceJobDto, SlipExplanation } from '@/lib/schemas/balance-job';
import { confirmSlipAction } from './actions';
import { StepForm } from './step-form';

const SHOWN = 6;

/** After a check run that was not as predicted: the common slips, best explanation first. */
export function SlipsPanel({ job }: { job: BalanceJobDto }) {
  const { slips, unit, site } = job;
  if (slips.length === 0) return null;
  return (
    <Panel title="What if we slipped?" note="the check run is not as predicted">
      <div className="flex flex-col gap-3">
        <Notice kind="caution" title="Go and look before any more weight goes on">
          Each line supposes one slip and computes the check run again. One that fits is a question
          to whoever was at the machine; nothing is changed until a person says what happened.
        </Notice>
        <Table caption="Slips supposed, best explanation first" roomy>
          <thead>
            <tr>
              <Th>were it so that …</Th>
              <Th numeric>then the run misses by, {unit}</Th>
              <Th>it</Th>
            </tr>
          </thead>
          <tbody>
            {slips.slice(0, SHOWN).map((told) => (
              <tr key={told.slip}>
                <RowHead>{told.words}</RowHead>
                <Td numeric>
                  {formatNumber(told.miss, { decimals: 2, decimalMark: site.decimalMark })}
                </Td>
                <Td>
                  {explains(told.inside)}
                  {told.confirmable && <Confirm job={job} told={told} />}
                </Td>
              </tr>
            ))}
          </tbody>
        </Table>
      </div>
    </Panel>
  );
}

function Confirm({ job, told }: { job: BalanceJobDto; told: SlipExplanation }) {
  return (
    <Dialog
      title="Say what happened"
      description={`${told.words} The entries that were wrong are kept, ended or lined through, and newer ones say what really was.`}
      trigger={<Button variant="quiet">This is what happened…</Button>}
    >
      <StepForm jobId={job.id} action={confirmSlipAction} button="Put the records right">
        {(state) => (
          <>
            <input type="hidden" name="slip" value={told.slip} />
            <input type="hidden" name="runId" value={job.check?.runId ?? ''} />
            <TextAreaField
              name="reason"
              label="Who looked, and what was seen?"
              state={state}
              rows={2}
            />
          </>
        )}
      </StepForm>
    </Dialog>
  );
}

function explains(inside: boolean | null): string {
  if (inside === null) return 'band not known: compare the misses';
  return inside ? 'explains the run' : 'does not explain it';
}
