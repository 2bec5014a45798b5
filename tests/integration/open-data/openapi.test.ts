import { readdirSync, readFileSync } from 'node:fs';
import path from 'node:path';
import { describe, expect, it } from 'vitest';
import { allRoutes, getOpenApiRoute } from '@/lib/open-data/handlers';

interface Operation {
  operationId: string;
  parameters: { name: string; in: string; required: boolean }[];
  responses: Record<string, unknown>;
  security: unknown[];
}

/** "GET /api/v1/devices/{id}" for each handler that a file below app/api/v1 exports. */
function servedOperations(): string[] {
  const root = path.join(process.cwd(), 'app');
  const files = readdirSync(path.join(root, 'api/v1'), { recursive: true, withFileTypes: true });
  return files
    .filter((file) => file.name === 'route.ts')
    .flatMap((file) => {
      const folder = path.relative(root, file.parentPath).split(path.sep).join('/');
      const address = `/${folder.replaceAll('[', '{').replaceAll(']', '}')}`;
      const source = readFileSync(path.join(file.parentPath, file.name), 'utf8');
      return [...source.matchAll(/export const (GET|POST|PUT|PATCH|DELETE)\b/g)].map(
        ([, method]) => `${method} ${address}`,
      );
    })
    .sort();
}

async function fetchDocument() {
  const answer = await getOpenApiRoute.handler(new Request('http://127.0.0.1:3000/api/v1/openapi.json'), {
    params: Promise.resolve({}),
  });
  return (await answer.json()) as { openapi: string; paths: Record<string, Record<string, Operation>> };
}

describe('the OpenAPI document', () => {
  it('describes every operation that is served, and serves every one that it describes', async () => {
    const { paths } = await fetchDocument();
    const described = Object.entries(paths)
      .flatMap(([address, operations]) => Object.keys(operations).map((method) => `${method.toUpperCase()} ${address}`))
      .sort();
    expect(described).toEqual(servedOperations());
  });

  it('gives each operation a name of its own', () => {
    const names = allRoutes().map((route) => route.spec.operationId);
    expect(new Set(names).size).toBe(names.length);
  });

  it('declares every parameter that an address holds, and an answer for success and for failure', async () => {
    const { openapi, paths } = await fetchDocument();
    expect(openapi).toMatch(/^3\.1\./);
    for (const [address, operations] of Object.entries(paths)) {
      const inAddress = [...address.matchAll(/\{(\w+)\}/g)].map(([, name]) => name).sort();
      for (const operation of Object.values(operations)) {
        const declared = operation.parameters.filter((parameter) => parameter.in === 'path').map(({ name }) => name);
        expect(declared.sort(), `${operation.operationId} ${address}`).toEqual(inAddress);
        expect(Object.keys(operation.responses), operation.operationId).toContain('default');
        expect(Object.keys(operation.responses).some((status) => status.startsWith('2'))).toBe(true);
      }
    }
  });

  it('asks for a session wherever a role is needed', async () => {
    const { paths } = await fetchDocument();
    for (const { spec } of allRoutes()) {
      const operation = paths[spec.path]?.[spec.method.toLowerCase()];
      expect(operation?.security.length === 0, spec.operationId).toBe(spec.access === 'anyone');
    }
  });
});

describe('an operation for members', () => {
  const guarded = allRoutes().filter((route) => route.spec.access !== 'anyone');

  it.each(guarded.map((route) => [route.spec.operationId, route] as const))(
    '%s answers 401 to nobody and 403 to a write from another site',
    async (_name, { spec, handler }) => {
      const address = `http://127.0.0.1:3000${spec.path.replaceAll(/\{\w+\}/g, '0000000000')}`;
      const params = Promise.resolve(
        Object.fromEntries([...spec.path.matchAll(/\{(\w+)\}/g)].map(([, name]) => [name, '0000000000'])),
      );
      const call = (headers: Record<string, string>) =>
        handler(
          new Request(address, {
            method: spec.method,
            headers: { 'content-type': 'application/json', ...headers },
            ...(spec.method === 'GET' ? {} : { body: '{}' }),
          }),
          { params },
        );
      expect((await call({ origin: 'http://127.0.0.1:3000' })).status).toBe(401);
      if (spec.method !== 'GET') {
        expect((await call({ origin: 'https://elsewhere.example' })).status).toBe(403);
        expect((await call({ origin: 'null' })).status).toBe(403);
        expect((await call({})).status).toBe(403);
      }
    },
  );
});
