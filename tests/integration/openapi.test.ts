import SwaggerParser from '@apidevtools/swagger-parser';
import { beforeAll, describe, expect, it } from 'vitest';
import { allContracts } from '@/lib/domain/api/all-contracts';
import { need } from '../support/environment';

type Json = { [name: string]: Json } | Json[] | string | number | boolean | null;

let document: { [name: string]: Json };
beforeAll(async () => {
  const response = await fetch(`${need('WEB_URL')}/api/v1/openapi.json`);
  document = (await response.json()) as typeof document;
});

/** Every place where a schema stands, with the schema. */
function schemasIn(value: Json, at: string, isSchema: boolean): [string, Json][] {
  if (value === null || typeof value !== 'object') return [];
  if (Array.isArray(value)) return value.flatMap((each, index) => schemasIn(each, `${at}/${index}`, isSchema));
  const inner = Object.entries(value).flatMap(([name, each]): [string, Json][] => {
    if (['default', 'enum', 'const', 'required', 'examples'].includes(name)) return [];
    if (name === 'properties' && isSchema) return Object.entries(each as object).flatMap(([key, schema]) => schemasIn(schema as Json, `${at}/${name}/${key}`, true));
    return schemasIn(each, `${at}/${name}`, isSchema || name === 'schema');
  });
  return isSchema ? [[at, value], ...inner] : inner;
}

describe('GET /api/v1/openapi.json', () => {
  it('is a valid OpenAPI 3.1 document', async () => {
    expect(document.openapi).toBe('3.1.0');
    await SwaggerParser.validate(structuredClone(document) as unknown as Parameters<typeof SwaggerParser.validate>[0]);
  });

  it('tells every call', () => {
    const paths = document.paths as Record<string, Record<string, unknown>>;
    for (const { method, path } of allContracts) expect(paths[path]?.[method.toLowerCase()], `${method} ${path}`).toBeDefined();
  });

  it('has no empty schema, and closes every object', () => {
    const schemas = schemasIn(document, '', false);
    expect(schemas.length).toBeGreaterThan(500);
    expect(schemas.filter(([, schema]) => Object.keys(schema as object).length === 0).map(([at]) => at)).toEqual([]);
    const open = schemas.filter(([, schema]) => {
      const { type, additionalProperties } = schema as Record<string, Json>;
      return type === 'object' && additionalProperties === undefined;
    });
    expect(open.map(([at]) => at)).toEqual([]);
  });

  it('says how to sign in, and what a problem looks like', () => {
    expect(document.components).toMatchObject({
      securitySchemes: { token: { type: 'http', scheme: 'bearer' }, session: { type: 'apiKey', in: 'cookie' } },
      schemas: { Problem: { required: ['type', 'title', 'status', 'detail', 'errors'] } },
    });
  });

  it('gives every call a name of its own', () => {
    const operations = Object.values(document.paths as Record<string, Record<string, { operationId: string }>>).flatMap((path) => Object.values(path));
    const names = operations.map((operation) => operation.operationId);
    expect(new Set(names).size).toBe(names.length);
  });
});
