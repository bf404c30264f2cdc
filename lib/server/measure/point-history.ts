import 'server-only';
import type { EntityManager } from '@mikro-orm/postgresql';
import type { PointHistory } from '@/lib/domain/intake/record-doubts';
import { DISTANCE_DOUBT_DB, LEVELS_COMPARED } from '@/lib/domain/intake/record-doubts';
import { levelDistanceDb, type ThirdOctaveLevel } from '@/lib/domain/signal/third-octave';
import { METHOD, readThirdOctaves } from './derived-result';

/** The record a history is looked up for; `recordId` leaves itself out when it is judged again. */
export type Candidate = {
  readonly pointId: number;
  readonly siteId: number;
  readonly takenAt: Date;
  readonly recordId: number | null;
  readonly thirdOctaves: readonly ThirdOctaveLevel[];
};

export type NearPoint = { pointId: number; label: string; distanceDb: number };

/** What the point has kept near that time, and which point the record resembles most. */
export async function pointHistory(em: EntityManager, candidate: Candidate): Promise<PointHistory> {
  const distanceDb = await distanceToLast(em, candidate);
  const unlike = distanceDb !== null && distanceDb >= DISTANCE_DOUBT_DB;
  const near = unlike ? await nearestPoints(em, candidate) : [];
  const nearest = near.find(({ pointId }) => pointId !== candidate.pointId) ?? null;
  return {
    lastOverallsMmS: await lastOveralls(em, candidate),
    distanceDb,
    nearest,
    nearestRecordS: await nearestRecordS(em, candidate),
  };
}

/** The points of the site by the likeness of their last kept record to this one, nearest first. */
export async function nearestPoints(em: EntityManager, candidate: Candidate): Promise<NearPoint[]> {
  const rows = await em
    .getConnection()
    .execute<{ point_id: number; tag: string; label: string; levels: unknown }[]>(
      `select distinct on (r.point_id) r.point_id, m.tag, p.label, d.result->'thirdOctaves' as levels
       from measured_record r
       join point p on p.id = r.point_id
       join machine m on m.id = p.machine_id and m.site_id = ?
       join derived d on d.record_id = r.id and d.method = ?
      where r.state = 'kept' and r.id <> ?
      order by r.point_id, r.taken_at desc`,
      [candidate.siteId, METHOD, candidate.recordId ?? 0],
      'all',
      em.getTransactionContext(),
    );
  return rows
    .flatMap(({ point_id: pointId, tag, label, levels }) => {
      const distanceDb = levelDistanceDb(candidate.thirdOctaves, readThirdOctaves(levels));
      return distanceDb === null ? [] : [{ pointId, label: `${tag} ${label}`, distanceDb }];
    })
    .sort((a, b) => a.distanceDb - b.distanceDb);
}

async function distanceToLast(em: EntityManager, candidate: Candidate): Promise<number | null> {
  const rows = await em.getConnection().execute<{ levels: unknown }[]>(
    `select d.result->'thirdOctaves' as levels
       from measured_record r
       join derived d on d.record_id = r.id and d.method = ?
      where r.point_id = ? and r.state = 'kept' and r.id <> ?
      order by abs(extract(epoch from r.taken_at - ?::timestamptz)) limit 1`,
    [METHOD, candidate.pointId, candidate.recordId ?? 0, candidate.takenAt.toISOString()],
    'all',
    em.getTransactionContext(),
  );
  const last = rows[0];
  return last ? levelDistanceDb(candidate.thirdOctaves, readThirdOctaves(last.levels)) : null;
}

async function lastOveralls(em: EntityManager, candidate: Candidate): Promise<number[]> {
  const rows = await em.getConnection().execute<{ value: number }[]>(
    `select value from reading
      where point_id = ? and kind = 'overall velocity' and status = 'kept' and record_id <> ?
      order by abs(extract(epoch from taken_at - ?::timestamptz)) limit ?`,
    [candidate.pointId, candidate.recordId ?? 0, candidate.takenAt.toISOString(), LEVELS_COMPARED],
    'all',
    em.getTransactionContext(),
  );
  return rows.map(({ value }) => value);
}

async function nearestRecordS(em: EntityManager, candidate: Candidate): Promise<number | null> {
  const rows = await em.getConnection().execute<{ apart: number | null }[]>(
    `select min(abs(extract(epoch from taken_at - ?::timestamptz)))::float8 as apart
       from measured_record
      where point_id = ? and state <> 'lined through' and id <> ?`,
    [candidate.takenAt.toISOString(), candidate.pointId, candidate.recordId ?? 0],
    'all',
    em.getTransactionContext(),
  );
  return rows[0]?.apart ?? null;
}
