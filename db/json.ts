import { sql, type RawBuilder } from 'kysely';
import type { Json } from './schema.generated';

/** A jsonb parameter: left to itself pg would send an array as a PostgreSQL array. */
export function json(value: unknown): RawBuilder<Json> {
  return sql<Json>`${JSON.stringify(value)}::jsonb`;
}
