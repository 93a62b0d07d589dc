import { z } from 'zod';
import pkg from '@/package.json' with { type: 'json' };
import { METHODS, type Handler, type Method, type Spec } from './handler';

type Routes = Record<string, Partial<Record<Method, Handler>>>;
type Schema = Record<string, unknown>;

const PROBLEM = {
  description: 'A problem document (RFC 9457)',
  content: {
    'application/problem+json': {
      schema: {
        type: 'object',
        required: ['type', 'title', 'status', 'detail'],
        properties: {
          type: { type: 'string' },
          title: { type: 'string' },
          status: { type: 'integer' },
          detail: { type: 'string' },
          errors: {
            type: 'array',
            items: {
              type: 'object',
              required: ['path', 'message'],
              properties: { path: { type: 'string' }, message: { type: 'string' } },
            },
          },
        },
      },
    },
  },
};

/** The OpenAPI 3.1 document of these routes, from the schemas that validate their requests and answers. */
export function openapi(routes: Routes): Schema {
  const paths: Record<string, Schema> = {};
  for (const [address, handlers] of Object.entries(routes)) {
    const operations: Schema = {};
    for (const method of METHODS) {
      const spec = handlers[method]?.spec;
      if (spec && method !== 'HEAD') operations[method.toLowerCase()] = operation(spec);
    }
    paths[address] = operations;
  }
  return {
    openapi: '3.1.0',
    info: {
      title: 'Aftercut',
      version: pkg.version,
      description:
        'Pruning cuts and the regrowth that followed. SI units, ISO 8601 dates, figures at full precision.',
    },
    paths,
    components: {
      securitySchemes: { session: { type: 'apiKey', in: 'cookie', name: 'next-auth.session-token' } },
    },
  };
}

function operation(spec: Spec): Schema {
  return {
    summary: spec.summary,
    parameters: [...parameters(spec.params, 'path'), ...parameters(spec.query, 'query')],
    ...(spec.as === 'all' ? {} : { security: [{ session: [] }], 'x-least-role': spec.as }),
    ...(spec.body
      ? {
          requestBody: {
            required: true,
            content: { 'application/json': { schema: shape(spec.body, 'input') } },
          },
        }
      : {}),
    responses: { '2XX': answer(spec), default: PROBLEM },
  };
}

function answer(spec: Spec): Schema {
  if (spec.output) {
    return { description: 'Done', content: { 'application/json': { schema: shape(spec.output, 'output') } } };
  }
  if (spec.outputType) return { description: 'Done', content: { [spec.outputType]: {} } };
  return { description: 'Done' };
}

function parameters(schema: z.ZodType | undefined, where: 'path' | 'query'): Schema[] {
  if (!schema) return [];
  const { properties = {}, required = [] } = shape(schema, 'input') as {
    properties?: Record<string, Schema>;
    required?: string[];
  };
  return Object.entries(properties).map(([name, property]) => ({
    name,
    in: where,
    required: where === 'path' || required.includes(name),
    schema: property,
  }));
}

function shape(schema: z.ZodType, io: 'input' | 'output'): Schema {
  const { $schema, ...rest } = z.toJSONSchema(schema, { io, unrepresentable: 'any' }) as Schema;
  void $schema;
  return rest;
}
