import Link from 'next/link';
import type { ReactNode } from 'react';
import { Notice } from '@/components/ui/notice';
import { routes } from '@/lib/routes';
import type { ReadingPageDto } from '@/lib/schemas/reading-page';

/** What a reader must know before trusting the record: held, lined through, moved, corrected. */
export function StateNotice({ page }: { page: ReadingPageDto }) {
  const { state, reasons, decisionReason, declared, place } = page;
  return (
    <>
      {state === 'held' && (
        <Notice kind="caution" title="Held: it feeds no trend, no limit and no list">
          <Reasons reasons={reasons} />
          <a className="link" href="#decide">
            Decide what becomes of it
          </a>
        </Notice>
      )}
      {state === 'lined through' && (
        <Notice kind="caution" title="Lined through: it feeds nothing">
          {decisionReason ?? ''} {page.upload && <OtherFile uploadId={page.upload.id} />}
        </Notice>
      )}
      {state === 'kept' && reasons.length > 0 && (
        <Notice title={`Kept after a look at it: ${decisionReason ?? ''}`}>
          <Reasons reasons={reasons} />
        </Notice>
      )}
      {declared && (
        <Notice
          title={`Moved here from ${declared.machineTag} ${declared.label}: ${decisionReason ?? ''}`}
        >
          It was declared for{' '}
          <Link className="link" href={routes.point(declared.pointId)}>
            {declared.machineTag} {declared.label}
          </Link>{' '}
          and counts for {place.machineTag} {place.label}.
        </Notice>
      )}
      <Chain page={page} />
    </>
  );
}

function Reasons({ reasons }: { reasons: ReadingPageDto['reasons'] }) {
  return (
    <ul className="list-disc pl-4">
      {reasons.map(({ code, message }) => (
        <li key={code}>{message}</li>
      ))}
    </ul>
  );
}

function OtherFile({ uploadId }: { uploadId: number }): ReactNode {
  return (
    <Link className="link" href={routes.upload(uploadId)}>
      Take its file up again
    </Link>
  );
}

function Chain({ page: { correctedById, supersedesId } }: { page: ReadingPageDto }) {
  if (correctedById === null && supersedesId === null) return null;
  return (
    <Notice>
      {correctedById !== null && (
        <p>
          Corrected by{' '}
          <Link className="link" href={routes.reading(correctedById)}>
            a newer record
          </Link>
          .
        </p>
      )}
      {supersedesId !== null && (
        <p>
          It corrects{' '}
          <Link className="link" href={routes.reading(supersedesId)}>
            an older record
          </Link>
          .
        </p>
      )}
    </Notice>
  );
}
