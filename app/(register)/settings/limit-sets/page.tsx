import type { Metadata } from 'next';
import { Notice } from '@/components/ui/notice';
import { PageHead } from '@/components/ui/page-head';
import { Panel } from '@/components/ui/panel';
import { allows } from '@/lib/domain/access/permissions';
import { formatPlural } from '@/lib/format';
import { routes } from '@/lib/routes';
import { requireActor } from '@/lib/server/actor';
import { limitSets } from '@/lib/server/queries/limit-sets';
import { LimitSetTable } from './limit-set-table';
import { NewLimitSetForm } from './new-limit-set-form';
import { RetireLimitSetForm } from './retire-limit-set-form';

export const metadata: Metadata = { title: 'Limit sets' };

export default async function LimitSetsPage() {
  const actor = await requireActor();
  const { sets, sites } = await limitSets(actor, undefined);
  const own = sets.filter(({ siteName }) => siteName !== null);
  const mayEdit = allows(actor.role, 'limitSet:edit');
  return (
    <>
      <PageHead
        title="Limit sets"
        crumbs={[{ label: 'Settings', href: routes.settings() }, { label: 'Limit sets' }]}
        note="Which overall velocity is zone A, B, C or D, for which machines"
      />
      <Notice kind="caution" title="Check against your copy of the standard">
        The sets that come with the register are given from memory of the standards they name. A
        contract, a maker’s limit or a newer edition counts before them.
      </Notice>
      <Panel title="Limit sets" note={formatPlural(sets.length, 'set')}>
        <LimitSetTable sets={sets} decimalMark={actor.sites[0]?.decimalMark ?? '.'} />
      </Panel>
      {mayEdit && <NewLimitSetForm sites={sites} />}
      {mayEdit && own.length > 0 && <RetireLimitSetForm own={own} />}
    </>
  );
}
