'use client';

import { Button } from '@/components/ui/button';

type RowCountProps = {
  count: number;
  least: number;
  what: string;
  onChange: (count: number) => void;
};

/** Adds and removes typed rows. */
export function RowCount({ count, least, what, onChange }: RowCountProps) {
  return (
    <div className="flex gap-2">
      <Button onClick={() => onChange(count + 1)}>Add a {what}</Button>
      {count > least && (
        <Button variant="quiet" onClick={() => onChange(count - 1)}>
          Remove the last
        </Button>
      )}
    </div>
  );
}
