import type { Metadata } from 'next';
import { forbidden } from 'next/navigation';
import { PageHead } from '@/components/ui/page-head';
import { allows } from '@/lib/domain/access/permissions';
import { routes } from '@/lib/routes';
import { requireActor } from '@/lib/server/actor';
import { chosenSiteId } from '@/lib/server/chosen-site';
import { dropPoints } from '@/lib/server/queries/drop-points';
import { DropFiles } from './drop-files';

export const metadata: Metadata = { title: 'Upload files' };

type Search = { searchParams: Promise<{ point?: string }> };

export default async function NewUploadPage({ searchParams }: Search) {
  const actor = await requireActor();
  if (!allows(actor.role, 'measurement:upload')) forbidden();
  const points = await dropPoints(actor, undefined);
  const wanted = Number((await searchParams).point);
  const point = points.find(({ id }) => id === wanted) ?? null;
  return (
    <>
      <PageHead
        title="Upload files"
        crumbs={[{ label: 'In-tray', href: routes.inTray() }, { label: 'Upload' }]}
        note="Each file is looked at first; nothing counts before you have confirmed how it is read."
        actions={
          <a className="link" href={routes.sampleFile()} download>
            A sample file
          </a>
        }
      />
      <DropFiles
        points={points}
        pointId={point?.id ?? null}
        sites={actor.sites.map(({ id, name }) => ({ id, name }))}
        siteId={point?.siteId ?? (await chosenSiteId(actor)) ?? actor.sites[0]?.id ?? 0}
      />
    </>
  );
}
