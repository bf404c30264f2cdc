'use client';

import Link from 'next/link';
import { Badge } from '@/components/ui/badge';
import { Button } from '@/components/ui/button';
import { LinkButton } from '@/components/ui/link-button';
import { Spinner } from '@/components/ui/spinner';
import { formatBytes } from '@/lib/format';
import { routes } from '@/lib/routes';
import type { UploadOutcome } from '@/lib/schemas/in-tray';
import type { ChosenFile } from './use-sending';

type ChosenListProps = {
  files: readonly ChosenFile[];
  onRemove: (key: string) => void;
  onAgain: (key: string) => void;
};

const STATE_WORDS = {
  chosen: 'chosen',
  sending: 'sending',
  done: 'received',
  refused: 'refused',
} as const;

/** The chosen files, each with what became of it and its next step. */
export function ChosenList({ files, onRemove, onAgain }: ChosenListProps) {
  return (
    <ul className="flex flex-col divide-y divide-rule">
      {files.map((chosen) => (
        <li key={chosen.key} className="flex flex-wrap items-start justify-between gap-3 py-3">
          <div className="min-w-0 flex-1 basis-72">
            <p className="flex flex-wrap items-center gap-2">
              <span className="font-semibold break-all">{chosen.file.name}</span>
              <span className="text-ink-soft">{formatBytes(chosen.file.size)}</span>
              <Badge>{STATE_WORDS[chosen.state]}</Badge>
              {chosen.state === 'sending' && <Spinner />}
            </p>
            {chosen.outcome && <Outcome outcome={chosen.outcome} />}
          </div>
          <NextStep chosen={chosen} onRemove={onRemove} onAgain={onAgain} />
        </li>
      ))}
    </ul>
  );
}

function Outcome({ outcome }: { outcome: UploadOutcome }) {
  const { received, refusal } = outcome;
  if (refusal)
    return (
      <p className="mt-1 flex gap-1.5 font-semibold text-fault" role="alert">
        <span aria-hidden="true">▲</span>
        <span>
          {refusal.message}{' '}
          {refusal.link && (
            <Link className="link" href={refusal.link}>
              Open that file
            </Link>
          )}
        </span>
      </p>
    );
  if (!received) return null;
  if (received.problem !== null) return <p className="mt-1">{received.problem}</p>;
  if (received.questions.length > 0) return <p className="mt-1">{received.questions.join(' ')}</p>;
  const by = received.layoutName === null ? '' : ` by the layout “${received.layoutName}”`;
  return <p className="mt-1 text-ink-soft">Read{by}. Confirm point and time to keep it.</p>;
}

function NextStep({
  chosen,
  onRemove,
  onAgain,
}: { chosen: ChosenFile } & Omit<ChosenListProps, 'files'>) {
  const { key, file, state, outcome } = chosen;
  if (outcome?.received)
    return (
      <LinkButton href={routes.upload(outcome.received.uploadId)}>
        Confirm<span className="sr-only"> {file.name}</span>
      </LinkButton>
    );
  if (state === 'sending') return null;
  const name = <span className="sr-only"> {file.name}</span>;
  return (
    <span className="flex gap-2">
      {state === 'refused' && !outcome?.refusal?.link && (
        <Button variant="quiet" onClick={() => onAgain(key)}>
          Send again{name}
        </Button>
      )}
      <Button variant="quiet" onClick={() => onRemove(key)}>
        Leave out{name}
      </Button>
    </span>
  );
}
