import type { Metadata } from 'next';
import Link from 'next/link';
import { notFound } from 'next/navigation';
import { cache } from 'react';
import { Badge } from '@/components/ui/badge';
import { Notice } from '@/components/ui/notice';
import { PageHead } from '@/components/ui/page-head';
import { allows } from '@/lib/domain/access/permissions';
import { formatBytes, formatDateTime } from '@/lib/format';
import { routes } from '@/lib/routes';
import type { Actor } from '@/lib/schemas/actor';
import type { UploadPageDto } from '@/lib/schemas/in-tray';
import { requireActor } from '@/lib/server/actor';
import { idOf } from '@/lib/server/address-numbers';
import { uploadPage } from '@/lib/server/queries/upload-page';
import { ConfirmForm } from './confirm-form';
import { SettleUpload } from './settle-upload';

type Place = { params: Promise<{ uploadId: string }> };

/** Once per request: the title needs it too, and the whole file is read for it. */
const pageOf = cache(async (uploadId: number) => uploadPage(await requireActor(), uploadId));

export async function generateMetadata({ params }: Place): Promise<Metadata> {
  const page = await pageOf(idOf((await params).uploadId));
  return { title: page ? `${page.upload.fileName} · In-tray` : 'Not found' };
}

export default async function UploadPage({ params }: Place) {
  const actor = await requireActor();
  const page = await pageOf(idOf((await params).uploadId));
  if (!page) notFound();
  const { upload, layoutName } = page;
  const { fileName, sizeBytes, at, person, site } = upload;
  return (
    <>
      <PageHead
        title={fileName}
        crumbs={[{ label: 'In-tray', href: routes.inTray() }, { label: 'File' }]}
        note={
          <>
            <Badge>{upload.state}</Badge> {formatBytes(sizeBytes, site.decimalMark)}, received{' '}
            {formatDateTime(at, site.timeZone)} by {person}, {site.name}
            {layoutName !== null && <>, read by the layout “{layoutName}”</>}
          </>
        }
        actions={
          <a className="link target inline-flex items-center" href={routes.api.file(upload.id)}>
            The file as it came in
          </a>
        }
      />
      <Decision page={page} actor={actor} />
    </>
  );
}

function Decision({ page, actor }: { page: UploadPageDto; actor: Actor }) {
  const { upload } = page;
  const mayUpload = allows(actor.role, 'measurement:upload');
  if (upload.state === 'waiting' && mayUpload)
    return (
      <>
        <ConfirmForm page={page} />
        <SettleUpload uploadId={upload.id} to="withdrawn" />
      </>
    );
  return (
    <>
      <Notice title={STATE_SENTENCES[upload.state]}>
        {upload.recordId !== null && (
          <Link className="link" href={routes.reading(upload.recordId)}>
            Open its record
          </Link>
        )}
      </Notice>
      {upload.state === 'withdrawn' && mayUpload && (
        <SettleUpload uploadId={upload.id} to="waiting" />
      )}
    </>
  );
}

const STATE_SENTENCES = {
  waiting: 'This file waits for somebody who may confirm it.',
  held: 'This file was read and its record is held.',
  kept: 'This file was read and its record is kept.',
  withdrawn: 'This file was withdrawn; its bytes are kept and nothing of it counts.',
} as const;
