import { Panel } from '@/components/ui/panel';
import { AddendumForm } from './addendum-form';
import { CosignForm } from './cosign-form';

type AfterSigningProps = {
  jobId: number;
  may: { addAddendum: boolean; cosign: boolean; signAsEngineer: boolean };
};

/** What can still be done to a signed record: a further signature, a remark. Never on paper. */
export function AfterSigning({ jobId, may }: AfterSigningProps) {
  if (!may.addAddendum && !may.cosign) return null;
  return (
    <div className="no-print grid items-start gap-6 lg:grid-cols-2">
      {may.cosign && (
        <Panel title="Sign this record too" note="the same content, the same hash">
          <CosignForm jobId={jobId} asEngineer={may.signAsEngineer} />
        </Panel>
      )}
      {may.addAddendum && (
        <Panel title="Add an addendum" note="it cannot be changed afterwards">
          <AddendumForm jobId={jobId} />
        </Panel>
      )}
    </div>
  );
}
