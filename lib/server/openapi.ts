import 'server-only';
import { z } from 'zod';
import { routes } from '@/lib/routes';
import { COMPUTATIONS, isComputation } from './workbench/computations';

const PROBLEM = {
  type: 'object',
  properties: {
    title: { type: 'string' },
    status: { type: 'integer' },
    detail: { type: 'string' },
    code: { type: 'string' },
    field: { type: 'string', description: 'Dotted path of the field that is wrong.' },
  },
} as const;

/** The OpenAPI 3.1 document of the public API, made from the schemas that check its input. */
export function openApiDocument() {
  const names = Object.keys(COMPUTATIONS).filter(isComputation);
  return {
    openapi: '3.1.0',
    info: {
      title: 'Evenrun',
      version: '1',
      description:
        'Stateless balancing arithmetic. Every sense is asked for and none is assumed: a missing one is refused with 422. Unknown fields are refused too.',
    },
    paths: Object.fromEntries(names.map((name) => [routes.api.compute(name), pathOf(name)])),
    components: { schemas: { Problem: PROBLEM } },
  };
}

function pathOf(name: keyof typeof COMPUTATIONS) {
  const { schema: input, says } = COMPUTATIONS[name];
  const schema = z.toJSONSchema(input, { io: 'input', unrepresentable: 'any' });
  return {
    post: {
      operationId: name,
      summary: says,
      requestBody: { required: true, content: { 'application/json': { schema } } },
      responses: {
        200: { description: 'What it comes to.', content: { 'application/json': {} } },
        ...problems({
          400: 'The body is no JSON object.',
          401: 'Nobody is signed in.',
          403: 'The role does not allow it.',
          413: 'The body is too long.',
          422: 'It cannot be computed; `detail` says why, `field` where.',
        }),
      },
    },
  };
}

function problems(descriptions: Readonly<Record<number, string>>) {
  const content = {
    'application/problem+json': { schema: { $ref: '#/components/schemas/Problem' } },
  };
  return Object.fromEntries(
    Object.entries(descriptions).map(([status, description]) => [status, { description, content }]),
  );
}
