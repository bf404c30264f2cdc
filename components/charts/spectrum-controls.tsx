import { Button } from '@/components/ui/button';
import type { SpectrumMark, SpectrumView } from './spectrum-types';

type SpectrumControlsProps = {
  view: SpectrumView;
  onView: (view: SpectrumView) => void;
  marks: readonly SpectrumMark[];
  /** Orders need a speed. */
  withOrders: boolean;
};

/** Log or linear, Hz or orders, and what the harmonic cursors count from. */
export function SpectrumControls({ view, onView, marks, withOrders }: SpectrumControlsProps) {
  const chosen = typeof view.harmonicsOf === 'object' ? view.harmonicsOf.mark : view.harmonicsOf;
  const choose = (value: string) =>
    onView({
      ...view,
      harmonicsOf: value === 'off' || value === 'cursor' ? value : { mark: value },
    });
  return (
    <>
      <select
        aria-label="Harmonics"
        value={chosen}
        onChange={(event) => choose(event.target.value)}
        className="target cursor-pointer rounded border border-edge bg-sheet px-2 text-sm"
      >
        <option value="off">No harmonics</option>
        <option value="cursor">Harmonics of the cursor</option>
        {marks.map(({ label }) => (
          <option key={label} value={label}>
            Harmonics of {label}
          </option>
        ))}
      </select>
      <Button
        variant="quiet"
        onClick={() => onView({ ...view, y: view.y === 'log' ? 'linear' : 'log' })}
      >
        {view.y === 'log' ? 'Linear scale' : 'Log scale'}
      </Button>
      {withOrders && (
        <Button
          variant="quiet"
          onClick={() => onView({ ...view, x: view.x === 'Hz' ? 'orders' : 'Hz' })}
        >
          {view.x === 'Hz' ? 'In orders' : 'In Hz'}
        </Button>
      )}
    </>
  );
}
