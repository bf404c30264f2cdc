'use client';

import { useMutation } from '@tanstack/react-query';
import { useDropzone } from 'react-dropzone';
import { Button } from '@/components/ui/button';
import { Notice } from '@/components/ui/notice';
import { checkRecordFile } from '@/lib/client/check-record-file';
import { FileVerdict } from './file-verdict';

/** Choose or drop a kept job record; it is looked at and not stored. */
export function FileCheck() {
  const check = useMutation({
    mutationFn: async (file: File) => ({
      name: file.name,
      checked: await checkRecordFile(await file.text()),
    }),
  });
  const { getRootProps, getInputProps, isDragActive, open } = useDropzone({
    multiple: false,
    noClick: true,
    noKeyboard: true,
    onDrop: ([file]) => {
      if (file) check.mutate(file);
    },
  });
  return (
    <div className="flex flex-col gap-4">
      <div
        {...getRootProps()}
        className={`rounded border border-dashed p-4 ${isDragActive ? 'border-blue bg-blue-wash' : 'border-edge'}`}
      >
        <input {...getInputProps({ 'aria-label': 'Job record as JSON' })} />
        <div className="flex flex-wrap items-center gap-x-4 gap-y-2">
          <Button pending={check.isPending} onClick={open}>
            Choose the JSON file
          </Button>
          <p className="text-ink-soft">or drop it here. It is looked at and not stored.</p>
        </div>
      </div>
      <div aria-live="polite">
        {check.isError && (
          <Notice kind="failure" title="This file could not be checked">
            {check.error.message}
          </Notice>
        )}
        {check.isSuccess && <FileVerdict {...check.data} />}
      </div>
    </div>
  );
}
