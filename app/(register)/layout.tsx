import type { ReactNode } from 'react';
import { AppShell } from '@/components/register/app-shell';
import { requireActor } from '@/lib/server/actor';
import { inTrayCount } from '@/lib/server/queries/in-tray-count';
import { chosenSiteId } from '@/lib/server/chosen-site';
import { signOutAction, switchSiteAction } from './actions';

export default async function RegisterLayout({ children }: { children: ReactNode }) {
  const actor = await requireActor();
  const [siteId, waiting] = await Promise.all([chosenSiteId(actor), inTrayCount(actor, undefined)]);
  return (
    <AppShell
      person={{ name: actor.name, role: actor.role }}
      sites={actor.sites.map(({ id, name }) => ({ id, name }))}
      siteId={siteId}
      inTrayCount={waiting}
      actions={{ signOut: signOutAction, switchSite: switchSiteAction }}
    >
      {children}
    </AppShell>
  );
}
