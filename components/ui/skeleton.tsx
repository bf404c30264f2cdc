/** Stands where content will be. Give it the height of what it stands for. */
export function Skeleton({ className = 'h-24' }: { className?: string }) {
  return (
    <div
      className={`animate-pulse rounded bg-rule/60 ${className}`}
      role="status"
      aria-label="Loading"
    />
  );
}
