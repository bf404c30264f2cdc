import { routes } from '@/lib/routes';

export type Place = { label: string; href: string; holds: readonly string[] };

/** Places of the register, in the order of the navigation, with the addresses that belong to each. */
export const PLACES: readonly Place[] = [
  { label: 'Today', href: routes.today(), holds: [] },
  {
    label: 'Plant book',
    href: routes.plantBook(),
    holds: [routes.plantBook(), stem(routes.machine(0)), stem(routes.point(0))],
  },
  {
    label: 'In-tray',
    href: routes.inTray(),
    holds: [routes.inTray(), stem(routes.reading(0))],
  },
  { label: 'Balance jobs', href: routes.balanceJobs(), holds: [routes.balanceJobs()] },
  { label: 'Due board', href: routes.dueBoard(), holds: [routes.dueBoard()] },
  { label: 'Workbench', href: routes.workbench(), holds: [routes.workbench()] },
  { label: 'Settings', href: routes.settings(), holds: [routes.settings()] },
];

/** Whether an address belongs to a place. */
export function isWithin(place: Place, pathname: string): boolean {
  if (pathname === place.href) return true;
  return place.holds.some((address) => pathname.startsWith(`${address}/`));
}

function stem(address: string): string {
  return address.slice(0, address.lastIndexOf('/'));
}
