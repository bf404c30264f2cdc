import Link from 'next/link';
import { Notice } from '@/components/ui/notice';
import { formatDateTime, formatPlural } from '@/lib/format';
import { routes } from '@/lib/routes';
import type { RecordCheckDto } from '@/lib/schemas/record-check';
import { DifferenceTable } from './difference-table';

/** As signed, or not: with the hash that was signed and the one that is computed now. */
export function RecordVerdict({ record }: { record: RecordCheckDto }) {
  const { intact, addendaIntact, differences } = record;
  const whole = intact && addendaIntact;
  return (
    <div className="flex flex-col gap-3">
      <Notice
        kind={whole ? 'success' : 'failure'}
        title={intact ? 'This record is as signed' : 'This record is not as signed'}
      >
        <p>
          <Link className="link" href={routes.jobRecord(record.jobId)}>
            Job record {record.number}, {record.machine}
          </Link>
          , signed by {record.signedBy}, {formatDateTime(record.signedAt, record.timeZone)}.{' '}
          {formatPlural(record.signatures, 'signature')}, {addendaWords(record)}.
        </p>
        <p className="figures text-xs break-all">signed {record.contentHash}</p>
        <p className="figures text-xs break-all">now {record.recomputedHash}</p>
        {!intact && (
          <p>Do not rely on it. Tell your administrator; a backup may hold the record.</p>
        )}
      </Notice>
      {!intact && (
        <DifferenceTable
          caption="Where the record differs from the job’s own run sheet and ledger"
          sides={['in the record', 'in the job']}
          differences={differences}
          none="The job’s own run sheet, ledger and answers say what the record says: something else of it was changed."
        />
      )}
    </div>
  );
}

function addendaWords({ addenda, addendaIntact }: RecordCheckDto): string {
  const count = formatPlural(addenda, 'addendum', 'addenda');
  if (addenda === 0) return 'no addendum';
  return addendaIntact
    ? `${count} in unbroken order`
    : `${count}, of which one or more are not as they were written`;
}
