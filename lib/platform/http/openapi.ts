import 'server-only';
import { z, type ZodType } from 'zod';
import type { AnyRouteSpec } from './route';

const PROBLEM = {
  description: 'What went wrong, as problem details (RFC 9457).',
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
          instance: { type: 'string' },
          requestId: { type: ['string', 'null'] },
          errors: {
            type: 'array',
            items: {
              type: 'object',
              required: ['pointer', 'message'],
              properties: { pointer: { type: 'string' }, message: { type: 'string' } },
            },
          },
          facts: { type: 'object' },
        },
      },
    },
  },
};

/** The API's description, OpenAPI 3.1, from the very objects that serve it. */
export function openApiDocument(specs: readonly AnyRouteSpec[], origin: string) {
  const paths: Record<string, Record<string, unknown>> = {};
  for (const spec of specs) {
    paths[spec.path] = { ...paths[spec.path], [spec.method.toLowerCase()]: operation(spec) };
  }
  return {
    openapi: '3.1.1',
    info: {
      title: 'Wattcairn',
      version: '1',
      description: 'What electrical devices really draw: reports, published figures and claims.',
      license: { name: 'CC BY 4.0 (data)', identifier: 'CC-BY-4.0' },
    },
    servers: [{ url: origin }],
    components: {
      securitySchemes: {
        session: { type: 'apiKey', in: 'cookie', name: 'next-auth.session-token', description: 'A signed-in browser.' },
      },
    },
    paths,
  };
}

function operation(spec: AnyRouteSpec) {
  const success = spec.success;
  const content = success.body
    ? { 'application/json': { schema: jsonSchema(success.body, 'output') } }
    : success.contentType
      ? { [success.contentType]: {} }
      : undefined;
  return {
    operationId: spec.operationId,
    summary: spec.summary,
    ...(spec.access === 'anyone' ? { security: [] } : { security: [{ session: [] }] }),
    'x-least-role': spec.access,
    parameters: [...parameters(spec.params, 'path'), ...parameters(spec.query, 'query')],
    ...(spec.body
      ? { requestBody: { required: true, content: { 'application/json': { schema: jsonSchema(spec.body, 'input') } } } }
      : {}),
    ...(spec.upload
      ? {
          requestBody: {
            required: true,
            description: spec.upload.description,
            content: { 'multipart/form-data': { schema: { type: 'object' } } },
          },
        }
      : {}),
    responses: {
      [success.status]: { description: success.description, ...(content ? { content } : {}) },
      default: PROBLEM,
    },
  };
}

function parameters(schema: ZodType<unknown> | undefined, place: 'path' | 'query') {
  if (!schema) return [];
  const described = jsonSchema(schema, 'input') as {
    properties?: Record<string, unknown>;
    required?: string[];
  };
  return Object.entries(described.properties ?? {}).map(([name, property]) => ({
    name,
    in: place,
    required: place === 'path' || (described.required ?? []).includes(name),
    schema: property,
  }));
}

function jsonSchema(schema: ZodType<unknown>, io: 'input' | 'output') {
  const { $schema: _dialect, ...described } = z.toJSONSchema(schema, { io, unrepresentable: 'any' });
  return described;
}
