import { describe, expect, it } from 'vitest';
import { z } from 'zod';
import { routes } from '@/lib/routes';
import type { Actor } from '@/lib/schemas/actor';
import { computeResponse } from '@/lib/server/compute-response';
import { openApiDocument } from '@/lib/server/openapi';
import { solveRuns } from '@/lib/server/workbench/solve-runs';
import { split } from '@/lib/server/workbench/split';
import { tolerance } from '@/lib/server/workbench/tolerance';
import { near, nearDeg } from '@/tests/domain/balancing/near';
import published from '@/tests/reference/data/balancing-published.json';
import scenarios from '@/tests/reference/data/balancing-scenarios.json';

const reader: Actor = {
  personId: 1,
  name: 'R',
  email: 'r@example.test',
  role: 'reader',
  sites: [],
};
const { inputs, expected, tol } = scenarios.scenarios.S02;

const readings = (list: readonly { amp: number; deg: number }[]) =>
  list.map(({ amp, deg }) => ({ amplitude: amp, phaseDeg: deg }));

// Scenario S02: invented plant; expected values computed by an independent implementation.
const S02 = {
  unit: 'mm/s rms',
  phaseSense: 'lag',
  angleSense: 'against',
  rotationFromDriveEnd: 'clockwise',
  speedRpm: 990,
  planes: [{ radiusMm: 700 }, { radiusMm: 700 }],
  base: readings(inputs.base),
  trials: inputs.trial.map(({ g, radius_mm: radiusMm, deg: angleDeg, run }) => ({
    massG: g,
    radiusMm,
    angleDeg,
    stays: 'taken off',
    readings: readings(run),
  })),
};

const sent = (body: unknown) =>
  new Request('http://127.0.0.1/', {
    method: 'POST',
    body: typeof body === 'string' ? body : JSON.stringify(body),
  });

const problem = z.looseObject({
  status: z.number(),
  detail: z.string(),
  field: z.string().optional(),
});
const problemOf = async (response: Response) => problem.parse(await response.json());

describe('a computation by the public API', () => {
  it('answers S02', async () => {
    const response = await computeResponse(solveRuns, reader, sent(S02));
    expect(response.status).toBe(200);
    const { answer } = z
      .looseObject({
        answer: z.looseObject({
          planes: z.array(z.looseObject({ massG: z.number(), angleDeg: z.number() })),
        }),
      })
      .parse(await response.json());
    for (const [index, want] of expected.correction.entries()) {
      near(answer.planes[index]?.massG ?? NaN, want.g, tol.g);
      nearDeg(answer.planes[index]?.angleDeg ?? NaN, want.deg, tol.deg);
    }
  });

  it.each(['phaseSense', 'angleSense', 'rotationFromDriveEnd', 'unit'] as const)(
    'refuses a body without %s with 422 and names it',
    async (field) => {
      const { [field]: _left, ...rest } = S02;
      const response = await computeResponse(solveRuns, reader, sent(rest));
      expect(response.status).toBe(422);
      expect(response.headers.get('content-type')).toBe('application/problem+json');
      expect(await problemOf(response)).toMatchObject({ field });
    },
  );

  it('refuses a field that it does not know', async () => {
    const response = await computeResponse(solveRuns, reader, sent({ ...S02, speed_rpm: 990 }));
    expect(response.status).toBe(422);
    expect((await problemOf(response)).detail).toContain('speed_rpm');
  });

  it.each(['no json', '"text"', 'null', '7'])('answers 400 to %s', async (body) => {
    expect((await computeResponse(tolerance, reader, sent(body))).status).toBe(400);
  });

  it('answers 413 to a body that is too long, and 403 to a role that is none', async () => {
    const long = sent(JSON.stringify({ massG: '1'.repeat(100_001) }));
    expect((await computeResponse(split, reader, long)).status).toBe(413);
    const stranger = { ...reader, role: 'stranger' as 'reader' };
    expect((await computeResponse(split, stranger, sent({}))).status).toBe(403);
  });

  it('says in words what cannot be computed', async () => {
    const [first] = S02.trials;
    const response = await computeResponse(
      solveRuns,
      reader,
      sent({ ...S02, trials: [{ ...first, angleDeg: 720 }, S02.trials[1]] }),
    );
    expect(response.status).toBe(422);
    expect(await problemOf(response)).toMatchObject({ field: 'trials.0.angleDeg' });
  });

  // ISO 1940-1:2003 annex example, carried into ISO 21940-11:2016; from memory.
  it('gives the standard’s turbine rotor', async () => {
    const { inputs: rotor, published: given } = published['BQ-01'];
    const body = { gradeMmS: rotor.G, massKg: rotor.m_kg, speedRpm: rotor.n_rpm };
    const response = await computeResponse(tolerance, reader, sent(body));
    const { totalGmm } = z.looseObject({ totalGmm: z.number() }).parse(await response.json());
    near(totalGmm, given['U_per g.mm'], 100);
  });
});

describe('the OpenAPI document', () => {
  const document = z
    .looseObject({
      openapi: z.string(),
      paths: z.record(
        z.string(),
        z.object({
          post: z.looseObject({
            requestBody: z.object({
              content: z.record(
                z.string(),
                z.object({
                  schema: z.looseObject({
                    properties: z.record(z.string(), z.unknown()),
                    required: z.array(z.string()),
                    additionalProperties: z.literal(false),
                  }),
                }),
              ),
            }),
          }),
        }),
      ),
    })
    .parse(JSON.parse(JSON.stringify(openApiDocument())));
  const schemaOf = (name: string) =>
    document.paths[routes.api.compute(name)]?.post.requestBody.content['application/json']?.schema;

  it('has every computation, and demands every sense', () => {
    expect(document.openapi).toBe('3.1.0');
    expect(Object.keys(document.paths)).toHaveLength(9);
    const angled = ['without-phase', 'pieces', 'combine', 'six-places'];
    for (const name of angled) expect(schemaOf(name)?.required).toContain('angleSense');
    expect(schemaOf('solve-rows')?.required).toContain('phaseSense');
    expect(schemaOf('solve-runs')?.required).toEqual(
      expect.arrayContaining(['phaseSense', 'angleSense', 'rotationFromDriveEnd', 'unit']),
    );
    expect(schemaOf('split')?.required).toEqual(
      expect.arrayContaining(['angleSense', 'numbered', 'rotationFromDriveEnd']),
    );
    expect(schemaOf('tolerance')?.required).not.toContain('apartM');
  });
});
