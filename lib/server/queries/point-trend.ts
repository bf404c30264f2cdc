import 'server-only';
import { MachineEvent } from '@/entities/machine';
import { OneXVector, Reading } from '@/entities/measured-record';
import { Setup } from '@/entities/setup';
import type { PointTrendDto } from '@/lib/schemas/register';
import { query } from '../query';
import { visiblePoint } from '../scope';

/** Everything a point's trend draws: kept readings only, limits as last judged, events. */
export const pointTrend = query(
  'measurement:read',
  async (context, pointId: number): Promise<PointTrendDto | null> => {
    const { em } = context;
    const point = await visiblePoint(context, pointId);
    if (!point) return null;
    const kept = { point: point.id, status: 'kept' } as const;
    const inTime = { orderBy: { takenAt: 'asc' } } as const;
    const overall = await em.find(Reading, { ...kept, kind: 'overall velocity' }, inTime);
    const vectors = await em.find(OneXVector, kept, inTime);
    const machine = point.machine.id;
    const events = await em.find(MachineEvent, { machine }, { orderBy: { at: 'asc' } });
    const setups = await em.find(Setup, { machine, number: { $gt: 1 } });
    return {
      overall: overall.map((reading) => ({
        at: reading.takenAt.toISOString(),
        value: reading.value,
        recordId: reading.record.id,
      })),
      oneX: vectors.map((vector) => ({
        at: vector.takenAt.toISOString(),
        value: vector.amplitude,
        lagDeg: vector.lagDeg ?? null,
        recordId: vector.record.id,
      })),
      limits: limitLines(overall.findLast((reading) => reading.limits)),
      events: [
        ...events.map((event) => ({
          id: `event-${event.id}`,
          at: event.at.toISOString(),
          label: shortened(event.text),
          jobId: event.balanceJobId ?? null,
          breaksTrend: event.breaksTrend,
        })),
        ...setups.map((setup) => ({
          id: `setup-${setup.id}`,
          at: setup.validFrom.toISOString(),
          label: shortened(`set-up ${setup.number}: ${setup.reason}`),
          jobId: null,
          breaksTrend: true,
        })),
      ],
    };
  },
);

const LABEL_LENGTH = 40;

/** What fits beside a tick on the time axis; the machine page has the whole text. */
function shortened(text: string): string {
  return text.length <= LABEL_LENGTH ? text : `${text.slice(0, LABEL_LENGTH - 1).trimEnd()}…`;
}

function limitLines(reading: Reading | undefined): PointTrendDto['limits'] {
  const limits = reading?.limits;
  if (!limits) return [];
  return [
    { label: 'A/B', value: limits.bAb },
    { label: 'B/C', value: limits.bBc },
    { label: 'C/D', value: limits.bCd },
  ];
}
