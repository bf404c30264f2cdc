import type { EntityManager } from '@mikro-orm/postgresql';
import { MachineEvent, Machine } from '@/entities/machine';
import { OneXVector, Reading } from '@/entities/measured-record';
import { Point } from '@/entities/bearing';
import { dueCard, type DueCard } from '@/lib/domain/due/due-card';
import type { DueReading } from '@/lib/domain/due/due-machine';
import { shortTurnDeg } from '@/lib/domain/units';
import { dayOfInstant } from '@/lib/domain/trends/trend-line';

/** The Due board's card of a machine as its readings in the register make it. */
export async function dueCardOf(em: EntityManager, tag: string): Promise<DueCard> {
  const machine = await em.findOneOrFail(Machine, { tag });
  const points = await em.find(Point, { machine: machine.id }, { orderBy: { order: 'asc' } });
  const series = new Map<number, DueReading[]>();
  for (const { id } of points) series.set(id, await readingsOf(em, id));
  const last = (id: number) => series.get(id)?.at(-1);
  const ruling = points.reduce((worst, point) =>
    (last(point.id)?.value ?? 0) > (last(worst.id)?.value ?? 0) ? point : worst,
  );
  const limits = await em.findOneOrFail(
    Reading,
    { point: ruling.id, limits: { $ne: null } },
    { orderBy: { takenAt: 'desc' } },
  );
  const { bAb: ab = 0, bBc: bc = 0, bCd: cd = 0 } = limits.limits ?? {};
  const events = await em.find(MachineEvent, { machine: machine.id });
  const balances = events.filter(({ kind }) => kind === 'balance');
  const at = (direction: string) =>
    points.find((p) => p.bearing.id === ruling.bearing.id && p.direction === direction);
  const [h, v] = [last(at('H')?.id ?? 0), last(at('V')?.id ?? 0)];
  const today = dayOfInstant(Date.now());
  const card = dueCard({
    tag,
    criticality: machine.criticality,
    boundaries: { ab, bc, cd },
    readings: series.get(ruling.id) ?? [],
    breakDays: events.filter((e) => e.breaksTrend).map((e) => dayOfInstant(e.at.getTime())),
    readingAgeDays: today - (last(ruling.id)?.day ?? 0),
    horizontalOverVertical: h?.oneX && v?.oneX ? h.oneX / v.oneX : null,
    horizontalLessVerticalLagDeg:
      h?.lagDeg != null && v?.lagDeg != null ? shortTurnDeg(v.lagDeg, h.lagDeg) : null,
    daysSinceBalance: null,
    balanceLifeDays: null,
    balancesInYear: balances.length,
    blockingFindings: [],
  });
  if (!card.ok) throw new Error(card.failure.message);
  return card.value;
}

async function readingsOf(em: EntityManager, pointId: number): Promise<DueReading[]> {
  const kept = { point: pointId, status: 'kept' } as const;
  const readings = await em.find(
    Reading,
    { ...kept, kind: 'overall velocity' },
    { orderBy: { takenAt: 'asc' } },
  );
  const vectors = await em.find(OneXVector, kept);
  return readings.map((reading) => {
    const vector = vectors.find(({ record }) => record.id === reading.record.id);
    return {
      day: dayOfInstant(reading.takenAt.getTime()),
      value: reading.value,
      oneX: vector?.amplitude ?? null,
      lagDeg: vector?.lagDeg ?? null,
      speedRpm: reading.speedRpm ?? null,
    };
  });
}
