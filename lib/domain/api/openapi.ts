import { z } from 'zod';
import { numericsVersion } from '@/lib/numerics/version';
import { allContracts } from './all-contracts';
import type { ContractShape } from './contract';
import { problemStatuses } from './problem-statuses';
import { problemSchema } from './problem-document';

type Json = Record<string, unknown>;

/** Without its own dialect, which is that of the document. */
function schemaOf(schema: z.ZodType, io: 'input' | 'output'): Json {
  const printed = z.toJSONSchema(schema, { target: 'draft-2020-12', io }) as Json;
  delete printed.$schema;
  return printed;
}

/** The whole API as an OpenAPI 3.1 document, printed from the contracts. */
export function printOpenApi(publicUrl: string): Json {
  const paths: Record<string, Json> = {};
  for (const contract of allContracts) {
    const path = (paths[contract.path] ??= {});
    path[contract.method.toLowerCase()] = operationOf(contract);
  }
  return {
    openapi: '3.1.0',
    info: {
      title: 'Fourfold', version: '1', summary: 'Observed orders of solvers, release after release.',
      description: `Errors are RFC 9457 problems. Somebody in several organisations names one by ?organisation= on any call. Numerics ${numericsVersion}.`,
    },
    servers: [{ url: new URL('/api/v1', publicUrl).href }],
    paths,
    components: {
      securitySchemes: {
        token: { type: 'http', scheme: 'bearer', description: 'A token made under Tokens.' },
        session: { type: 'apiKey', in: 'cookie', name: 'fourfold_session' },
      },
      schemas: { Problem: schemaOf(problemSchema, 'output') },
    },
  };
}

function operationOf(contract: ContractShape): Json {
  const { method, path, summary, access } = contract;
  return {
    operationId: `${method.toLowerCase()}${path.replace(/[^A-Za-z]+(.)?/g, (_all, next: string | undefined) => (next ?? '').toUpperCase())}`,
    summary,
    security: access === 'public' ? [] : [{ token: [] }, { session: [] }],
    parameters: parametersOf(contract),
    ...requestBodyOf(contract),
    responses: responsesOf(contract),
  };
}

function parametersOf({ path, query, access, conditional, method, secret }: ContractShape): Json[] {
  const text = { type: 'string' };
  const parameters: Json[] = [...path.matchAll(/\{(\w+)\}/g)].map(([, name]) => ({ name, in: 'path', required: true, schema: text }));
  if (query) {
    const { properties = {}, required = [] } = schemaOf(query, 'input') as { properties?: Record<string, Json>; required?: string[] };
    for (const [name, schema] of Object.entries(properties)) parameters.push({ name, in: 'query', required: required.includes(name), schema });
  }
  if (access === 'organisation') {
    parameters.push({ name: 'organisation', in: 'query', required: false, schema: text, description: 'Slug; needed by a session of somebody in several.' });
  }
  if (conditional) parameters.push({ name: 'If-Match', in: 'header', required: true, schema: text, description: 'The revision that was read, such as "3".' });
  if (method === 'POST' && access === 'organisation' && !secret) {
    parameters.push({ name: 'Idempotency-Key', in: 'header', required: false, schema: text, description: 'Same key and body, same answer for a day.' });
  }
  return parameters;
}

function requestBodyOf({ body, rawBody }: ContractShape): Json {
  if (rawBody) return { requestBody: { required: true, content: { 'application/octet-stream': {} } } };
  return body ? { requestBody: { required: true, content: { 'application/json': { schema: schemaOf(body, 'input') } } } } : {};
}

function responsesOf(contract: ContractShape): Json {
  const { status, summary, response, alsoAnswers = {} } = contract;
  const responses: Json = {};
  for (const code of problemStatuses(contract)) {
    responses[code] = { description: 'A problem', content: { 'application/problem+json': { schema: { $ref: '#/components/schemas/Problem' } } } };
  }
  responses[status] = response ? { description: summary, content: { 'application/json': { schema: schemaOf(response, 'output') } } } : { description: summary };
  for (const [code, { description, schema, text: mediaTypes = [] }] of Object.entries(alsoAnswers)) {
    const stated = responses[code] as { content?: Json } | undefined;
    const content = {
      ...stated?.content,
      ...(schema ? { 'application/json': { schema: schemaOf(schema, 'output') } } : {}),
      ...Object.fromEntries(mediaTypes.map((mediaType) => [mediaType, { schema: { type: 'string' } }])),
    };
    responses[code] = Object.keys(content).length > 0 ? { description, content } : { description };
  }
  return responses;
}
