import { formatNumber, NOT_MEASURED, type NumberOptions } from '@/lib/format';

type ValueProps = {
  /** Null where nothing was measured: said in words. */
  amount: number | null;
  unit: string;
  /** “rms”, “p-p”, “lag”. */
  detection?: string;
  size?: 'body' | 'large';
  options?: NumberOptions;
  /** What to say where there is no number. */
  missing?: string;
};

/** A number with its unit and detection; the number stands out, the unit follows quietly. */
export function Value({
  amount,
  unit,
  detection,
  size = 'body',
  options,
  missing = NOT_MEASURED,
}: ValueProps) {
  if (amount === null) return <span className="text-ink-soft">{missing}</span>;
  const behind = [unit, detection].filter(Boolean).join(' ').replaceAll(' ', '\u00a0');
  const tight = unit.startsWith('°');
  return (
    <span className="figures whitespace-nowrap">
      <span className={size === 'large' ? 'text-lg' : ''}>{formatNumber(amount, options)}</span>
      {!tight && '\u00a0'}
      <span className={size === 'large' ? 'text-xs text-ink-soft' : 'text-ink-soft'}>{behind}</span>
    </span>
  );
}
