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
      <progress
        className="h-2 w-full overflow-hidden rounded border border-edge accent-blue"
        aria-label={label}
        value={share}
        max={1}
      />
    </div>
  );
}
