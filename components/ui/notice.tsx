import type { ReactNode } from 'react';

type NoticeProps = {
  kind?: 'info' | 'caution' | 'failure' | 'success';
  title?: ReactNode;
  children?: ReactNode;
};

const LOOKS = {
  info: { edge: 'border-l-blue', sign: 'i', word: 'Note' },
  success: { edge: 'border-l-blue', sign: '✓', word: 'Done' },
  caution: { edge: 'border-l-ink', sign: '!', word: 'Mind' },
  failure: { edge: 'border-l-fault', sign: '▲', word: 'Failed' },
} as const;

/** Something to know about what stands beside it. Not for safety: that is `Caution`. */
export function Notice({ kind = 'info', title, children }: NoticeProps) {
  const { edge, sign, word } = LOOKS[kind];
  return (
    <div
      role={kind === 'failure' ? 'alert' : 'status'}
      className={`flex gap-3 rounded border border-rule border-l-4 bg-sheet px-4 py-3 ${edge}`}
    >
      <span
        className="figures flex size-5 shrink-0 items-center justify-center rounded-full border border-current text-xs font-bold"
        aria-hidden="true"
      >
        {sign}
      </span>
      <div className="min-w-0">
        <span className="sr-only">{word}: </span>
        {title !== undefined && <p className="font-semibold">{title}</p>}
        {children}
      </div>
    </div>
  );
}
