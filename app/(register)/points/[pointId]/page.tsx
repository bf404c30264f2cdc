import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { cache } from 'react';
import { PointTrend } from '@/components/register/point-trend';
import { LinkButton } from '@/components/ui/link-button';
import { PageHead } from '@/components/ui/page-head';
import { Panel } from '@/components/ui/panel';
import { allows } from '@/lib/domain/access/permissions';
import { routes } from '@/lib/routes';
import { requireActor } from '@/lib/server/actor';
import { idOf } from '@/lib/server/address-numbers';
import { pointPage } from '@/lib/server/queries/point-page';
import { RecordTable } from './record-table';

type Props = { params: Promise<{ pointId: string }> };

const pointOf = cache(async (pointId: number) => pointPage(await requireActor(), pointId));

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const point = await pointOf(idOf((await params).pointId));
  return { title: point ? `${point.machine.tag} ${point.label}` : 'Not found' };
}

export default async function PointPage({ params }: Props) {
  const actor = await requireActor();
  const point = await pointOf(idOf((await params).pointId));
  if (!point) notFound();
  const { machine, site } = point;
  const crumbs = [
    { label: 'Plant book', href: routes.plantBook() },
    { label: machine.tag, href: routes.machine(machine.id) },
    { label: point.label },
  ];
  return (
    <>
      <PageHead
        title={`${machine.tag} ${point.label}`}
        crumbs={crumbs}
        note={`bearing ${point.bearing}, ${point.direction}${point.mounting ? `, ${point.mounting}` : ''}`}
        actions={
          allows(actor.role, 'measurement:upload') && (
            <LinkButton href={routes.newUpload(`?point=${point.id}`)}>Upload a record</LinkButton>
          )
        }
      />
      <Panel title="Trend">
        <PointTrend
          pointId={point.id}
          name={`${machine.tag} ${point.label}`}
          machineId={machine.id}
          site={site}
        />
      </Panel>
      <RecordTable point={point} />
    </>
  );
}
