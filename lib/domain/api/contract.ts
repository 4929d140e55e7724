import type { z } from 'zod';

type ParameterNames<Path extends string> = Path extends `${string}{${infer Name}}${infer Rest}` ? Name | ParameterNames<Rest> : never;
export type PathParameters<Path extends string> = Record<ParameterNames<Path>, string>;

/** Who may call: anybody, anybody signed in, or a member (or token) of one organisation. */
type Access = 'public' | 'signed-in' | 'organisation';

/** What it is, and where it has a shape of its own: JSON of a schema, or text of media types. */
export interface OtherAnswer { description: string; schema?: z.ZodType; text?: readonly string[] }

export interface ContractShape {
  method: 'GET' | 'POST' | 'PUT' | 'PATCH' | 'DELETE';
  path: string;
  summary: string;
  access: Access;
  status: 200 | 201 | 202 | 204;
  query?: z.ZodObject;
  body?: z.ZodType;
  /** Absent for 204. */
  response?: z.ZodType;
  /** The answer holds a secret: it is never kept to be answered again. */
  secret?: true;
  /** A write that needs `If-Match` with the revision that was read. */
  conditional?: true;
  /** It waits for storage, so it is no single transaction; carried out twice under one Idempotency-Key it does no harm. */
  inSteps?: true;
  /** The body is not JSON and is handed on as a stream. */
  rawBody?: true;
  /** Statuses of refusals that do not follow from the rest. */
  alsoRefuses?: readonly number[];
  /** What else than `response` may come, told in the document only. */
  alsoAnswers?: Record<number, OtherAnswer>;
}

/** One call of the API: the same object types the form, the route, the service, the tests and the printed document. */
export function contract<const C extends ContractShape>(shape: C): C {
  return shape;
}

export type BodyOf<C extends ContractShape> = C['body'] extends z.ZodType ? z.input<C['body']> : undefined;
export type QueryOf<C extends ContractShape> = C['query'] extends z.ZodObject ? z.input<C['query']> : Record<never, never>;
export type ResponseOf<C extends ContractShape> = C['response'] extends z.ZodType ? z.output<C['response']> : undefined;
export type ParsedBodyOf<C extends ContractShape> = C['body'] extends z.ZodType ? z.output<C['body']> : undefined;
export type ParsedQueryOf<C extends ContractShape> = C['query'] extends z.ZodObject ? z.output<C['query']> : Record<never, never>;
