import type { Metadata } from 'next';
import { forbidden, notFound } from 'next/navigation';
import { PageHead } from '@/components/ui/page-head';
import { allows } from '@/lib/domain/access/permissions';
import { routes } from '@/lib/routes';
import { requireActor } from '@/lib/server/actor';
import { idOf } from '@/lib/server/address-numbers';
import { machineForm, newMachineForm } from '@/lib/server/queries/machine-forms';
import { EditMachineForm } from './edit-machine-form';
import { LimitForm } from './limit-form';
import { RetireForm } from './retire-form';
import { SetupForm } from './setup-form';

export const metadata: Metadata = { title: 'Edit a machine' };

type Props = { params: Promise<{ machineId: string }> };

export default async function EditMachinePage({ params }: Props) {
  const actor = await requireActor();
  if (!allows(actor.role, 'register:edit')) forbidden();
  const machine = await machineForm(actor, idOf((await params).machineId));
  if (!machine) notFound();
  const offered = await newMachineForm(actor, undefined);
  const crumbs = [
    { label: 'Plant book', href: routes.plantBook() },
    { label: machine.tag, href: routes.machine(machine.id) },
    { label: 'Edit' },
  ];
  return (
    <>
      <PageHead title={`Edit ${machine.tag}`} crumbs={crumbs} />
      <EditMachineForm machine={machine} areas={offered.areas.map(({ name }) => name)} />
      <SetupForm machineId={machine.id} />
      <LimitForm machineId={machine.id} limitSets={offered.limitSets} />
      <RetireForm machine={machine} />
    </>
  );
}
