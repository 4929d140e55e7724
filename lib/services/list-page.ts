import { validate } from 'uuid';
import { AppError } from '@/lib/errors';

interface ListQuery { limit: number; cursor?: string | undefined }

/** The cursor is the id of the last item of the page before; one item more than asked tells whether there is a next page. */
export function startPage(query: ListQuery): { after: string | null; limit: number } {
  if (query.cursor !== undefined && !validate(query.cursor)) throw new AppError('bad-request', `The cursor “${query.cursor}” is none that a list gave.`);
  return { after: query.cursor ?? null, limit: query.limit + 1 };
}

export function endPage<Row extends { id: string }, Item>(rows: Row[], query: ListQuery, map: (row: Row) => Item): { items: Item[]; nextCursor: string | null } {
  const page = rows.slice(0, query.limit);
  return { items: page.map(map), nextCursor: rows.length > query.limit ? (page.at(-1)?.id ?? null) : null };
}
