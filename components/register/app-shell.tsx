import Link from 'next/link';
import type { ReactNode } from 'react';
import { routes } from '@/lib/routes';
import { AccountMenu, type SignedIn } from './account-menu';
import { FindMachine } from './find-machine';
import { Navigation } from './navigation';
import { QueryProvider } from './query-provider';
import { ShortcutSheet } from './shortcut-sheet';
import { SiteSwitch, type SiteChoice } from './site-switch';
import { Wordmark } from './wordmark';

type AppShellProps = {
  person: SignedIn;
  sites: readonly SiteChoice[];
  /** The site the lists are narrowed to; null for all. */
  siteId: number | null;
  inTrayCount: number;
  actions: {
    signOut: () => void | Promise<void>;
    switchSite: (form: FormData) => void | Promise<void>;
  };
  children: ReactNode;
};

/** What stands around every page: places, find, who is signed in. Left out in print. */
export function AppShell({ person, sites, siteId, inTrayCount, actions, children }: AppShellProps) {
  return (
    <QueryProvider>
      <a
        href="#content"
        className="sr-only focus:not-sr-only focus:absolute focus:top-2 focus:left-2 focus:z-50 focus:bg-sheet focus:px-4 focus:py-2"
      >
        Skip to the content
      </a>
      <header className="no-print border-b border-rule bg-sheet">
        <div className="mx-auto flex max-w-[100rem] flex-wrap items-center gap-x-6 gap-y-1 px-4 py-2 sm:px-8">
          <Link href={routes.today()} aria-label="Evenrun, Today" className="py-1">
            <Wordmark />
          </Link>
          <Navigation inTrayCount={inTrayCount} />
          <div className="flex w-full flex-wrap items-center justify-between gap-1 xl:ml-auto xl:w-auto">
            <SiteSwitch sites={sites} siteId={siteId} action={actions.switchSite} />
            <FindMachine />
            <AccountMenu person={person} signOut={actions.signOut} />
          </div>
        </div>
      </header>
      <main
        id="content"
        tabIndex={-1}
        className="mx-auto flex max-w-[100rem] flex-col gap-6 px-4 py-6 focus:outline-none sm:px-8 print:p-0"
      >
        {children}
      </main>
      <ShortcutSheet />
    </QueryProvider>
  );
}
