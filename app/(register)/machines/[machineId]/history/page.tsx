import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { cache } from 'react';
import { PrintButton } from '@/components/report/print-button';
import { ReportBody } from '@/components/report/report-body';
import { PageHead } from '@/components/ui/page-head';
import { routes } from '@/lib/routes';
import { requireActor } from '@/lib/server/actor';
import { idOf } from '@/lib/server/address-numbers';
import { machineHistory } from '@/lib/server/queries/machine-history';

type Props = { params: Promise<{ machineId: string }> };

/** Once per request: the title needs it too. */
const foundOf = cache(async (machineId: number) => machineHistory(await requireActor(), machineId));

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const { machine } = await load(params);
  return { title: `Balance history · ${machine.tag}` };
}

export default async function MachineHistoryPage({ params }: Props) {
  const { machine, report } = await load(params);
  const crumbs = [
    { label: 'Plant book', href: routes.plantBook() },
    { label: machine.tag, href: routes.machine(machine.id) },
    { label: 'Balance history' },
  ];
  return (
    <>
      <PageHead
        title={report.title}
        crumbs={crumbs}
        note={report.convention}
        actions={
          <>
            <a className="link" href={routes.api.machineHistoryPdf(machine.id, 'a4')}>
              PDF, A4
            </a>
            <a className="link" href={routes.api.machineHistoryPdf(machine.id, 'letter')}>
              PDF, Letter
            </a>
            <PrintButton />
          </>
        }
      />
      <ReportBody report={report} />
    </>
  );
}

async function load(params: Props['params']) {
  const found = await foundOf(idOf((await params).machineId));
  if (!found) notFound();
  return found;
}
