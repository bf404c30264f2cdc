/** The name of the product, its second half in layout blue. */
export function Wordmark({ className = 'text-lg' }: { className?: string }) {
  return (
    <span className={`font-bold tracking-tight ${className}`}>
      Even<span className="text-blue">run</span>
    </span>
  );
}
