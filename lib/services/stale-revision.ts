import { AppError } from '@/lib/errors';

/** What was read is not what is there any more: 412 with both revisions. */
export function staleRevision(what: string, present: number, read: number): AppError {
  return new AppError('stale-revision', `The ${what} is at revision ${present} now, you read ${read}. Read it again, then change it.`);
}
