import { z } from 'zod';
import { ROLES } from '@/lib/domain/access/permissions';
import { id, optionalNumber, text, typedNumber } from './number';

/** Shortest password that is taken. */
export const PASSWORD_MIN = 12;

// bcrypt reads no further than 72 bytes: what stands behind them would not protect anything.
const PASSWORD_MAX_BYTES = 72;

const password = z
  .string({ error: 'Write a password.' })
  .min(PASSWORD_MIN, `Use at least ${String(PASSWORD_MIN)} characters, such as three words.`)
  .refine((typed) => new TextEncoder().encode(typed).length <= PASSWORD_MAX_BYTES, {
    error: `Use at most ${String(PASSWORD_MAX_BYTES)} bytes: letters of plain English are one each.`,
  });

const email = text('the e-mail address', 200)
  .toLowerCase()
  .pipe(
    z.email({
      error: ({ input }) =>
        `“${String(input)}” is no e-mail address. Write one such as name@plant.example.`,
    }),
  );

const identity = {
  name: text('the name', 120),
  role: z.enum(ROLES, { error: 'Choose a role.' }),
  siteIds: z.array(id, { error: 'Choose at least one site.' }).min(1, 'Choose at least one site.'),
};

export const createPersonInput = z.object({
  ...identity,
  email,
  password,
});

export const editPersonInput = z.object({ personId: id, ...identity });

export const setPasswordInput = z.object({ personId: id, password });

export const changePasswordInput = z.object({
  currentPassword: z
    .string({ error: 'Write your password of now.' })
    .min(1, 'Write your password of now.'),
  password,
});

export const closePersonInput = z.object({
  personId: id,
  reason: text('why the account is closed', 400),
});

export const reopenPersonInput = z.object({
  personId: id,
  reason: text('why the account is opened again', 400),
});

const boundary = (name: string) =>
  typedNumber({ what: `the boundary ${name}`, unit: 'mm/s rms', above: 0, max: 1000 });

export const createLimitSetInput = z
  .object({
    siteId: id,
    title: text('the title', 160),
    edition: text('the edition or the date', 120),
    citation: text('where the values come from', 400),
    bandLowHz: typedNumber({ what: 'the lower end of the band', unit: 'Hz', above: 0 }),
    bandHighHz: typedNumber({ what: 'the upper end of the band', unit: 'Hz', above: 0, max: 1e6 }),
    bAb: boundary('A/B'),
    bBc: boundary('B/C'),
    bCd: boundary('C/D'),
    speedMinRpm: optionalNumber({ what: 'the lowest speed', unit: 'r/min', above: 0 }),
    speedMaxRpm: optionalNumber({ what: 'the highest speed', unit: 'r/min', above: 0 }),
    powerMinKw: optionalNumber({ what: 'the lowest power', unit: 'kW', min: 0 }),
    powerMaxKw: optionalNumber({ what: 'the highest power', unit: 'kW', above: 0 }),
    support: z.enum(['rigid', 'flexible', 'any'], { error: 'Choose the support class.' }),
  })
  .superRefine((set, context) => {
    rising(context, 'bBc', ['A/B', set.bAb], ['B/C', set.bBc]);
    rising(context, 'bCd', ['B/C', set.bBc], ['C/D', set.bCd]);
    rising(
      context,
      'bandHighHz',
      ['The lower end', set.bandLowHz],
      ['the upper end', set.bandHighHz],
    );
    rising(
      context,
      'speedMaxRpm',
      ['The lowest speed', set.speedMinRpm],
      ['the highest', set.speedMaxRpm],
    );
    rising(
      context,
      'powerMaxKw',
      ['The lowest power', set.powerMinKw],
      ['the highest', set.powerMaxKw],
    );
  });

type Named = readonly [name: string, value: number | null];

function rising(context: z.RefinementCtx, field: string, low: Named, high: Named): void {
  if (low[1] === null || high[1] === null || low[1] < high[1]) return;
  context.addIssue({
    code: 'custom',
    path: [field],
    message: `${low[0]} is ${String(low[1])} and ${high[0]} ${String(high[1])}: the second must be more.`,
  });
}

export const retireLimitSetInput = z.object({
  limitSetId: z.coerce.number().int().positive('Choose a limit set.'),
  reason: text('why the limit set is retired', 400),
});
