import { Panel } from '@/components/ui/panel';
import { formatDateTime } from '@/lib/format';
import type { BalanceJobDto } from '@/lib/schemas/balance-job';

type SignOffStripProps = { job: BalanceJobDto; areaOwner: string | null };

/** Who signed, in which role, when, with which words and over which content. */
export function SignOffStrip({ job, areaOwner }: SignOffStripProps) {
  return (
    <Panel title="Sign-off strip">
      {job.signOffs.length === 0 && <p className="text-ink-soft">Not signed.</p>}
      {job.signOffs.map((sign) => (
        <div key={sign.contentHash}>
          <p>
            <strong>{sign.personName}</strong>, {sign.role},{' '}
            {formatDateTime(sign.at, job.site.timeZone)}: “{sign.statement}”
          </p>
          {areaOwner && <p>Handed back to {areaOwner}.</p>}
          <p className="figures text-xs break-all text-ink-soft">content {sign.contentHash}</p>
        </div>
      ))}
    </Panel>
  );
}
