import { hash } from 'bcryptjs';
import type { EntityManager } from '@mikro-orm/postgresql';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { AuditEvent } from '@/entities/audit-event';
import { Person, Session } from '@/entities/person';
import { changePassword } from '@/lib/server/commands/change-password';
import { signIn } from '@/lib/server/sign-in';
import { openPlant } from '@/tests/support/open-plant';
import type { SmallPlant } from '@/tests/support/plant';

let em: EntityManager;
let plant: SmallPlant;
let close: () => Promise<void>;

const OLD = 'the password of now';
const NEXT = 'three plain words';

beforeAll(async () => {
  ({ em, plant, close } = await openPlant());
  await em.nativeUpdate(Person, {}, { passwordHash: await hash(OLD, 4) });
});

afterAll(() => close());

describe('one’s own password', () => {
  it('is changed by every role that knows the one of now; sessions end, others’ stay', async () => {
    const [reader, planner] = [plant.at('reader'), plant.at('planner')];
    for (const { email } of [reader, planner])
      expect(await signIn(email, OLD)).toMatchObject({ ok: true });
    const input = { currentPassword: OLD, password: NEXT };
    expect(await changePassword(reader, input)).toMatchObject({ ok: true });
    const open = (person: number) => em.fork().count(Session, { person, endedAt: null });
    expect([await open(reader.personId), await open(planner.personId)]).toEqual([0, 1]);
    expect(await signIn(reader.email, OLD)).toMatchObject({ ok: false });
    expect(await signIn(reader.email, NEXT)).toMatchObject({ ok: true });
    expect(await signIn(planner.email, OLD)).toMatchObject({ ok: true });
    const audit = await em.fork().findOneOrFail(AuditEvent, { action: 'changePassword' });
    expect(audit).toMatchObject({ entityId: reader.personId, after: { sessionsEnded: 1 } });
  });

  it.each([
    [{ currentPassword: 'not this one' }, 'currentPassword', 'not your password of now'],
    [{ currentPassword: '' }, 'currentPassword', 'Write your password of now'],
    [{ password: 'short' }, 'password', 'at least 12 characters'],
    [{ password: OLD }, 'password', 'your password already'],
  ])('stays where %o', async (over, field, words) => {
    const technician = plant.at('technician');
    const input = { currentPassword: OLD, password: NEXT, ...over };
    const result = await changePassword(technician, input);
    expect(result).toMatchObject({ ok: false, failure: { field } });
    expect(result.ok ? '' : result.failure.message).toContain(words);
    expect(await signIn(technician.email, OLD)).toMatchObject({ ok: true });
  });
});
