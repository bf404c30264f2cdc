import { Notice } from '@/components/ui/notice';
import { formatPlural } from '@/lib/format';
import type { RecordCheckDto } from '@/lib/schemas/record-check';
import { RecordVerdict } from './record-verdict';

export type CodeAnswer =
  { kind: 'refused'; message: string } | { kind: 'looked up'; records: RecordCheckDto[] };

/** What the register says to a code. */
export function CodeVerdict({ answer }: { answer: CodeAnswer }) {
  if (answer.kind === 'refused') return null;
  const { records } = answer;
  if (records.length === 0)
    return (
      <Notice kind="caution" title="No signed record has this code">
        Compare it with the paper digit by digit. A record of a site that you may not see is not
        found either; and a paper whose code nobody knows was not signed here.
      </Notice>
    );
  return (
    <>
      {records.length > 1 && (
        <p>{formatPlural(records.length, 'record begins', 'records begin')} like this.</p>
      )}
      {records.map((record) => (
        <RecordVerdict key={record.jobId} record={record} />
      ))}
    </>
  );
}
