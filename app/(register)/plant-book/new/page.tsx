import type { Metadata } from 'next';
import { forbidden } from 'next/navigation';
import { PageHead } from '@/components/ui/page-head';
import { allows } from '@/lib/domain/access/permissions';
import { routes } from '@/lib/routes';
import { requireActor } from '@/lib/server/actor';
import { newMachineForm } from '@/lib/server/queries/machine-forms';
import { NewMachineForm } from './new-machine-form';

export const metadata: Metadata = { title: 'Enter a machine' };

export default async function NewMachinePage() {
  const actor = await requireActor();
  if (!allows(actor.role, 'register:edit')) forbidden();
  const offered = await newMachineForm(actor, undefined);
  return (
    <>
      <PageHead
        title="Enter a machine"
        crumbs={[{ label: 'Plant book', href: routes.plantBook() }, { label: 'Enter a machine' }]}
      />
      <NewMachineForm offered={offered} />
    </>
  );
}
