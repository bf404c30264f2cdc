'use client';

import { useState } from 'react';
import { useDropzone } from 'react-dropzone';
import { PointPicker } from '@/components/register/point-picker';
import { Button } from '@/components/ui/button';
import { Panel } from '@/components/ui/panel';
import { ProgressBar } from '@/components/ui/progress-bar';
import { SelectField } from '@/components/ui/select-field';
import { formatBytes, formatPlural } from '@/lib/format';
import type { DropPoint } from '@/lib/schemas/in-tray';
import { UPLOAD_BYTES_MAX } from '@/lib/schemas/upload-input';
import { ChosenList } from './chosen-list';
import { useSending } from './use-sending';

type DropFilesProps = {
  points: readonly DropPoint[];
  pointId: number | null;
  sites: readonly { id: number; name: string }[];
  siteId: number;
};

/** Choose or drop many files, say whose they are, send them, see what became of each. */
export function DropFiles({ points, pointId, sites, siteId }: DropFilesProps) {
  const [target, setTarget] = useState({ siteId, pointId });
  const { files, busy, add, remove, send, again } = useSending();
  const here = points.filter((point) => point.siteId === target.siteId);
  const waiting = files.filter(({ state }) => state === 'chosen').length;
  return (
    <>
      <Panel title="Where they belong">
        <div className="flex flex-col gap-4">
          {sites.length > 1 && (
            <SelectField
              name="siteId"
              label="Site"
              value={String(target.siteId)}
              onChange={(event) => setTarget({ siteId: Number(event.target.value), pointId: null })}
              options={sites.map(({ id, name }) => ({ value: String(id), label: name }))}
            />
          )}
          <PointPicker
            key={target.siteId}
            points={here}
            pointId={target.pointId}
            placeholder="Say it for each file later"
            onChoose={(chosen) => setTarget((before) => ({ ...before, pointId: chosen }))}
          />
        </div>
      </Panel>
      <DropPlace onFiles={add} />
      {files.length > 0 && (
        <Panel title="Files" note={formatPlural(files.length, 'file')}>
          <Progress files={files} />
          <ChosenList files={files} onRemove={remove} onAgain={again} />
          {waiting > 0 && (
            <Button
              variant="primary"
              className="mt-4"
              pending={busy}
              onClick={() => {
                if (!busy) void send(target);
              }}
            >
              Send {formatPlural(waiting, 'file')}
            </Button>
          )}
        </Panel>
      )}
    </>
  );
}

function DropPlace({ onFiles }: { onFiles: (files: readonly File[]) => void }) {
  const { getRootProps, getInputProps, isDragActive, open } = useDropzone({
    onDrop: (accepted) => onFiles(accepted),
    noClick: true,
    noKeyboard: true,
  });
  return (
    <div
      {...getRootProps()}
      className={`flex flex-col items-center gap-3 rounded border-2 border-dashed px-4 py-10 text-center ${isDragActive ? 'border-blue bg-blue-wash' : 'border-edge bg-sheet'}`}
    >
      <input {...getInputProps({ 'aria-label': 'Files to upload' })} />
      <p className="text-base font-semibold">
        {isDragActive ? 'Let go to choose them' : 'Drop CSV files here'}
      </p>
      <Button onClick={open}>Choose files</Button>
      <p className="max-w-prose text-ink-soft">
        One record a file, with a sample rate or a time column; a tacho column gives the lag. Up to{' '}
        {formatBytes(UPLOAD_BYTES_MAX)} each. A plain header is{' '}
        <code className="figures">time_s,acceleration_m_s2,tacho</code>.
      </p>
    </div>
  );
}

function Progress({ files }: { files: ReturnType<typeof useSending>['files'] }) {
  const sum = (some: typeof files) => some.reduce((bytes, { file }) => bytes + file.size, 0);
  const sendable = files.filter(({ file }) => file.size <= UPLOAD_BYTES_MAX);
  const settled = sendable.filter(({ state }) => state === 'done' || state === 'refused');
  const sending = files.find(({ state }) => state === 'sending');
  if (!sending && settled.length === 0) return null;
  return (
    <div className="mb-4" aria-live="polite">
      <ProgressBar
        label={sending ? `Sending ${sending.file.name}` : 'Sent'}
        done={sum(settled)}
        of={sum(sendable)}
        text={`${settled.length} of ${sendable.length} files, ${formatBytes(sum(settled))} of ${formatBytes(sum(sendable))}`}
      />
    </div>
  );
}
