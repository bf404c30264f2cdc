import type { Metadata } from 'next';
import Link from 'next/link';
import { forbidden, notFound } from 'next/navigation';
import { EmptyState } from '@/components/ui/empty-state';
import { LinkButton } from '@/components/ui/link-button';
import { PageHead } from '@/components/ui/page-head';
import { allows } from '@/lib/domain/access/permissions';
import { routes } from '@/lib/routes';
import { requireActor } from '@/lib/server/actor';
import { idOf } from '@/lib/server/address-numbers';
import { newBalanceJob } from '@/lib/server/queries/new-balance-job';
import { OpenJobForm } from './open-job-form';

export const metadata: Metadata = { title: 'Open a balance job' };

type Props = { params: Promise<{ machineId: string }> };

export default async function NewBalanceJobPage({ params }: Props) {
  const actor = await requireActor();
  if (!allows(actor.role, 'balanceJob:open')) forbidden();
  const machineId = idOf((await params).machineId);
  const dto = await newBalanceJob(actor, machineId);
  if (!dto) notFound();
  const crumbs = [
    { label: 'Plant book', href: routes.plantBook() },
    { label: dto.machine.tag, href: routes.machine(dto.machine.id) },
    { label: 'Open a balance job' },
  ];
  return (
    <>
      <PageHead title={`Balance ${dto.machine.tag} ${dto.machine.name}`} crumbs={crumbs} />
      {dto.openJobId !== null ? (
        <EmptyState
          title="This rotor has an open balance job"
          action={<LinkButton href={routes.balanceJob(dto.openJobId)}>Go on with it</LinkButton>}
        >
          Finish it, or stop it with a reason, before opening another.
        </EmptyState>
      ) : dto.planes.length === 0 ? (
        <EmptyState
          title="No correction plane is recorded"
          action={
            <Link className="link" href={routes.machineEdit(machineId)}>
              Edit the machine
            </Link>
          }
        >
          A balance job needs at least one plane with its radius.
        </EmptyState>
      ) : (
        <OpenJobForm dto={dto} />
      )}
    </>
  );
}
