import Link from 'next/link';
import { Panel } from '@/components/ui/panel';
import { ZoneStamp } from '@/components/ui/zone-stamp';
import { formatPlural } from '@/lib/format';
import { routes } from '@/lib/routes';
import type { PlantBookRow } from '@/lib/schemas/register';

/** The register as a tree: site, area, machine. */
export function AreaTree({ rows }: { rows: readonly PlantBookRow[] }) {
  return grouped(rows, ({ siteName }) => siteName).map(([siteName, ofSite]) => (
    <Panel key={siteName} title={siteName} note={formatPlural(ofSite.length, 'machine')}>
      <ul className="flex flex-col gap-4">
        {grouped(ofSite, ({ areaName }) => areaName).map(([areaName, ofArea]) => (
          <li key={areaName}>
            <h3 className="text-sm font-semibold">{areaName}</h3>
            <ul className="mt-1 border-l border-rule pl-4">
              {ofArea.map((row) => (
                <li key={row.id} className="target flex items-center gap-3">
                  <ZoneStamp zone={row.zone} size="small" />
                  <span>
                    <Link className="link font-semibold" href={routes.machine(row.id)}>
                      {row.tag}
                    </Link>{' '}
                    {row.name}
                  </span>
                </li>
              ))}
            </ul>
          </li>
        ))}
      </ul>
    </Panel>
  ));
}

function grouped(
  rows: readonly PlantBookRow[],
  nameOf: (row: PlantBookRow) => string,
): [string, PlantBookRow[]][] {
  const groups = new Map<string, PlantBookRow[]>();
  for (const row of rows) groups.set(nameOf(row), [...(groups.get(nameOf(row)) ?? []), row]);
  return [...groups].sort(([a], [b]) => a.localeCompare(b));
}
