import type { EntityManager } from '@mikro-orm/postgresql';
import { Bearing, Point } from '@/entities/bearing';
import { LimitSet } from '@/entities/limit-set';
import { Machine, MachineEvent } from '@/entities/machine';
import { MeasuredRecord, OneXVector, Reading } from '@/entities/measured-record';
import { Person } from '@/entities/person';
import { Setup } from '@/entities/setup';
import { Site } from '@/entities/site';
import { judge } from '@/tests/server/due-board/judge';
import { seedMachine, type SeededMachine } from '@/tests/support/plant';

const DAY_MS = 86_400_000;

/** One value of a visit: overall and 1x in mm/s rms, lag in degrees, speed in r/min. */
export type Visit = {
  at: Date;
  value: number;
  oneX: number | null;
  lagDeg: number | null;
  speedRpm: number | null;
};

/** Enters machines, readings and events as they would stand in the register. */
export class BoardPlant {
  private constructor(
    private readonly em: EntityManager,
    private readonly site: Site,
    private readonly personId: number,
  ) {}

  static async at(em: EntityManager, siteId: number, personId: number): Promise<BoardPlant> {
    return new BoardPlant(em, await em.findOneOrFail(Site, siteId), personId);
  }

  async machine(
    tag: string,
    criticality: 'A' | 'B' | 'C' | 'D',
    boundaries: readonly [number, number, number],
  ): Promise<SeededMachine> {
    const [bAb, bBc, bCd] = boundaries;
    const limits = this.em.create(LimitSet, {
      title: `Limits of ${tag}`,
      edition: 'test',
      bAb,
      bBc,
      bCd,
      citation: 'Test data',
      enteredAt: new Date(),
    });
    const machine = await seedMachine(this.em, this.site, limits, tag);
    (await this.em.findOneOrFail(Machine, machine.machineId)).criticality = criticality;
    await this.em.flush();
    return machine;
  }

  /** A further point on a bearing of the machine. */
  async point(machine: SeededMachine, bearingId: number, direction: 'V' | 'A'): Promise<number> {
    const bearing = await this.em.findOneOrFail(Bearing, bearingId);
    const point = this.em.create(Point, {
      machine: machine.machineId,
      bearing,
      label: `${bearing.label}-${direction}`,
      direction,
      order: 9,
    });
    await this.em.flush();
    return point.id;
  }

  /** A kept reading with its 1x vector, judged by these boundaries. */
  async read(pointId: number, visit: Visit, boundaries = [1.4, 2.8, 4.5]): Promise<void> {
    const record = this.em.create(MeasuredRecord, {
      point: pointId,
      declaredPoint: pointId,
      source: 'typed',
      takenAt: visit.at,
      state: 'kept',
      person: this.personId,
      createdAt: visit.at,
    });
    this.em.create(Reading, {
      record,
      point: pointId,
      takenAt: visit.at,
      kind: 'overall velocity',
      value: visit.value,
      unit: 'mm/s rms',
      speedRpm: visit.speedRpm,
      zone: judge(visit.value, boundaries),
    });
    if (visit.oneX !== null) {
      this.em.create(OneXVector, {
        record,
        point: pointId,
        takenAt: visit.at,
        amplitude: visit.oneX,
        lagDeg: visit.lagDeg,
        speedRpm: visit.speedRpm ?? 1485,
        speedSource: 'stated',
        method: 'typed',
      });
    }
    await this.em.flush();
  }

  async balanced(machineId: number, at: Date, breaksTrend = true): Promise<void> {
    this.em.create(MachineEvent, {
      machine: machineId,
      at,
      kind: 'balance',
      text: 'Balanced',
      breaksTrend,
      person: this.personId,
    });
    await this.em.flush();
  }

  /** A second set-up from then on, such as a moved tacho. */
  async newSetup(machine: SeededMachine, at: Date): Promise<void> {
    const first = await this.em.findOneOrFail(Setup, machine.setupId);
    first.validTo = at;
    await this.em.flush();
    this.em.create(Setup, {
      machine: machine.machineId,
      number: 2,
      markDescription: first.markDescription,
      tachoDeg: 90,
      rotationFromDriveEnd: first.rotationFromDriveEnd,
      sensorPlaces: [],
      reason: 'Tacho moved',
      validFrom: at,
      person: this.em.getReference(Person, this.personId, { wrapped: true }),
    });
    await this.em.flush();
  }
}

/** The instant that many days before another. */
export function daysBefore(now: Date, days: number): Date {
  return new Date(now.getTime() - days * DAY_MS);
}
