import 'server-only';
import { compare } from 'bcryptjs';
import { Person, Session } from '@/entities/person';
import { fail, ok } from '@/lib/domain/result';
import { changePasswordInput } from '@/lib/schemas/settings-input';
import { command } from '../command';
import { hashPassword } from '../people/hash-password';

/** Changes one's own password, known the old one; every session of one's own ends. */
export const changePassword = command(
  { name: 'changePassword', permission: 'password:change', input: changePasswordInput },
  async ({ em, actor, now, audit }, { currentPassword, password }) => {
    const { personId } = actor;
    const person = await em.findOneOrFail(Person, personId);
    if (!(await compare(currentPassword, person.passwordHash)))
      return fail(
        'wrong',
        'This is not your password of now. Check it and try again.',
        'currentPassword',
      );
    if (await compare(password, person.passwordHash))
      return fail('same', 'This is your password already. Choose another.', 'password');
    person.passwordHash = await hashPassword(password);
    const open = { person: personId, endedAt: null };
    const sessionsEnded = await em.nativeUpdate(Session, open, { endedAt: now });
    audit({ siteId: null, entity: 'Person', entityId: personId, after: { sessionsEnded } });
    return ok({ personId });
  },
);
