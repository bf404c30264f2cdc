'use client';

import { Popover } from 'radix-ui';
import type { Role } from '@/lib/domain/access/permissions';
import { ROLE_NAMES } from '@/lib/format';
import { Button } from '@/components/ui/button';
import { ThemeSwitch } from './theme';

export type SignedIn = { name: string; role: Role };

type AccountMenuProps = { person: SignedIn; signOut: () => void | Promise<void> };

/** Who is signed in and as what; appearance and the way out. */
export function AccountMenu({ person, signOut }: AccountMenuProps) {
  return (
    <Popover.Root>
      <Popover.Trigger className="target cursor-pointer rounded border border-transparent px-2 text-left leading-tight hover:border-edge">
        <span className="block font-semibold">{person.name}</span>
        <span className="block text-xs text-ink-soft">{ROLE_NAMES[person.role]}</span>
      </Popover.Trigger>
      <Popover.Portal>
        <Popover.Content
          align="end"
          sideOffset={6}
          aria-label="Your account"
          className="z-50 flex w-64 flex-col gap-4 rounded border border-rule bg-sheet p-4 shadow-xl"
        >
          <ThemeSwitch />
          <form action={signOut}>
            <Button type="submit" className="w-full">
              Sign out
            </Button>
          </form>
        </Popover.Content>
      </Popover.Portal>
    </Popover.Root>
  );
}
