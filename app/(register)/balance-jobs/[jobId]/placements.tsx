import { PlacementTable } from '@/components/balancing/placement-table';
import type { BalanceJobDto } from '@/lib/schemas/balance-job';

/** The answer on fixed positions, plane by plane; nothing where every plane is free. */
export function Placements({ job }: { job: BalanceJobDto }) {
  return job.placements.map((placement) => (
    <PlacementTable
      key={placement.planeId}
      placement={placement}
      unit={job.unit}
      decimalMark={job.site.decimalMark}
    />
  ));
}
