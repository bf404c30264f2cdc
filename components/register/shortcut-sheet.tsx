'use client';

import { useState } from 'react';
import { Dialog } from '@/components/ui/dialog';
import { KeyCap } from '@/components/ui/key-cap';
import { useKeysSwitch, useShortcut } from './use-shortcut';

const KEYS = [
  { keys: ['/'], does: 'Find a machine' },
  { keys: ['Ctrl', 'K'], does: 'Find a machine, also while typing' },
  { keys: ['?'], does: 'Show this list' },
  { keys: ['j'], does: 'Next row of the table' },
  { keys: ['k'], does: 'Row before' },
  { keys: ['Enter'], does: 'Open what is marked' },
  { keys: ['←', '→'], does: 'Move the cursor of a chart' },
  { keys: ['Home', 'End'], does: 'First or last value of a chart' },
  { keys: ['Esc'], does: 'Close what lies on top, undo a zoom' },
] as const;

/** The list of keys, opened by `?`; single keys can be switched off here. */
export function ShortcutSheet() {
  const [open, setOpen] = useState(false);
  const [on, switchKeys] = useKeysSwitch();
  useShortcut('?', () => setOpen(true));
  return (
    <Dialog title="Keys" open={open} onOpenChange={setOpen}>
      <dl className="grid grid-cols-[auto_1fr] items-center gap-x-4 gap-y-2">
        {KEYS.map(({ keys, does }) => (
          <div key={does} className="contents">
            <dt className="flex gap-1">
              {keys.map((key) => (
                <KeyCap key={key}>{key}</KeyCap>
              ))}
            </dt>
            <dd>{does}</dd>
          </div>
        ))}
      </dl>
      <label className="target mt-4 flex cursor-pointer items-center gap-2.5">
        <input
          type="checkbox"
          className="size-5 accent-blue"
          checked={on}
          onChange={(event) => switchKeys(event.target.checked)}
        />
        Single keys work in this browser
      </label>
    </Dialog>
  );
}
