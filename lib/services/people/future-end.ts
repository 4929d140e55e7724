import { AppError } from '@/lib/errors';

/** The end of an auditor's access, which must be to come. */
export function futureEnd(until: string | undefined, now: Date): Date | null {
  if (until === undefined) return null;
  const end = new Date(until);
  if (end > now) return end;
  const message = `Found ${until}, which is past. Expected a time to come.`;
  throw new AppError('invalid', `until: ${message}`, { fields: [{ path: 'until', message }] });
}
