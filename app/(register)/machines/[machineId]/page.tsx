import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { cache } from 'react';
import { LinkButton } from '@/components/ui/link-button';
import { Notice } from '@/components/ui/notice';
import { PageHead } from '@/components/ui/page-head';
import { allows } from '@/lib/domain/access/permissions';
import { routes } from '@/lib/routes';
import { requireActor } from '@/lib/server/actor';
import { idOf } from '@/lib/server/address-numbers';
import { machinePage } from '@/lib/server/queries/machine-page';
import { BalanceHistory } from './balance-history';
import { Changed } from './changed';
import { SetupPanel } from './setup-panel';
import { Standing } from './standing';

type Props = { params: Promise<{ machineId: string }> };

const machineOf = cache(async (machineId: number) => machinePage(await requireActor(), machineId));

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const machine = await machineOf(idOf((await params).machineId));
  return { title: machine ? `${machine.tag} ${machine.name}` : 'Not found' };
}

export default async function MachinePage({ params }: Props) {
  const actor = await requireActor();
  const machine = await machineOf(idOf((await params).machineId));
  if (!machine) notFound();
  const may = (permission: Parameters<typeof allows>[1]) => allows(actor.role, permission);
  const crumbs = [
    { label: 'Plant book', href: routes.plantBook() },
    { label: machine.site.name },
    { label: machine.areaName },
    { label: machine.tag },
  ];
  const openJob = machine.jobs.find(({ closedAt }) => closedAt === null);
  return (
    <>
      <PageHead
        title={`${machine.tag} ${machine.name}`}
        crumbs={crumbs}
        note={machine.aliases.length > 0 ? `earlier: ${machine.aliases.join(', ')}` : undefined}
        actions={
          <>
            {openJob ? (
              <LinkButton href={routes.balanceJob(openJob.id)} variant="primary">
                Go on with job {openJob.number}
              </LinkButton>
            ) : (
              may('balanceJob:open') &&
              machine.state === 'active' && (
                <LinkButton href={routes.newBalanceJob(machine.id)} variant="primary">
                  Open a balance job
                </LinkButton>
              )
            )}
            <LinkButton href={routes.machineHistory(machine.id)}>Balance history</LinkButton>
            {may('register:edit') && (
              <LinkButton href={routes.machineEdit(machine.id)}>Edit</LinkButton>
            )}
          </>
        }
      />
      {machine.state === 'retired' && (
        <Notice kind="caution">Retired: {machine.retiredReason}. Its history stays.</Notice>
      )}
      <Standing machine={machine} mayUpload={may('measurement:upload')} />
      <Changed machine={machine} mayRecord={may('event:record')} />
      <BalanceHistory machine={machine} />
      <SetupPanel machine={machine} />
    </>
  );
}
