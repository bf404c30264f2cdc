type ProgressBarProps = {
  /** What is under way: “Reading fan-3.csv”. */
  label: string;
  done: number;
  of: number;
  /** The state in words: “12.4 MB of 29.9 MB”. */
  text: string;
};

/** Real progress of long work, in a bar and in words. */
export function ProgressBar({ label, done, of, text }: ProgressBarProps) {
  const share = of > 0 ? Math.min(1, done / of) : 0;
  return (
    <div className="flex flex-col gap-1">
      <div className="flex justify-between gap-4 text-sm">
        <span className="truncate">{label}</span>
        <span className="figures whitespace-nowrap text-ink-soft">{text}</span>
      </div>
      <div
        role="progressbar"
        aria-label={label}
        aria-valuemin={0}
        aria-valuemax={100}
        aria-valuenow={Math.round(share * 100)}
        aria-valuetext={text}
        className="h-2 overflow-hidden rounded border border-edge"
      >
        <div className="h-full bg-blue" style={{ width: `${share * 100}%` }} />
      </div>
    </div>
  );
}
