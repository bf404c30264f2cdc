import 'server-only';
import { LimitSet, LimitUse } from '@/entities/limit-set';
import { fail, ok } from '@/lib/domain/result';
import { createLimitSetInput, retireLimitSetInput } from '@/lib/schemas/settings-input';
import { command } from '../command';
import { notFound } from '../scope';

/** Enters a site's own limit set of velocity in mm/s rms. */
export const createLimitSet = command(
  { name: 'createLimitSet', permission: 'limitSet:edit', input: createLimitSetInput },
  async (context, { siteId, ...values }) => {
    const { em, audit, actor, now } = context;
    if (!context.siteIds.includes(siteId)) return notFound('site');
    const set = em.create(LimitSet, {
      ...values,
      site: siteId,
      quantity: 'velocity',
      unit: 'mm/s rms',
      enteredBy: actor.personId,
      enteredAt: now,
    });
    await em.flush();
    audit({ siteId, entity: 'LimitSet', entityId: set.id, after: values });
    return ok({ limitSetId: set.id });
  },
);

/** Takes a site's own limit set out of the choice; machines that use it keep it. */
export const retireLimitSet = command(
  { name: 'retireLimitSet', permission: 'limitSet:edit', input: retireLimitSetInput },
  async (context, { limitSetId, reason }) => {
    const { em, audit, siteIds } = context;
    const set = await em.findOne(LimitSet, {
      id: limitSetId,
      $or: [{ site: null }, { site: { $in: siteIds } }],
    });
    if (!set) return notFound('limit set');
    const site = set.site ?? null;
    if (site === null)
      return fail('shipped', 'This set comes with the register: choose another for your machines.');
    if (set.state === 'retired') return fail('already', 'This limit set is retired already.');
    set.state = 'retired';
    const machinesUsing = await em.count(LimitUse, {
      limitSet: limitSetId,
      toAt: null,
      machine: { state: 'active' },
    });
    audit({
      siteId: site.id,
      entity: 'LimitSet',
      entityId: limitSetId,
      before: { state: 'in use' },
      after: { state: 'retired', machinesUsing },
      reason,
    });
    return ok({ limitSetId, machinesUsing });
  },
);
