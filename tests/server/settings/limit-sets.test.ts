import type { EntityManager } from '@mikro-orm/postgresql';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { LimitSet } from '@/entities/limit-set';
import { Machine } from '@/entities/machine';
import type { createLimitSetInput } from '@/lib/schemas/settings-input';
import { chooseLimitSet } from '@/lib/server/commands/edit-machine';
import { createMachine } from '@/lib/server/commands/create-machine';
import { createLimitSet, retireLimitSet } from '@/lib/server/commands/limit-sets';
import { limitSets } from '@/lib/server/queries/limit-sets';
import { newMachineForm } from '@/lib/server/queries/machine-forms';
import { newMachine } from '@/tests/server/register/new-machine';
import { openPlant } from '@/tests/support/open-plant';
import type { SmallPlant } from '@/tests/support/plant';
import type { z } from 'zod';

let em: EntityManager;
let plant: SmallPlant;
let close: () => Promise<void>;
let made = 0;

beforeAll(async () => {
  ({ em, plant, close } = await openPlant());
});

afterAll(() => close());

type Input = z.input<typeof createLimitSetInput>;

function newSet(over: Partial<Input> = {}): Input {
  made += 1;
  return {
    siteId: plant.home.siteId,
    title: `House limits ${made}`,
    edition: '2026',
    citation: 'Agreed with the maker of the fans',
    bandLowHz: '10',
    bandHighHz: '1000',
    bAb: '2,3',
    bBc: '4,5',
    bCd: '7,1',
    support: 'flexible',
    ...over,
  };
}

async function enter(over: Partial<Input> = {}): Promise<number> {
  const result = await createLimitSet(plant.at('engineer'), newSet(over));
  if (!result.ok) throw new Error(result.failure.message);
  return result.value.limitSetId;
}

const listed = async () => (await limitSets(plant.at('reader'), undefined)).sets;
const offered = async () => (await newMachineForm(plant.at('engineer'), undefined)).limitSets;

describe('a limit set entered', () => {
  it('stands in the list and in the choice, with its decimal commas read', async () => {
    const limitSetId = await enter();
    expect((await listed()).find(({ id }) => id === limitSetId)).toMatchObject({
      bAb: 2.3,
      bBc: 4.5,
      bCd: 7.1,
      siteName: 'Northbank Works',
      machines: 0,
      speedMinRpm: null,
    });
    expect((await offered()).map(({ id }) => id)).toContain(limitSetId);
  });

  it.each([
    [{ bBc: '2' }, 'bBc', 'A/B is 2.3 and B/C 2'],
    [{ bCd: '4.5' }, 'bCd', 'B/C is 4.5 and C/D 4.5'],
    [{ bandHighHz: '5' }, 'bandHighHz', 'The lower end is 10 and the upper end 5'],
    [{ speedMinRpm: '900', speedMaxRpm: '600' }, 'speedMaxRpm', '900'],
    [{ powerMinKw: '300', powerMaxKw: '15' }, 'powerMaxKw', '300'],
    [{ bAb: 'two' }, 'bAb', '“two” is not a number'],
    [{ bAb: '0' }, 'bAb', 'must be more than 0'],
    [{ citation: '' }, 'citation', 'where the values come from'],
  ])('is refused in words: %o', async (over, field, words) => {
    const result = await createLimitSet(plant.at('engineer'), newSet(over));
    expect(result).toMatchObject({ ok: false, failure: { field } });
    expect(result.ok ? '' : result.failure.message).toContain(words);
  });

  it('is refused with a title and an edition that the site has', async () => {
    const set = newSet();
    expect(await createLimitSet(plant.at('engineer'), set)).toMatchObject({ ok: true });
    expect(await createLimitSet(plant.at('engineer'), set)).toMatchObject({
      failure: { field: 'title', code: 'taken' },
    });
  });

  it.each(['reader', 'technician', 'planner'] as const)('is not entered by a %s', async (role) => {
    expect(await createLimitSet(plant.at(role), newSet())).toMatchObject({
      failure: { code: 'forbidden' },
    });
  });
});

describe('a limit set of one site', () => {
  it('judges no machine of another, also for somebody with both sites', async () => {
    const limitSetId = await enter();
    const both = plant.at('engineer');
    const everywhere = { ...both, sites: [...both.sites, ...plant.foreigner.sites] };
    expect(
      await chooseLimitSet(everywhere, {
        machineId: plant.away.machineId,
        limitSetId,
        reason: 'x',
      }),
    ).toMatchObject({ failure: { code: 'not-found' } });
  });
});

describe('a limit set retired', () => {
  it('leaves the choice and stays with the machines it judges', async () => {
    const limitSetId = await enter();
    const { machineId } = plant.home;
    const reason = 'The maker’s limits';
    expect(
      await chooseLimitSet(plant.at('engineer'), { machineId, limitSetId, reason }),
    ).toMatchObject({ ok: true });
    expect(
      await retireLimitSet(plant.at('engineer'), { limitSetId, reason: 'Newer edition' }),
    ).toMatchObject({ ok: true, value: { machinesUsing: 1 } });
    expect((await offered()).map(({ id }) => id)).not.toContain(limitSetId);
    expect((await listed()).find(({ id }) => id === limitSetId)).toMatchObject({
      state: 'retired',
      machines: 1,
    });
    expect(
      await chooseLimitSet(plant.at('engineer'), { machineId, limitSetId, reason }),
    ).toMatchObject({ ok: false });
    const late = await createMachine(
      plant.at('engineer'),
      newMachine(plant, { tag: 'KX-9', limitSetId }),
    );
    expect(late).toMatchObject({ failure: { code: 'retired', field: 'limitSetId' } });
    expect(
      await retireLimitSet(plant.at('engineer'), { limitSetId, reason: 'Again' }),
    ).toMatchObject({ failure: { code: 'already' } });
  });

  it('counts only machines that are not retired themselves', async () => {
    const limitSetId = await enter();
    const { machineId } = plant.home;
    await chooseLimitSet(plant.at('engineer'), { machineId, limitSetId, reason: 'A trial' });
    await em.nativeUpdate(Machine, { id: machineId }, { state: 'retired' });
    const retired = await retireLimitSet(plant.at('engineer'), { limitSetId, reason: 'Over' });
    await em.nativeUpdate(Machine, { id: machineId }, { state: 'active' });
    expect(retired).toMatchObject({ value: { machinesUsing: 0 } });
  });

  it.each([
    [{ limitSetId: '' }, 'limitSetId', 'Choose a limit set.'],
    [{ reason: ' ' }, 'reason', 'Write why the limit set is retired.'],
  ])('needs a set and a reason: %o', async (over, field, message) => {
    const input = { limitSetId: plant.limitSetId, reason: 'Newer edition', ...over };
    expect(await retireLimitSet(plant.at('engineer'), input)).toMatchObject({
      failure: { field, message },
    });
  });

  it('is never one that comes with the register', async () => {
    expect(
      await retireLimitSet(plant.at('engineer'), { limitSetId: plant.limitSetId, reason: 'x' }),
    ).toMatchObject({ failure: { code: 'shipped' } });
    expect(await em.fork().findOneOrFail(LimitSet, plant.limitSetId)).toMatchObject({
      state: 'in use',
    });
  });
});
