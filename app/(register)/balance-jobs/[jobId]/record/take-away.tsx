import Link from 'next/link';
import { shortCode } from '@/lib/domain/balance-job/record-code';
import { routes } from '@/lib/routes';
import { PrintButton } from '@/components/report/print-button';

type TakeAwayProps = { jobId: number; contentHash: string | null };

/** The record on paper and as files. */
export function TakeAway({ jobId, contentHash }: TakeAwayProps) {
  return (
    <>
      <a className="link" href={routes.api.jobRecordPdf(jobId, 'a4')}>
        PDF, A4
      </a>
      <a className="link" href={routes.api.jobRecordPdf(jobId, 'letter')}>
        PDF, Letter
      </a>
      {contentHash !== null && (
        <>
          <a className="link" href={routes.api.signedRecord(jobId)} download>
            As JSON
          </a>
          <Link className="link" href={routes.verifyRecord(shortCode(contentHash))}>
            Is it as signed?
          </Link>
        </>
      )}
      <PrintButton />
    </>
  );
}
